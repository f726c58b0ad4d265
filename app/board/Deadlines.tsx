import { formatSpan } from '../../lib/units';
import { useFormats } from '../live/EventContext';
import { words } from '../words';
import styles from './Deadlines.module.css';
import { Slack } from './Slack';
import { sortZones, DEFAULT_SORT } from './zoneView';
import type { ZoneView } from './zoneView';

const SHOWN = 3;

/** The next three starts, on narrow screens where the table lies below the map. */
export function Deadlines({ zones }: { zones: readonly ZoneView[] }) {
  const formats = useFormats();
  const next = sortZones(zones, DEFAULT_SORT).filter((zone) => zone.slackHours !== null).slice(0, SHOWN);
  if (zones.length === 0) return null;
  return (
    <section className={styles.deadlines}>
      <h2>{words.deadlines.title}</h2>
      {next.length === 0 && <p className="dim">{words.deadlines.none}</p>}
      <ul>
        {next.map((zone) => (
          <li key={zone.id}>
            <strong>{zone.name}</strong>
            <span className="dim">{words.strip.startBy(formats.dayTime(zone.startByMs))}</span>
            <Slack zone={zone} text={formatSpan(zone.slackHours)} />
          </li>
        ))}
      </ul>
    </section>
  );
}
