import type { Members } from '../members';
import { BINS, binRadius } from './stormTable';
import type { StormTable } from './stormTable';

/** Numbers kept for each node of a path: the centre's unit vector, and the unit vectors to its east (two, the third is 0) and north. */
export const FRAME = 8;

/**
 * Storm paths ready for the kernel, `[path][node]`. A path is the tabulated storm moved to another centre, its wind multiplied by
 * `ratio` and its radius of maximum wind set to `scaleKm`, all other radii in proportion. `reachKm` is where its wind falls below
 * the limit it was made for.
 */
export interface Paths {
  count: number;
  nodes: number;
  limitKt: number;
  frame: Float64Array;
  ratio: Float32Array;
  scaleKm: Float32Array;
  reachKm: Float32Array;
}

const RAD = Math.PI / 180;

function emptyPaths(count: number, nodes: number, limitKt: number, allocate: (bytes: number) => ArrayBufferLike): Paths {
  return {
    count,
    nodes,
    limitKt,
    frame: new Float64Array(allocate(count * nodes * FRAME * 8)),
    ratio: new Float32Array(allocate(count * nodes * 4)),
    scaleKm: new Float32Array(allocate(count * nodes * 4)),
    reachKm: new Float32Array(allocate(count * nodes * 4)),
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
  const scaleKm = size * table.radiusMaxWindKm[node];
  paths.scaleKm[at] = scaleKm;
  paths.reachKm[at] = ratio > 0 ? envelopeReach(table, node, paths.limitKt / ratio) * scaleKm : 0;
}

/** Greatest radius (in radii of maximum wind) at which a node's storm still has `limitKt` somewhere; 0 when it nowhere does. */
function envelopeReach(table: StormTable, node: number, limitKt: number): number {
  const row = node * BINS;
  for (let bin = BINS - 1; bin >= 0; bin--) if (table.envelopeKt[row + bin] >= limitKt) return binRadius(bin + 1);
  return 0;
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
