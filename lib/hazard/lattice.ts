import { EARTH_RADIUS_KM } from '../geo';
import type { Blocks, Places } from './blocks';

/**
 * Corners of a square lattice laid over a block of places in the plane that touches the sphere at the block's centre. Winds of a
 * member vary little over a few kilometres, so they are computed at the corners and read off between them: place `i` of the block
 * lies in square `square[i]` and takes `weight[4 i + k]` of that square's corner `corner[4 square + k]`. Only squares that hold a
 * place are kept.
 */
export interface Lattice {
  /** Corners, as unit vectors. */
  count: number;
  xyz: Float64Array;
  squares: number;
  corner: Uint32Array;
  square: Uint32Array;
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
  const cornerOf = new Map<number, number>();
  const squareOf = new Map<number, number>();
  const corner: number[] = [];
  const square = new Uint32Array(count);
  const weight = new Float32Array(count * 4);
  for (let i = 0; i < count; i++) {
    const u = (x[i] - x0) / step;
    const v = (y[i] - y0) / step;
    const column = Math.floor(u);
    const row = Math.floor(v);
    const cell = row * columns + column;
    if (!squareOf.has(cell)) {
      squareOf.set(cell, squareOf.size);
      for (let k = 0; k < 4; k++) {
        const at = cell + (k >> 1) * columns + (k & 1);
        if (!cornerOf.has(at)) cornerOf.set(at, cornerOf.size);
        corner.push(cornerOf.get(at)!);
      }
    }
    square[i] = squareOf.get(cell)!;
    const fx = u - column;
    const fy = v - row;
    weight.set([(1 - fx) * (1 - fy), fx * (1 - fy), (1 - fx) * fy, fx * fy], i * 4);
  }
  // Where places are sparser than corners, each is a corner of its own.
  if (cornerOf.size >= count) return ownCorners(places, from, count);
  const xyz = new Float64Array(cornerOf.size * 3);
  for (const [cell, at] of cornerOf) {
    const px = x0 + (cell % columns) * step;
    const py = y0 + Math.floor(cell / columns) * step;
    const pz = Math.sqrt(1 - px * px - py * py);
    for (let axis = 0; axis < 3; axis++) xyz[at * 3 + axis] = px * frame.east[axis] + py * frame.north[axis] + pz * frame.up[axis];
  }
  return { count: cornerOf.size, xyz, squares: squareOf.size, corner: Uint32Array.from(corner), square, weight };
}

function ownCorners(places: Places, from: number, count: number): Lattice {
  const weight = new Float32Array(count * 4);
  for (let i = 0; i < count; i++) weight[i * 4] = 1;
  return {
    count,
    xyz: places.xyz.slice(from * 3, (from + count) * 3),
    squares: count,
    corner: Uint32Array.from({ length: count * 4 }, (_, at) => at >> 2),
    square: Uint32Array.from({ length: count }, (_, i) => i),
    weight,
  };
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
