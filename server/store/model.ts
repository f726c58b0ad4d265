import type { Advisory, Format, Warning } from '../../lib/advisory';
import type { LayerKind } from '../../lib/exposure';
import type { Impact } from '../../lib/impact';
import type { Event, Layer, LogEntry, StoredAdvisory } from '../../lib/wire';

/** A file as it was received, kept byte for byte. */
export interface Source {
  bytes: Uint8Array;
  contentType: string;
  fileName: string | null;
}

export interface EventRecord {
  id: string;
  name: string;
  timeZone: string;
  exercise: boolean;
  demo: boolean;
  clock: Event['clock'];
  createdAt: string;
  revision: number;
  advisoryId: string | null;
}

export interface NewAdvisory {
  eventId: string;
  advisory: Advisory;
  format: Format;
  warnings: Warning[];
  source: Source;
  receivedAt: string;
  receivedBy: string;
  /** Same key and event: the advisory stored the first time is answered again. */
  idempotencyKey: string | null;
}

export interface NewLayer {
  eventId: string;
  kind: LayerKind;
  name: string;
  rows: number;
  classes: Layer['classes'];
  source: Source;
  receivedAt: string;
  receivedBy: string;
}

/** Bulk that belongs to a revision, served over HTTP and cached for ever. */
export const BULK_NAMES = ['assets', 'marks', 'peak', 'arrival', 'chance34', 'chance50', 'chance64'] as const;
export type BulkName = (typeof BULK_NAMES)[number];

export interface NewImpact {
  impact: Omit<Impact, 'revision'>;
  bulk: Partial<Record<BulkName, Uint8Array>>;
}

export interface Page {
  offset: number;
  limit: number;
}
export interface Listed<T> {
  items: T[];
  total: number;
  offset: number;
}

/** Everything that must outlive the process. Accepted advisories are on disk before `add` resolves. */
export interface Store {
  events: {
    add(event: Omit<EventRecord, 'revision' | 'advisoryId'>): Promise<EventRecord>;
    get(id: string): Promise<EventRecord | null>;
    list(page: Page): Promise<Listed<EventRecord>>;
    setClock(id: string, clock: Event['clock']): Promise<void>;
  };
  advisories: {
    add(input: NewAdvisory): Promise<{ advisory: StoredAdvisory; repeated: boolean }>;
    get(eventId: string, id: string): Promise<StoredAdvisory | null>;
    latest(eventId: string): Promise<StoredAdvisory | null>;
    /** The advisory that was stored under an idempotency key. */
    ofKey(eventId: string, idempotencyKey: string): Promise<StoredAdvisory | null>;
    /** The advisory before this one that it does not supersede, to measure change against. */
    before(advisory: StoredAdvisory): Promise<StoredAdvisory | null>;
    list(eventId: string, page: Page): Promise<Listed<StoredAdvisory>>;
    source(eventId: string, id: string): Promise<Source | null>;
  };
  layers: {
    add(input: NewLayer): Promise<Layer>;
    /** The newest version of each name and kind. */
    current(eventId: string): Promise<Layer[]>;
    list(eventId: string, page: Page): Promise<Listed<Layer>>;
    source(eventId: string, id: string): Promise<Source | null>;
  };
  impacts: {
    /** Gives the event its next revision and stores the impact under it, in one transaction. */
    publish(input: NewImpact): Promise<Impact>;
    get(eventId: string, revision: number): Promise<Impact | null>;
    current(eventId: string): Promise<Impact | null>;
    /** Revisions above `revision`, oldest first, at most `limit` of the newest. */
    since(eventId: string, revision: number, limit: number): Promise<Impact[]>;
    /** The newest impact of an advisory at a stage. */
    ofAdvisory(advisoryId: string, stage: Impact['stage']): Promise<Impact | null>;
    bulk(eventId: string, revision: number, name: BulkName): Promise<Uint8Array | null>;
  };
  log: {
    /** Same key and event: the entry stored the first time is answered again. */
    add(entry: Omit<LogEntry, 'id' | 'sequence'>, idempotencyKey: string | null): Promise<{ entry: LogEntry; repeated: boolean }>;
    list(eventId: string, page: Page): Promise<Listed<LogEntry>>;
  };
  ping(): Promise<void>;
  close(): Promise<void>;
}
