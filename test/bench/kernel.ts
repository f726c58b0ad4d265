import { forecastHazard, makeBlocks, memberHazard, memberPaths, nodeLeads, placesAt, tabulateStorm } from '../../lib/hazard';
import type { Targets } from '../../lib/hazard';
import { PUBLISHED_ERRORS, sampleMembers } from '../../lib/members';
import { makeTrack, stormAt } from '../../lib/track';
import { quadrantProfiles, windKtAt } from '../../lib/wind';
import { recurving } from '../hazard/storms';
import { row } from './report';
import type { Row } from './report';

const track = makeTrack(recurving);

function targetsOf(count: number): Targets {
  const side = Math.ceil(Math.sqrt(count));
  const lat = Float64Array.from({ length: count }, (_, i) => 23 + (3 * Math.floor(i / side)) / side);
  const lon = Float64Array.from({ length: count }, (_, i) => -50 + (4 * (i % side)) / side);
  const places = placesAt(lat, lon, new Float32Array(count).fill(1));
  return {
    places,
    blocks: makeBlocks(places, null),
    milliPeople: new Float64Array(count).fill(1000),
    zone: new Int32Array(count).fill(-1),
    asset: new Int32Array(count).fill(-1),
    assetClass: new Uint16Array(0),
    zoneCount: 0,
    classCount: 0,
  };
}

function timed(work: () => void): number {
  const started = performance.now();
  work();
  return performance.now() - started;
}

/** Exponent of cost against size, fitted through (size, ms) pairs. */
function exponent(pairs: [number, number][]): number {
  const logs = pairs.map(([size, ms]) => [Math.log(size), Math.log(ms)]);
  const meanX = logs.reduce((sum, [x]) => sum + x, 0) / logs.length;
  const meanY = logs.reduce((sum, [, y]) => sum + y, 0) / logs.length;
  return logs.reduce((sum, [x, y]) => sum + (x - meanX) * (y - meanY), 0) / logs.reduce((sum, [x]) => sum + (x - meanX) ** 2, 0);
}

function members(count: number, places: number): number {
  const leads = nodeLeads(track, 1);
  const table = tabulateStorm(track, leads);
  const paths = memberPaths(table, sampleMembers(track, leads, { count, seed: 1, model: PUBLISHED_ERRORS, land: null }), 34);
  const targets = targetsOf(places);
  return timed(() => memberHazard(table, paths, targets, 0, targets.blocks.count));
}

/** The kernel on one thread, and against the readable wind field of lib/wind asked at the same times. */
export function benchKernel(): Row[] {
  const targets = targetsOf(2_000);
  const leads = nodeLeads(track, 0.5);
  const table = tabulateStorm(track, leads);
  forecastHazard(table, targets.places, targets.blocks);
  const kernelMs = timed(() => forecastHazard(table, targets.places, targets.blocks));
  const readableMs = timed(() => {
    for (const lead of leads) {
      const state = stormAt(track, lead)!;
      const profiles = quadrantProfiles(state);
      for (let i = 0; i < 2_000; i += 10) windKtAt(state, profiles, 23 + i / 1000, -48);
    }
  }) * 10;
  members(20, 1_000);
  const byMembers: [number, number][] = [100, 200, 400].map((count) => [count, members(count, 10_000)]);
  const byPlaces: [number, number][] = [5_000, 10_000, 20_000].map((count) => [count, members(200, count)]);
  return [
    row('forecast kernel over the readable wind field, 2,000 places', readableMs / kernelMs, 'times faster'),
    row('member kernel, 400 members x 10,000 places, one thread', byMembers[2][1], 'ms'),
    row('cost against members, fitted exponent', exponent(byMembers), ''),
    row('cost against places, fitted exponent', exponent(byPlaces), ''),
  ];
}
