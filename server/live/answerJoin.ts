import type { Impact } from '../../lib/impact';
import type { AdvisoryNotice, JoinAck, Snapshot } from '../../lib/wire';
import type { Services } from '../services';
import type { EventRecord } from '../store/model';
import { MOST_MISSED, MOST_MISSED_BYTES } from './limits';
import { bytesOf } from './bytesOf';

export type JoinAnswer = {
  ack: Extract<JoinAck, { ok: true }>;
  /** The revision the screen holds once it has read the answer. */
  revision: number;
  /** The newest advisory the answer holds; notices of it and of older ones need not follow. */
  advisorySequence: number;
  /** Rule 12: accepted, not yet computed, and not in the answer. */
  advisory: AdvisoryNotice | null;
};

type Needs = Pick<Services, 'store' | 'runs' | 'describeEvent'>;

/** What a screen that holds `held` must be told to be where the event is now (rule 2); null: no such event. */
export async function answerJoin(services: Needs, eventId: string, held: number | null): Promise<JoinAnswer | null> {
  const record = await services.store.events.get(eventId);
  if (!record) return null;
  const missed = held === null ? null : await missedSince(services, record, held);
  return missed ? missedAnswer(services, eventId, missed, held ?? 0) : snapshotAnswer(services, record);
}

async function missedSince({ store }: Needs, record: EventRecord, held: number): Promise<Impact[] | null> {
  const behind = record.revision - held;
  if (behind < 0 || behind > MOST_MISSED) return null;
  const missed = behind === 0 ? [] : await store.impacts.since(record.id, held, MOST_MISSED);
  const whole = missed.length >= behind && missed.every((impact, i) => impact.revision === held + 1 + i);
  return whole && bytesOf(missed) <= MOST_MISSED_BYTES ? missed : null;
}

async function missedAnswer({ store }: Needs, eventId: string, missed: Impact[], held: number): Promise<JoinAnswer> {
  const newest = await store.advisories.latest(eventId);
  const computed = newest && (await store.impacts.ofAdvisory(newest.id, 'members'));
  return {
    ack: { ok: true, missed },
    revision: missed.at(-1)?.revision ?? held,
    advisorySequence: newest?.sequence ?? 0,
    advisory: newest && !computed ? { eventId, advisory: newest } : null,
  };
}

async function snapshotAnswer({ store, runs, describeEvent }: Needs, record: EventRecord): Promise<JoinAnswer> {
  const { id, revision } = record;
  const impact = revision === 0 ? null : await store.impacts.get(id, revision);
  if (revision > 0 && !impact) throw new Error(`Event ${id} is at revision ${revision}, which the store does not hold.`);
  const advisory = await store.advisories.latest(id);
  const snapshot: Snapshot = { event: await describeEvent(record), advisory, impact, computing: runs.underWay(id) };
  return { ack: { ok: true, snapshot }, revision, advisorySequence: advisory?.sequence ?? 0, advisory: null };
}
