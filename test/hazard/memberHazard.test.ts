import { describe, expect, test } from 'vitest';
import { makeBlocks, memberHazard, memberPaths, nodeLeads, placesAt, tabulateStorm } from '../../lib/hazard';
import type { MemberChunk, Targets } from '../../lib/hazard';
import { mergeChunks } from '../../lib/impact';
import type { MemberSummary } from '../../lib/impact';
import { PUBLISHED_ERRORS, sampleMembers } from '../../lib/members';
import { makeTrack } from '../../lib/track';
import { recurving } from './storms';

const MEMBERS = 100;
const track = makeTrack(recurving);
const leads = nodeLeads(track, 1);
const table = tabulateStorm(track, leads);
const paths = memberPaths(table, sampleMembers(track, leads, { count: MEMBERS, seed: 11, model: PUBLISHED_ERRORS, land: null }), 28);

/** A dense town of 1,600 places, a kilometre apart; every other place is an asset, the rest hold people of two zones. */
const SIDE = 40;
const count = SIDE * SIDE;
const lat = Float64Array.from({ length: count }, (_, i) => 25.6 + 0.009 * Math.floor(i / SIDE));
const lon = Float64Array.from({ length: count }, (_, i) => -47.6 + 0.01 * (i % SIDE));
const factor = Float32Array.from({ length: count }, (_, i) => (i % 3 === 0 ? 1 : 0.8));
const places = placesAt(lat, lon, factor);
const asset = Int32Array.from({ length: count }, (_, i) => (i % 2 ? (i - 1) / 2 : -1));

const targets = (blockSize: number): Targets => ({
  places,
  blocks: makeBlocks(places, asset, blockSize),
  milliPeople: Float64Array.from({ length: count }, (_, i) => (i % 2 ? 0 : 1500)),
  zone: Int32Array.from({ length: count }, (_, i) => (i % 2 ? -1 : i < count / 2 ? 0 : 1)),
  asset,
  assetClass: Uint16Array.from({ length: count / 2 }, (_, a) => a % 2),
  zoneCount: 2,
  classCount: 2,
});

const size = { members: MEMBERS, assets: count / 2, zones: 2, classes: 2 };

function run(blockSize: number, blocksPerChunk: number): MemberSummary {
  const shared = targets(blockSize);
  const chunks: MemberChunk[] = [];
  for (let b = 0; b < shared.blocks.count; b += blocksPerChunk) chunks.push(memberHazard(table, paths, shared, b, Math.min(shared.blocks.count, b + blocksPerChunk)));
  return mergeChunks(chunks, size);
}

const whole = run(2048, 1);
/** Blocks of one place are too sparse for a lattice: every place is computed by itself. */
const direct = run(1, count);

describe('the lattice against every place by itself', () => {
  test('chances differ by less than one member in a hundred on average, and by no more than four', () => {
    let sum = 0;
    let most = 0;
    whole.reached.forEach((reached, i) => {
      const difference = Math.abs(reached - direct.reached[i]);
      sum += difference;
      most = Math.max(most, difference);
    });
    expect(sum / whole.reached.length).toBeLessThan(0.35);
    expect(most).toBeLessThanOrEqual(4);
  });

  test('early, median and late arrival differ by less than a quarter of an hour on average', () => {
    let sum = 0;
    let n = 0;
    whole.moments.forEach((lead, i) => {
      if (Number.isNaN(lead) || Number.isNaN(direct.moments[i])) return;
      sum += Math.abs(lead - direct.moments[i]);
      n++;
    });
    expect(n).toBeGreaterThan(1000);
    expect(sum / n).toBeLessThan(0.25);
  });
});

describe('members over places', () => {
  test('how the work is shared out changes not a bit', () => {
    const few = run(300, 1);
    const many = run(300, 3);
    expect(few).toEqual(many);
  });

  test('chances never rise with the threshold', () => {
    for (let a = 0; a < count / 2; a++) {
      expect(whole.reached[a * 3 + 1]).toBeLessThanOrEqual(whole.reached[a * 3]);
      expect(whole.reached[a * 3 + 2]).toBeLessThanOrEqual(whole.reached[a * 3 + 1]);
    }
  });

  test('early comes before median, and median before late', () => {
    for (let i = 0; i < whole.moments.length; i += 3) {
      if (Number.isNaN(whole.moments[i])) continue;
      expect(whole.moments[i]).toBeLessThanOrEqual(whole.moments[i + 1]);
      expect(whole.moments[i + 1]).toBeLessThanOrEqual(whole.moments[i + 2]);
    }
  });

  test('the people of each member are those of its zones', () => {
    for (let i = 0; i < 3 * MEMBERS; i++) expect(whole.milliPeople[i]).toBe(whole.zoneMilliPeople[i] + whole.zoneMilliPeople[3 * MEMBERS + i]);
  });

  test('assets reached by class are the assets reached', () => {
    const byClass = whole.classReached.reduce((sum, n) => sum + n, 0);
    const byAsset = whole.reached.reduce((sum, n) => sum + n, 0);
    expect(byClass).toBe(byAsset);
    expect(byAsset).toBeGreaterThan(0);
  });
});
