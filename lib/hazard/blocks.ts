import { EARTH_RADIUS_KM } from '../geo';
import { FRAME } from './paths';
import type { Paths } from './paths';

/** Where wind is asked for: unit vectors `[place * 3]` and what the ground does to the wind there. */
export interface Places {
  count: number;
  xyz: Float64Array;
  /** Wind at the place's own surface over wind over water. */
  surfaceFactor: Float32Array;
}

const RAD = Math.PI / 180;

export function placesAt(lat: ArrayLike<number>, lon: ArrayLike<number>, surfaceFactor: Float32Array, allocate = (bytes: number): ArrayBufferLike => new ArrayBuffer(bytes)): Places {
  const xyz = new Float64Array(allocate(lat.length * 24));
  for (let i = 0; i < lat.length; i++) {
    const cosLat = Math.cos(lat[i] * RAD);
    xyz[i * 3] = cosLat * Math.cos(lon[i] * RAD);
    xyz[i * 3 + 1] = cosLat * Math.sin(lon[i] * RAD);
    xyz[i * 3 + 2] = Math.sin(lat[i] * RAD);
  }
  return { count: lat.length, xyz, surfaceFactor };
}

/** Runs of neighbouring places, each inside a cap on the sphere: block `b` holds places `start[b]` to `start[b + 1] - 1`. */
export interface Blocks {
  count: number;
  start: Uint32Array;
  centre: Float64Array;
  radiusKm: Float64Array;
}

/**
 * Cuts places, which lie along a space-filling curve, into blocks of about `size`. `owner[i]` names the thing a place belongs to;
 * places of one owner (other than -1) stay in one block.
 */
export function makeBlocks(places: Places, owner: Int32Array | null, size = 2048): Blocks {
  const starts = [0];
  for (let i = 1; i < places.count; i++) {
    const together = owner !== null && owner[i] >= 0 && owner[i] === owner[i - 1];
    if (i - starts[starts.length - 1] >= size && !together) starts.push(i);
  }
  const count = places.count === 0 ? 0 : starts.length;
  const start = Uint32Array.from(count === 0 ? [0] : [...starts, places.count]);
  const centre = new Float64Array(count * 3);
  const radiusKm = new Float64Array(count);
  for (let b = 0; b < count; b++) {
    let x = 0;
    let y = 0;
    let z = 0;
    for (let i = start[b]; i < start[b + 1]; i++) {
      x += places.xyz[i * 3];
      y += places.xyz[i * 3 + 1];
      z += places.xyz[i * 3 + 2];
    }
    const length = Math.hypot(x, y, z) || 1;
    centre.set([x / length, y / length, z / length], b * 3);
    for (let i = start[b]; i < start[b + 1]; i++) radiusKm[b] = Math.max(radiusKm[b], capDistanceKm(centre, b * 3, places.xyz, i * 3));
  }
  return { count, start, centre, radiusKm };
}

function capDistanceKm(a: Float64Array, i: number, b: Float64Array, j: number): number {
  const chord = Math.hypot(a[i] - b[j], a[i + 1] - b[j + 1], a[i + 2] - b[j + 2]);
  return 2 * EARTH_RADIUS_KM * Math.asin(Math.min(1, chord / 2));
}

/** First and last node at which a path can matter to a block, widened by one node each side; `first > last` when it never does. */
export interface Window {
  first: number;
  last: number;
}

export function activeWindow(paths: Paths, path: number, blocks: Blocks, block: number, out: Window): void {
  const { nodes, frame, reachKm } = paths;
  const { centre, radiusKm } = blocks;
  const cx = centre[block * 3];
  const cy = centre[block * 3 + 1];
  const cz = centre[block * 3 + 2];
  const base = path * nodes;
  let first = nodes;
  let last = -1;
  for (let i = 0; i < nodes; i++) {
    const reach = reachKm[base + i];
    if (reach === 0) continue;
    const o = (base + i) * FRAME;
    const dx = frame[o] - cx;
    const dy = frame[o + 1] - cy;
    const dz = frame[o + 2] - cz;
    // A chord is shorter than its arc: comparing it with the arc never drops a node that matters.
    const far = (reach + radiusKm[block]) / EARTH_RADIUS_KM;
    if (dx * dx + dy * dy + dz * dz <= far * far) {
      if (first === nodes) first = i;
      last = i;
    }
  }
  out.first = first === nodes ? nodes : Math.max(0, first - 1);
  out.last = last < 0 ? -1 : Math.min(nodes - 1, last + 1);
}
