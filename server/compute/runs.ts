import { createHash, randomUUID } from 'node:crypto';
import type { Logger } from 'pino';
import type { Impact, RunParticulars } from '../../lib/impact';
import { withPast } from '../../lib/track';
import { eventNowMs } from '../../lib/wire';
import type { StoredAdvisory } from '../../lib/wire';
import type { Bus, Runs, WallClock } from '../services';
import type { Settings } from '../settings';
import type { EventRecord, Store } from '../store/model';
import { openExposures } from './exposures';
import { openPool } from './pool';
import type { Pool } from './pool';
import { runMembers } from './runMembers';

export interface RunsOptions {
  settings: Pick<Settings, 'MEMBERS'>;
  store: Store;
  bus: Bus;
  logger: Logger;
  clock: WallClock;
  /** The coast of a demo event, as a GeoJSON file. */
  demoCoastFile: string;
  pool?: Pool;
}

interface Run {
  runId: string;
  advisoryId: string;
  cancelled: boolean;
  finished: Promise<void>;
}

class Cancelled extends Error {}

/**
 * Computes each event's newest advisory: the track first, published at once, the members after. A new request cancels what is
 * under way for the same event; events take turns on the same threads.
 */
export function openRuns({ settings, store, bus, logger, clock, demoCoastFile, pool = openPool() }: RunsOptions): Runs {
  const exposures = openExposures(store, pool, demoCoastFile);
  const underWay = new Map<string, Run>();
  let closing = false;

  function request(eventId: string): void {
    if (closing) return;
    const before = underWay.get(eventId);
    if (before) before.cancelled = true;
    const run: Run = { runId: randomUUID(), advisoryId: '', cancelled: false, finished: Promise.resolve() };
    underWay.set(eventId, run);
    run.finished = (before?.finished ?? Promise.resolve())
      .then(() => compute(eventId, run))
      .catch((error: unknown) => fail(eventId, run, error))
      .finally(() => {
        if (underWay.get(eventId) === run) underWay.delete(eventId);
      });
  }

  async function compute(eventId: string, run: Run): Promise<void> {
    const stopIfCancelled = (): void => {
      if (run.cancelled || closing) throw new Cancelled();
    };
    stopIfCancelled();
    const [event, advisory] = await Promise.all([store.events.get(eventId), store.advisories.latest(eventId)]);
    if (!event || !advisory) return;
    run.advisoryId = advisory.id;
    const started = performance.now();
    const exposure = await exposures.of(event);
    stopIfCancelled();
    const earlier = await earlierThan(advisory, 'track');
    const seed = seedOf(advisory);
    const known = withPast(advisory, await advisoriesBefore(advisory));
    const trackAnswer = await pool.track({ advisory: known, exposure, run: particulars(event, advisory, seed), earlier });
    stopIfCancelled();
    bus.emit('impact', await store.impacts.publish({ impact: trackAnswer.impact, bulk: trackAnswer.bulk }));
    const trackMs = performance.now() - started;

    const sampled = await pool.sample({ advisory: known, members: settings.MEMBERS, seed, exposure, coastFile: exposures.coastFile(event) });
    stopIfCancelled();
    const parts = await runMembers(pool, sampled, exposure, stopIfCancelled, (done, of) => bus.emit('progress', { eventId, runId: run.runId, done, of }));
    const members = await pool.assemble({
      exposure,
      run: particulars(event, advisory, seed),
      earlier: await earlierThan(advisory, 'members'),
      hazard: trackAnswer.hazard,
      sampled,
      ...parts,
    });
    stopIfCancelled();
    const { peak, arrival } = trackAnswer.bulk;
    bus.emit('impact', await store.impacts.publish({ impact: members.impact, bulk: { peak, arrival, ...members.bulk } }));
    logger.info({ eventId, advisory: advisory.number, trackMs: Math.round(trackMs), membersMs: Math.round(performance.now() - started - trackMs) }, 'impact computed');
  }

  /** The advisories that may hold where the storm was in the two days before this one. */
  async function advisoriesBefore(advisory: StoredAdvisory): Promise<StoredAdvisory[]> {
    const { items } = await store.advisories.list(advisory.eventId, { offset: 0, limit: 200 });
    return items.filter((other) => other.sequence < advisory.sequence);
  }

  /** The impact to measure change against: that of the advisory before, at the same stage. */
  async function earlierThan(advisory: StoredAdvisory, stage: Impact['stage']) {
    const before = await store.advisories.before(advisory);
    if (!before) return null;
    const impact = (await store.impacts.ofAdvisory(before.id, stage)) ?? (await store.impacts.ofAdvisory(before.id, 'track'));
    return impact ? { impact, number: before.number } : null;
  }

  function particulars(event: EventRecord, advisory: StoredAdvisory, seed: number): RunParticulars {
    const wallMs = clock.nowMs();
    return {
      eventId: event.id,
      advisoryId: advisory.id,
      issuedAtMs: Date.parse(advisory.issuedAt),
      nowMs: eventNowMs(event.clock, wallMs),
      seed,
      computedAt: new Date(wallMs).toISOString(),
    };
  }

  function fail(eventId: string, run: Run, error: unknown): void {
    if (error instanceof Cancelled || run.cancelled || closing) return;
    logger.error({ eventId, runId: run.runId, err: error }, 'run failed');
    bus.emit('failed', { eventId, runId: run.runId, advisoryId: run.advisoryId, message: 'The impact could not be computed. The last good one is still shown; the reason is in the server log.' });
  }

  return {
    request,
    underWay: (eventId) => {
      const run = underWay.get(eventId);
      return run ? { runId: run.runId, advisoryId: run.advisoryId } : null;
    },
    get waiting() {
      return underWay.size;
    },
    async resume() {
      const { items } = await store.events.list({ offset: 0, limit: 10_000 });
      for (const event of items) {
        const advisory = await store.advisories.latest(event.id);
        if (!advisory) continue;
        const impact = await store.impacts.ofAdvisory(advisory.id, 'members');
        const layers = await store.layers.current(event.id);
        if (!impact || layers.some((layer) => layer.receivedAt > impact.computedAt)) request(event.id);
      }
    },
    async close() {
      closing = true;
      await Promise.allSettled([...underWay.values()].map((run) => run.finished));
      await pool.close();
    },
  };
}

/** The same forecast draws the same members. */
function seedOf(advisory: StoredAdvisory): number {
  const { storm, number, issuedAt, points } = advisory;
  return createHash('sha256').update(JSON.stringify([storm, number, issuedAt, points])).digest().readInt32LE(0);
}
