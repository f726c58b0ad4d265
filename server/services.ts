import type { Logger } from 'pino';
import type { AdvisoryNotice, Event, Identity, LogEntry, Progress, RunFailed } from '../lib/wire';
import type { Impact } from '../lib/impact';
import type { InspectTask, Inspection } from './compute/tasks';
import type { Settings } from './settings';
import type { EventRecord, Store } from './store/model';

/** What happens in the process, for whoever listens (the sockets, mostly). */
export interface BusEvents {
  advisory: AdvisoryNotice;
  progress: Progress;
  impact: Impact;
  failed: RunFailed;
  log: LogEntry;
  /** The event's clock or other particulars were changed. */
  event: { eventId: string };
}

export interface Bus {
  emit<K extends keyof BusEvents>(name: K, payload: BusEvents[K]): void;
  /** Returns the function that stops listening. */
  on<K extends keyof BusEvents>(name: K, listener: (payload: BusEvents[K]) => void): () => void;
}

/** Computes impacts: one run at a time per event, a newer request cancels an older run. */
export interface Runs {
  /** Ask for the event's latest advisory and layers to be computed, track first and members after. */
  request(eventId: string): void;
  /** The run under way, or waiting, for an event. */
  underWay(eventId: string): { runId: string; advisoryId: string } | null;
  /** Runs waiting or under way, over all events. */
  readonly waiting: number;
  /** Ask for every event whose newest advisory has no finished impact (after a crash). */
  resume(): Promise<void>;
  close(): Promise<void>;
}

/** Who is calling: a key (`Authorization: Bearer`) or a session cookie. Null: nobody we know. */
export interface Auth {
  identify(headers: { authorization?: string | undefined; cookie?: string | undefined }): Promise<Identity | null>;
  identifyKey(key: string): Promise<Identity | null>;
}

/** Wall-clock time is an argument everywhere, so that no test waits for it. */
export interface WallClock {
  nowMs(): number;
}

/** Everything process-wide, built once in main.ts and handed down. */
export interface Services<A extends Auth = Auth> {
  settings: Settings;
  logger: Logger;
  store: Store;
  auth: A;
  bus: Bus;
  runs: Runs;
  clock: WallClock;
  /** Reads a layer on a compute thread: good enough to store? */
  inspectLayer(task: InspectTask): Promise<Inspection>;
  /** The event as screens see it, with its clock read now. */
  describeEvent(record: EventRecord): Promise<Event>;
}
