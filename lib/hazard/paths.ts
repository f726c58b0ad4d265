import { EARTH_RADIUS_KM } from '../geo';
import type { Members } from '../members';
import { reachKm } from './stormTable';
import type { StormTable } from './stormTable';

/** Numbers kept for each node of a path: the centre's unit vector, and the unit vectors to its east (two, the third is 0) and north. */
export const FRAME = 8;

/**
 * Storm paths ready for the kernel, `[path][node]`. A path is the tabulated storm moved to another centre, its wind multiplied by
 * `ratio` and its radii by `size`, of which the inverse root is kept. `reachKm` is where its wind falls below the limit it was
 * made for.
 */
export interface Paths {
  count: number;
  nodes: number;
  limitKt: number;
  frame: Float64Array;
  ratio: Float32Array;
  perRootSize: Float32Array;
  reachKm: Float32Array;
  /** Beyond this the wind is not even looked up: square of the sine of the angular distance at which it is well under the limit. */
  reachSin2: Float32Array;
}

const RAD = Math.PI / 180;

/** Winds are known down to this share of the limit, so that a rise to the limit is seen whole. */
const WELL_UNDER = 0.7;

function emptyPaths(count: number, nodes: number, limitKt: number, allocate: (bytes: number) => ArrayBufferLike): Paths {
  return {
    count,
    nodes,
    limitKt,
    frame: new Float64Array(allocate(count * nodes * FRAME * 8)),
    ratio: new Float32Array(allocate(count * nodes * 4)),
    perRootSize: new Float32Array(allocate(count * nodes * 4)),
    reachKm: new Float32Array(allocate(count * nodes * 4)),
    reachSin2: new Float32Array(allocate(count * nodes * 4)),
  };
}

function setNode(paths: Paths, table: StormTable, node: number, at: number, lat: number, lon: number, ratio: number, size: number): void {
  const sinLat = Math.sin(lat * RAD);
  const cosLat = Math.cos(lat * RAD);
  const sinLon = Math.sin(lon * RAD);
  const cosLon = Math.cos(lon * RAD);
  const o = at * FRAME;
  const { frame } = paths;
  frame[o] = cosLat * cosLon;
  frame[o + 1] = cosLat * sinLon;
  frame[o + 2] = sinLat;
  frame[o + 3] = -sinLon;
  frame[o + 4] = cosLon;
  frame[o + 5] = -sinLat * cosLon;
  frame[o + 6] = -sinLat * sinLon;
  frame[o + 7] = cosLat;
  paths.ratio[at] = ratio;
  paths.perRootSize[at] = 1 / Math.sqrt(size);
  const reach = (limitKt: number): number => (ratio > 0 ? reachKm(table, node, limitKt / ratio) * size : 0);
  paths.reachKm[at] = reach(paths.limitKt);
  paths.reachSin2[at] = Math.sin(Math.min(reach(WELL_UNDER * paths.limitKt) / EARTH_RADIUS_KM, Math.PI / 2)) ** 2;
}

const plain = (bytes: number): ArrayBufferLike => new ArrayBuffer(bytes);

/** The forecast itself as the only path; winds below `limitKt` are not looked for. */
export function forecastPath(table: StormTable, limitKt: number): Paths {
  const nodes = table.leadHours.length;
  const paths = emptyPaths(1, nodes, limitKt, plain);
  for (let i = 0; i < nodes; i++) setNode(paths, table, i, i, table.lat[i], table.lon[i], 1, 1);
  return paths;
}

/** One path a member. `allocate` may hand out shared memory. */
export function memberPaths(table: StormTable, members: Members, limitKt: number, allocate = plain): Paths {
  const nodes = table.leadHours.length;
  const paths = emptyPaths(members.count, nodes, limitKt, allocate);
  for (let m = 0; m < members.count; m++) {
    for (let i = 0; i < nodes; i++) {
      const at = m * nodes + i;
      setNode(paths, table, i, at, members.lat[at], members.lon[at], members.intensityRatio[at], members.sizeRatio[at]);
    }
  }
  return paths;
}
