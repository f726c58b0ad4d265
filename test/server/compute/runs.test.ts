import { mkdtempSync, rmSync } from 'node:fs';
import { tmpdir } from 'node:os';
import { join } from 'node:path';
import { pino } from 'pino';
import { afterAll, afterEach, beforeEach, describe, expect, test } from 'vitest';
import type { Impact } from '../../../lib/impact';
import type { RunFailed } from '../../../lib/wire';
import { makeBus } from '../../../server/bus';
import { openRuns } from '../../../server/compute/runs';
import type { Pool } from '../../../server/compute/pool';
import type { Bus, Runs } from '../../../server/services';
import { openStore } from '../../../server/store';
import type { OpenedStore } from '../../../server/store';
import { recurving } from '../../hazard/storms';
import { here } from './here';
import { islandLayers, writeIsland } from './world';

const folder = mkdtempSync(join(tmpdir(), 'leeboard-runs-'));
const coast = join(folder, 'coast.geojson');
writeIsland(coast);

afterAll(() => rmSync(folder, { recursive: true, force: true }));

let store: OpenedStore;
let bus: Bus;
let runs: Runs;
let published: Impact[];
let failures: RunFailed[];
let dataDir: string;

function open(pool: Pool = here): Runs {
  return openRuns({ settings: { MEMBERS: 10 }, store, bus, logger: pino({ level: 'silent' }), clock: { nowMs: () => Date.parse('2031-09-19T11:00:00Z') }, demoCoastFile: coast, pool });
}

beforeEach(async () => {
  dataDir = mkdtempSync(join(folder, 'data-'));
  store = await openStore({ DATA_DIR: dataDir, DATABASE_URL: undefined });
  bus = makeBus();
  published = [];
  failures = [];
  bus.on('impact', (impact) => published.push(impact));
  bus.on('failed', (failure) => failures.push(failure));
  await store.events.add({ id: 'E', name: 'Quillon', timeZone: 'Etc/GMT+3', exercise: true, demo: true, clock: null, createdAt: '2031-09-19T09:00:00.000Z' });
  for (const layer of islandLayers()) {
    await store.layers.add({ eventId: 'E', kind: layer.kind, name: layer.name, rows: 1, classes: [], source: layer, receivedAt: '2031-09-19T08:00:00.000Z', receivedBy: 'Mara' });
  }
  runs = open();
});
afterEach(async () => {
  await runs.close();
  await store.close();
});

async function accept(number: string, issuedAt = recurving.issuedAt): Promise<string> {
  const { advisory } = await store.advisories.add({
    eventId: 'E',
    advisory: { ...recurving, number, issuedAt },
    format: 'json',
    warnings: [],
    source: { bytes: Uint8Array.of(1), contentType: 'application/json', fileName: null },
    receivedAt: '2031-09-19T09:05:00.000Z',
    receivedBy: 'Mara',
    idempotencyKey: null,
  });
  return advisory.id;
}

const finished = (advisoryId: string, stage: Impact['stage'] = 'members'): Promise<Impact> =>
  new Promise((resolve) => {
    const held = published.find((impact) => impact.advisoryId === advisoryId && impact.stage === stage);
    if (held) return resolve(held);
    const stop = bus.on('impact', (impact) => {
      if (impact.advisoryId !== advisoryId || impact.stage !== stage) return;
      stop();
      resolve(impact);
    });
  });

describe('a run', () => {
  test('publishes the track first and the members after, each a revision', async () => {
    const id = await accept('5');
    runs.request('E');
    await finished(id);
    expect(published.map(({ revision, stage, advisoryId }) => [revision, stage, advisoryId])).toEqual([[1, 'track', id], [2, 'members', id]]);
    expect(await store.impacts.bulk('E', 2, 'peak')).not.toBeNull();
    expect(await store.impacts.bulk('E', 2, 'chance34')).not.toBeNull();
  });

  test('says what changed since the advisory before, stage for stage', async () => {
    const first = await accept('4', '2031-09-19T03:00:00Z');
    runs.request('E');
    await finished(first);
    const second = await accept('5');
    runs.request('E');
    await finished(second);
    expect(published.map(({ change }) => change && [change.sinceAdvisoryId, change.basis])).toEqual([null, null, [first, 'track'], [first, 'members']]);
  });

  test('is cancelled by a newer advisory, whose impact is the last word', async () => {
    await accept('4', '2031-09-19T03:00:00Z');
    runs.request('E');
    const newer = await accept('5');
    runs.request('E');
    const last = await finished(newer);
    expect(last.revision).toBe(Math.max(...published.map(({ revision }) => revision)));
    expect(published.filter(({ stage }) => stage === 'members').map(({ advisoryId }) => advisoryId)).toEqual([newer]);
  });

  test('of the same inputs gives the same impact', async () => {
    const id = await accept('5');
    runs.request('E');
    const first = await finished(id);
    published.length = 0;
    runs.request('E');
    const second = await finished(id);
    expect({ ...second, revision: 0 }).toEqual({ ...first, revision: 0 });
  });

  test('that fails says so, and the last good revision stays', async () => {
    const id = await accept('5');
    runs.request('E');
    await finished(id);
    await runs.close();
    runs = open({ ...here, track: () => Promise.reject(new Error('broken')) });
    const failed = new Promise((resolve) => bus.on('failed', resolve));
    runs.request('E');
    await failed;
    expect(failures[0]).toMatchObject({ eventId: 'E', advisoryId: id });
    expect(failures[0].message).not.toContain('broken');
    expect((await store.impacts.current('E'))?.revision).toBe(2);
  });
});

describe('after a crash', () => {
  test('an accepted advisory that was never computed is computed', async () => {
    const id = await accept('5');
    await runs.resume();
    expect((await finished(id)).stage).toBe('members');
  });

  test('one whose members were not reached is computed again, under a higher revision', async () => {
    const id = await accept('5');
    runs.request('E');
    const track = await finished(id, 'track');
    await runs.close();
    runs = open();
    await runs.resume();
    expect((await finished(id)).revision).toBeGreaterThan(track.revision);
  });

  test('a finished one is left alone', async () => {
    const id = await accept('5');
    runs.request('E');
    await finished(id);
    await runs.close();
    runs = open();
    await runs.resume();
    expect(runs.waiting).toBe(0);
  });
});
