'use client';
import { useStore } from 'zustand';
import { useFormats, useLive } from '../live/EventContext';
import { eventMsAt } from '../live/clock';
import { linkStatus } from '../live/link';
import { tickStore } from '../live/tick';
import { words } from '../words';
import styles from './Header.module.css';

/** Whether this screen hears the server, and which revision it shows. The mark differs in shape, not only in colour. */
export function LinkState() {
  const link = useLive((state) => state.link);
  const revision = useLive((state) => state.impact?.revision ?? null);
  const screens = useLive((state) => state.screens.length);
  const clock = useLive((state) => state.clock);
  const heardMs = clock?.heardMs ?? null;
  const state = useStore(tickStore, ({ localMs }) => linkStatus(link, heardMs, Math.max(localMs, link.sinceMs)).state);
  const formats = useFormats();
  // When it came about, on the event's clock; on this machine's before the event is known.
  const since = formats.clock(clock ? eventMsAt(clock, link.state === 'live' ? clock.heardMs : link.sinceMs) : link.sinceMs);
  const held = revision === null ? words.link.noRevision : words.link.revision(revision);
  const first = state === 'stale' ? words.link.stale(since) : words.link[state];
  const second = state === 'live' ? [held, ...(screens > 0 ? [words.link.screens(screens)] : [])].join(', ') : state === 'reconnecting' ? words.link.since(since) : state === 'refused' && link.state === 'refused' ? link.message : held;
  return (
    <p className={styles.link} data-state={state} data-testid="link" data-revision={revision ?? ''}>
      <span className={styles.mark} aria-hidden="true">
        {state === 'live' ? '●' : state === 'stale' || state === 'refused' ? '▲' : '○'}
      </span>
      <span>
        <strong>{first}</strong>
        <span>{second}</span>
      </span>
    </p>
  );
}
