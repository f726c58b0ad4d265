'use client';
import { useFormats, useLive } from '../live/EventContext';
import { useMay } from '../shell/Identified';
import page from '../ui/page.module.css';
import ui from '../ui/ui.module.css';
import { words } from '../words';
import { LogForm } from './LogForm';
import { useLog } from './useLog';

const text = words.log;

/** What was decided and handed over: append-only, on the event's clock. */
export function LogPage() {
  const eventId = useLive((state) => state.eventId);
  const zones = useLive((state) => state.impact?.zones);
  const { entries, trouble, add } = useLog(eventId);
  const formats = useFormats();
  const may = useMay('operator');
  const zoneName = (id: string | null): string => (id === null ? '' : (zones?.find((zone) => zone.id === id)?.name ?? id));
  return (
    <div className={`${page.page} scroll`}>
      <div className={`${page.narrow} ${ui.stack}`}>
        <h1>{text.title}</h1>
        {may ? <LogForm zones={zones ?? []} onAdd={add} /> : <p className="dim">{text.onlyOperators}</p>}
        {trouble && <p role="alert">{trouble}</p>}
        {entries.length === 0 ? (
          <p className="dim">{text.empty}</p>
        ) : (
          <table className={ui.table}>
            <caption>
              {text.caption}. {text.append}
            </caption>
            <thead>
              <tr>
                <th scope="col">{text.at}</th>
                <th scope="col">{text.kind}</th>
                <th scope="col">{text.entry}</th>
                <th scope="col">{text.by}</th>
              </tr>
            </thead>
            <tbody>
              {entries.map((entry) => (
                <tr key={entry.id}>
                  <td style={{ whiteSpace: 'nowrap' }}>
                    {formats.dayTime(entry.at)} <span className="dim">{formats.utc(entry.at)}</span>
                  </td>
                  <td>{text.kinds[entry.kind]}</td>
                  <td style={{ whiteSpace: 'pre-wrap' }}>
                    {entry.zoneId && <strong>{zoneName(entry.zoneId)}: </strong>}
                    {entry.text}
                  </td>
                  <td>{entry.by}</td>
                </tr>
              ))}
            </tbody>
          </table>
        )}
      </div>
    </div>
  );
}
