import { decodeText, readAdvisory } from '../../lib/advisory';
import type { Advisory, InputError, ReadOptions, Reading } from '../../lib/advisory';
import { eventNowMs } from '../../lib/wire';
import type { StoredAdvisory } from '../../lib/wire';
import { holdsNul } from '../holdsNul';
import type { Services } from '../services';
import type { EventRecord, Source } from '../store';

/** An exercise's clock is set this long after the issue of an advisory, where a room would be at work on it. */
const CLOCK_AFTER_ISSUE_MS = 2 * 3_600_000;

/** How the sender says a file is to be read; without it, the form is told from the content. */
export type HowToRead = Pick<ReadOptions, 'format' | 'technique' | 'cycle'>;

export interface Received {
  event: EventRecord;
  source: Source;
  how?: HowToRead;
  /** Name of whoever sent it. */
  by: string;
  /** Same key and event again: the same answer again, and nothing new. */
  idempotencyKey: string | null;
  /** The exercise's clock goes to this advisory; without it, only a first advisory sets the clock of an exercise that has none. */
  setsClock?: boolean;
}

export type Accepted =
  | { ok: true; advisory: StoredAdvisory; revision: number; repeated: boolean }
  | { ok: false; reason: 'unreadable' | 'key-reused'; errors: InputError[] };

type Needed = Pick<Services, 'store' | 'bus' | 'runs' | 'clock'>;

const setsClock = ({ event, setsClock: wanted = false }: Pick<Received, 'event' | 'setsClock'>): boolean => event.exercise && (wanted || event.clock === null);

/**
 * Reads and checks a file as it was received, against the event's clock and the advisory before it. Stores nothing. Where the
 * advisory is to set the clock, there is no now to hold it against.
 */
export async function readReceived({ store, clock }: Pick<Needed, 'store' | 'clock'>, received: Pick<Received, 'event' | 'source' | 'how' | 'setsClock'>): Promise<Reading> {
  const { event, source, how = {} } = received;
  const decoded = decodeText(source.bytes);
  if (!decoded.ok) return { ok: false, format: how.format ?? null, errors: [{ message: decoded.message }] };
  const previous = await store.advisories.latest(event.id);
  const now = setsClock(received) ? {} : { nowMs: eventNowMs(event.clock, clock.nowMs()) };
  const reading = readAdvisory(decoded.text, { ...how, ...now, ...(previous ? { previous } : {}) });
  if (reading.ok && holdsNul(reading.advisory)) return { ok: false, format: reading.format, errors: [{ message: 'a name or number holds a NUL character (\\u0000): take it out' }] };
  return reading;
}

/**
 * The one way in: whichever way an advisory came, it is read, checked, on disk, made known and asked to be computed, in this
 * order. When this resolves with `ok`, the advisory outlives the process.
 */
export async function acceptAdvisory(services: Needed, received: Received): Promise<Accepted> {
  const { store, bus, runs, clock } = services;
  const { event, source, idempotencyKey } = received;
  const reading = await readReceived(services, received);
  if (!reading.ok) return { ok: false, reason: 'unreadable', errors: reading.errors };

  const { advisory, repeated } = await store.advisories.add({
    eventId: event.id,
    advisory: reading.advisory,
    format: reading.format,
    warnings: reading.warnings,
    source,
    receivedAt: new Date(clock.nowMs()).toISOString(),
    receivedBy: received.by,
    idempotencyKey,
  });
  if (repeated) {
    const first = await store.advisories.source(event.id, advisory.id);
    if (!first || Buffer.compare(first.bytes, source.bytes) !== 0) {
      return { ok: false, reason: 'key-reused', errors: [{ message: `the Idempotency-Key was used before, for advisory ${advisory.number}, with other content: give each advisory a key of its own` }] };
    }
  } else {
    if (setsClock(received)) await setClock(services, event, reading.advisory);
    bus.emit('advisory', { eventId: event.id, advisory });
    runs.request(event.id);
  }
  const { revision } = (await store.events.get(event.id))!;
  return { ok: true, advisory, revision, repeated };
}

async function setClock({ store, bus, clock }: Needed, event: EventRecord, { issuedAt }: Advisory): Promise<void> {
  const startsAt = new Date(Date.parse(issuedAt) + CLOCK_AFTER_ISSUE_MS).toISOString();
  await store.events.setClock(event.id, { startsAt, anchoredAt: new Date(clock.nowMs()).toISOString(), rate: event.clock?.rate ?? 1 });
  bus.emit('event', { eventId: event.id });
}
