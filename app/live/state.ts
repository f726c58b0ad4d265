import type { Impact } from '../../lib/impact';
import type { AdvisoryNotice, ClockNotice, Event, JoinAck, LogEntry, Presence, Progress, RunFailed, StoredAdvisory } from '../../lib/wire';
import type { ClockAnchor } from './clock';
import type { Link } from './link';

export interface Run {
  runId: string;
  /** Null when progress is heard before it is known whose it is. */
  advisoryId: string | null;
  done: number;
  /** 0: not counted yet. */
  of: number;
}

/** All that one screen holds of one event. */
export interface EventState {
  eventId: string;
  event: Event | null;
  /** The newest accepted advisory; it may not be computed yet. */
  advisory: StoredAdvisory | null;
  /** Advisories seen so far, to say which one an impact belongs to. */
  advisories: Readonly<Record<string, StoredAdvisory>>;
  impact: Impact | null;
  /** Revisions that came before the one they follow. */
  early: readonly Impact[];
  run: Run | null;
  failure: RunFailed | null;
  screens: Presence['screens'];
  log: readonly LogEntry[];
  clock: ClockAnchor | null;
  link: Link;
  /** A revision was missed: join again with the one held. */
  mustJoin: boolean;
}

/** What can happen to an event on this screen. `atMs` is this machine's clock. */
export type Happening =
  | { kind: 'connected'; atMs: number }
  | { kind: 'disconnected'; atMs: number }
  | { kind: 'refused'; atMs: number; code: string; message: string }
  | { kind: 'joined'; atMs: number; ack: Extract<JoinAck, { ok: true }> }
  | { kind: 'event'; atMs: number; event: Event }
  | { kind: 'advisory'; notice: AdvisoryNotice }
  | { kind: 'impact'; impact: Impact }
  | { kind: 'progress'; notice: Progress }
  | { kind: 'failed'; notice: RunFailed }
  | { kind: 'presence'; notice: Presence }
  | { kind: 'log'; entry: LogEntry }
  | { kind: 'clock'; atMs: number; notice: ClockNotice };

export const startState = (eventId: string, atMs: number): EventState => ({
  eventId,
  event: null,
  advisory: null,
  advisories: {},
  impact: null,
  early: [],
  run: null,
  failure: null,
  screens: [],
  log: [],
  clock: null,
  link: { state: 'connecting', sinceMs: atMs },
  mustJoin: false,
});
