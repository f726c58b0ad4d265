import { EARTH_RADIUS_KM } from '../geo';
import type { Blocks, Places } from './blocks';

/**
 * Corners of a square lattice laid over a block of places in the plane that touches the sphere at the block's centre. Winds of a
 * member vary little over a few kilometres, so they are computed at the corners and read off between them: place `i` of the block
 * takes `weight[4 i + k]` of corner `corner[4 i + k]`. Only corners that some place needs are kept.
 */
export interface Lattice {
  count: number;
  xyz: Float64Array;
  corner: Uint32Array;
  weight: Float32Array;
}

export function makeLattice(places: Places, blocks: Blocks, block: number, spacingKm: number): Lattice {
  const from = blocks.start[block];
  const count = blocks.start[block + 1] - from;
  const { x, y, frame } = inPlane(places, blocks, block);
  const step = spacingKm / EARTH_RADIUS_KM;
  const x0 = Math.min(...x);
  const y0 = Math.min(...y);
  const columns = Math.floor((Math.max(...x) - x0) / step) + 2;
  const number = new Map<number, number>();
  const corner = new Uint32Array(count * 4);
  const weight = new Float32Array(count * 4);
  for (let i = 0; i < count; i++) {
    const u = (x[i] - x0) / step;
    const v = (y[i] - y0) / step;
    const column = Math.floor(u);
    const row = Math.floor(v);
    const fx = u - column;
    const fy = v - row;
    const weights = [(1 - fx) * (1 - fy), fx * (1 - fy), (1 - fx) * fy, fx * fy];
    for (let k = 0; k < 4; k++) {
      const cell = (row + (k >> 1)) * columns + column + (k & 1);
      let at = number.get(cell);
      if (at === undefined) number.set(cell, (at = number.size));
      corner[i * 4 + k] = at;
      weight[i * 4 + k] = weights[k];
    }
  }
  // Where places are sparser than corners, each is a corner of its own.
  if (number.size >= count) return ownCorners(places, from, count);
  const xyz = new Float64Array(number.size * 3);
  for (const [cell, at] of number) {
    const px = x0 + (cell % columns) * step;
    const py = y0 + Math.floor(cell / columns) * step;
    const pz = Math.sqrt(1 - px * px - py * py);
    for (let axis = 0; axis < 3; axis++) xyz[at * 3 + axis] = px * frame.east[axis] + py * frame.north[axis] + pz * frame.up[axis];
  }
  return { count: number.size, xyz, corner, weight };
}

function ownCorners(places: Places, from: number, count: number): Lattice {
  const corner = new Uint32Array(count * 4);
  const weight = new Float32Array(count * 4);
  for (let i = 0; i < count; i++) {
    corner.fill(i, i * 4, i * 4 + 4);
    weight[i * 4] = 1;
  }
  return { count, xyz: places.xyz.slice(from * 3, (from + count) * 3), corner, weight };
}

/** Components of a block's places along two directions square to the block's centre, in earth radii. */
function inPlane(places: Places, blocks: Blocks, block: number) {
  const up = Array.from(blocks.centre.subarray(block * 3, block * 3 + 3));
  // Any direction that is not the centre's own will do to start from.
  const other = Math.abs(up[2]) < 0.9 ? [0, 0, 1] : [1, 0, 0];
  const east = unit(cross(other, up));
  const north = cross(up, east);
  const from = blocks.start[block];
  const count = blocks.start[block + 1] - from;
  const along = (axis: number[]): Float64Array =>
    Float64Array.from({ length: count }, (_, i) => {
      const o = (from + i) * 3;
      return places.xyz[o] * axis[0] + places.xyz[o + 1] * axis[1] + places.xyz[o + 2] * axis[2];
    });
  return { x: along(east), y: along(north), frame: { east, north, up } };
}

const cross = (a: number[], b: number[]): number[] => [a[1] * b[2] - a[2] * b[1], a[2] * b[0] - a[0] * b[2], a[0] * b[1] - a[1] * b[0]];
const unit = (a: number[]): number[] => {
  const length = Math.hypot(...a);
  return a.map((value) => value / length);
};
