import { gunzipSync } from 'node:zlib';
import { mkdtempSync, rmSync } from 'node:fs';
import { tmpdir } from 'node:os';
import { join } from 'node:path';
import { booleanPointInPolygon } from '@turf/turf';
import type { FeatureCollection, MultiPolygon } from 'geojson';
import { afterAll, beforeAll, describe, expect, test } from 'vitest';
import { openAssets, pageOfAssets } from '../../../server/compute/bulk';
import { compile, track } from '../../../server/compute/worker';
import { openPool } from '../../../server/compute/pool';
import type { Pool } from '../../../server/compute/pool';
import { runMembers } from '../../../server/compute/runMembers';
import { recurving } from '../../hazard/storms';
import { here } from './here';
import { islandLayers, writeIsland } from './world';

const folder = mkdtempSync(join(tmpdir(), 'leeboard-compute-'));
const coastFile = join(folder, 'coast.geojson');
writeIsland(coastFile);
afterAll(() => rmSync(folder, { recursive: true, force: true }));

const MEMBERS = 60;
const run = { eventId: 'E', advisoryId: 'A', issuedAtMs: Date.parse(recurving.issuedAt), nowMs: Date.parse(recurving.issuedAt), seed: 3, computedAt: '2031-09-19T11:00:00.000Z' };
const exposure = compile({ key: 'island', layers: islandLayers(), coastFile });
const trackAnswer = track({ advisory: recurving, exposure, run, earlier: null });
const read = (bytes: Uint8Array | undefined) => JSON.parse(gunzipSync(bytes!).toString()) as FeatureCollection<MultiPolygon>;

async function members(pool: Pool) {
  const sampled = await pool.sample({ advisory: recurving, members: MEMBERS, seed: 3, exposure, coastFile });
  const parts = await runMembers(pool, sampled, exposure, () => {}, () => {});
  return pool.assemble({ exposure, run, earlier: null, hazard: trackAnswer.hazard, sampled, ...parts });
}

describe('the forecast track over an island', () => {
  const { impact, bulk } = trackAnswer;

  test('counts everyone, and everyone in zones', () => {
    expect(impact.totals.people).toBeGreaterThan(20_000);
    expect(impact.totals.peopleInZones).toBe(impact.totals.people);
    expect(impact.zones.map(({ people }) => people).reduce((a, b) => a + b)).toBe(impact.totals.people);
  });

  test('brings a hurricane over the island and none to an asset on another ocean', async () => {
    expect(impact.totals.peopleAtOrAbove['64'].track).toBeGreaterThan(0);
    const rows = await openAssets(bulk.assets!);
    const page = await pageOfAssets(rows, { offset: 0, limit: 10 });
    expect(page.items.filter(({ maxWindKt }) => maxWindKt > 34).map(({ id }) => id).sort()).toEqual(['h1', 'h2']);
    expect(page.items[2]).toMatchObject({ id: 'h3', maxWindKt: 0, arrival: { '34': { track: null } } });
  });

  test('ground lowers the wind: no place on the island has the full marine wind of 100 kt', () => {
    expect(impact.totals.maxWindKt).toBeGreaterThan(60);
    expect(impact.totals.maxWindKt).toBeLessThan(90);
  });

  test('draws bands that hold the hit assets', () => {
    const bands = read(bulk.peak).features;
    expect(bands.map(({ properties }) => (properties as { thresholdKt: number }).thresholdKt)).toEqual([34, 50, 64]);
    expect(booleanPointInPolygon([-48.4, 25.6], bands[0].geometry)).toBe(true);
    expect(booleanPointInPolygon([20, -40], bands[0].geometry)).toBe(false);
  });

  test('arrival areas grow with time', () => {
    const areas = read(bulk.arrival).features.map(({ properties }) => (properties as { leadHours: number }).leadHours);
    expect(areas).toEqual([...areas].sort((a, b) => a - b));
    expect(areas.length).toBeGreaterThan(3);
  });
});

describe('members over an island', () => {
  let alone: Awaited<ReturnType<typeof members>>;
  let pool: Pool;
  beforeAll(async () => {
    alone = await members(here);
    pool = openPool(2);
  });
  afterAll(() => pool.close());

  test('give ranges around the mean, and chances', () => {
    const { impact } = alone;
    const { mean, p10, p50, p90 } = impact.totals.peopleAtOrAbove['34'];
    expect(impact).toMatchObject({ stage: 'members', members: MEMBERS });
    expect(p10!).toBeLessThanOrEqual(p50!);
    expect(p50!).toBeLessThanOrEqual(p90!);
    expect(mean!).toBeGreaterThan(0);
    expect(impact.zones[0].chance['34']).toBeGreaterThanOrEqual(impact.zones[0].chance['50']!);
  });

  test('asset rows carry chance and moments in step with the impact', async () => {
    const row = (await openAssets(alone.bulk.assets!)).row(0);
    expect(row.chance['34']).toBeGreaterThan(0.5);
    expect(Date.parse(row.arrival['34'].early!)).toBeLessThanOrEqual(Date.parse(row.arrival['34'].late!));
  });

  test('two threads give the same bytes as none', async () => {
    const threaded = await members(pool);
    expect(threaded.impact).toEqual(alone.impact);
    expect(Buffer.from(threaded.bulk.assets!).equals(Buffer.from(alone.bulk.assets!))).toBe(true);
    expect(Buffer.from(threaded.bulk.chance34!).equals(Buffer.from(alone.bulk.chance34!))).toBe(true);
  });
});
