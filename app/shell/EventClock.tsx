'use client';
import { useEventMs, useFormats } from '../live/EventContext';
import styles from './Header.module.css';

/** The event's clock: local large, UTC and the date below. */
export function EventClock() {
  const nowMs = useEventMs(1000);
  const formats = useFormats();
  return (
    <p className={styles.clock}>
      <time dateTime={nowMs === null ? undefined : new Date(nowMs).toISOString()}>{formats.clock(nowMs, true)}</time>
      <span>
        {formats.utc(nowMs)} {formats.date(nowMs)}
      </span>
    </p>
  );
}
