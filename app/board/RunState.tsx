'use client';
import { formatCount } from '../../lib/units';
import { useLive } from '../live/EventContext';
import { words } from '../words';
import styles from './RunState.module.css';

/** What is being computed, how far it is, or that it failed; nothing when the figures are whole. */
export function RunState() {
  const run = useLive((state) => state.run);
  const failure = useLive((state) => state.failure);
  const impact = useLive((state) => state.impact);
  const advisory = useLive((state) => state.advisory);
  if (failure) return <p className={styles.failed} role="alert"><span aria-hidden="true">▲ </span>{words.run.failed(failure.message)}</p>;
  const behind = advisory !== null && advisory.id !== impact?.advisoryId;
  const members = impact?.stage === 'track';
  if (!behind && !members) return null;
  const share = run && run.of > 0 ? run.done / run.of : 0;
  const text = behind
    ? impact ? words.run.track(advisory.number) : words.run.first(advisory.number)
    : run && run.of > 0 ? words.run.members(formatCount(run.done), formatCount(run.of)) : words.run.starting;
  return (
    <div className={styles.run}>
      <p role="status">{text}</p>
      <div className={styles.track} role="progressbar" aria-label={text} aria-valuemin={0} aria-valuemax={100} aria-valuenow={Math.round(share * 100)}>
        <div style={{ transform: `scaleX(${share})` }} />
      </div>
    </div>
  );
}
