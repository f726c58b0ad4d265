'use client';
import { formatCount } from '../../lib/units';
import { advisorySourceUrl } from '../http/api';
import { useBulk, useFormats, useLive } from '../live/EventContext';
import ui from '../ui/ui.module.css';
import { words } from '../words';
import styles from './Forecasts.module.css';

const text = words.forecasts.history;

/** What was issued, newest first, with the file as it came. */
export function History({ eventId }: { eventId: string }) {
  const history = useBulk((state) => state.history);
  const shownId = useLive((state) => state.impact?.advisoryId);
  const formats = useFormats();
  return (
    <section className={ui.stack}>
      <h2>{text.title}</h2>
      {history.length === 0 && <p className="dim">{text.empty}</p>}
      {history.length > 0 && (
        <div className={`${styles.wide} scroll`} tabIndex={0} role="region" aria-label={text.title}>
          <table className={ui.table}>
            <thead>
              <tr>
                <th scope="col" className="number">{text.number}</th>
                <th scope="col">{text.issued}</th>
                <th scope="col">{text.by}</th>
                <th scope="col">{text.format}</th>
                <th scope="col" className="number">{text.points}</th>
                <th scope="col" className="number">{text.wind}</th>
                <th scope="col" className="number">{text.warnings}</th>
                <th scope="col">{text.source}</th>
              </tr>
            </thead>
            <tbody>
              {[...history].reverse().map((one) => (
                <tr key={one.id} aria-current={one.id === shownId ? 'true' : undefined}>
                  <th scope="row" className="number">
                    <strong>{one.number}</strong>
                  </th>
                  <td className={styles.cell}>
                    {formats.dayTime(one.issuedAt)} <span className="dim">{formats.utc(one.issuedAt)}</span>
                  </td>
                  <td>{one.receivedBy}</td>
                  <td>
                    {words.forecasts.formats[one.format]}
                    {one.supersedes && `, ${text.correction}`}
                  </td>
                  <td className="number">{one.points.length}</td>
                  <td className={`${styles.cell} number`}>{formats.wind(one.points[0].maxWindKt)}</td>
                  <td className="number">{formatCount(one.warnings.length)}</td>
                  <td>
                    <a href={advisorySourceUrl(eventId, one.id)} download aria-label={`${text.download}: ${words.header.advisory(one.number)}`}>
                      {text.download}
                    </a>
                  </td>
                </tr>
              ))}
            </tbody>
          </table>
        </div>
      )}
    </section>
  );
}
