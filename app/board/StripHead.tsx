import type { Formats } from '../prefs/format';
import { words } from '../words';
import styles from './ArrivalStrip.module.css';
import { positionIn } from './timeScale';
import type { GridLine, TimeSpan } from './timeScale';

/** Six-hour labels in the event's time, the day at midnight, and the flag of now. Labels that would crowd are left out. */
export function StripHead({ span, lines, nowMs, formats }: { span: TimeSpan; lines: GridLine[]; nowMs: number; formats: Formats }) {
  const every = lines.length > 22 ? 4 : lines.length > 12 ? 2 : 1;
  const now = positionIn(span, nowMs);
  const firstMidnight = lines.findIndex((line) => line.midnight);
  const labelled = lines.filter((line, i) => (i - firstMidnight) % every === 0 && Math.abs(positionIn(span, line.atMs) - now) > 0.022 && positionIn(span, line.atMs) < 0.985);
  return (
    <div className={styles.head}>
      <h2 className={styles.title}>{words.strip.title}</h2>
      <div className={styles.labels}>
        {labelled.map((line) => (
          <time key={line.atMs} dateTime={new Date(line.atMs).toISOString()} data-midnight={line.midnight} style={{ left: `${positionIn(span, line.atMs) * 100}%` }}>
            {line.midnight ? formats.dayTime(line.atMs) : formats.clock(line.atMs)}
          </time>
        ))}
        <span className={styles.flag} style={{ left: `${now * 100}%` }}>
          {words.strip.now}
        </span>
      </div>
    </div>
  );
}
