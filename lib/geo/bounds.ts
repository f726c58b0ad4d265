import { normaliseLon } from './sphere';

/** A box in degrees. `east` may be below `west`, or past 180, where the box crosses the antimeridian. */
export interface Bounds {
  west: number;
  south: number;
  east: number;
  north: number;
}

/**
 * The narrowest box around places (degrees), with a margin, in whole degrees. It crosses the antimeridian where that is narrower;
 * `east` then lies past 180. Null for no places.
 */
export function boundsOf(lat: ArrayLike<number>, lon: ArrayLike<number>, marginDeg: number): Bounds | null {
  if (lat.length === 0) return null;
  const occupied = new Uint8Array(360);
  let [south, north] = [Infinity, -Infinity];
  for (let i = 0; i < lat.length; i++) {
    occupied[Math.floor(normaliseLon(lon[i])) + 180] = 1;
    if (lat[i] < south) south = lat[i];
    if (lat[i] > north) north = lat[i];
  }
  const { first, width } = withoutWidestGap(occupied);
  const box = { south: Math.max(-90, Math.floor(south - marginDeg)), north: Math.min(90, Math.ceil(north + marginDeg)) };
  const margin = Math.ceil(marginDeg);
  if (width + 2 * margin >= 360) return { ...box, west: -180, east: 180 };
  const west = normaliseLon(first - 180 - margin);
  return { ...box, west, east: west + width + 2 * margin };
}

/** The run of degrees of longitude that holds every occupied one: all but the widest gap on the circle. */
function withoutWidestGap(occupied: Uint8Array): { first: number; width: number } {
  let [gapEnd, widest, empty] = [0, 0, 0];
  for (let i = 0; i < 720; i++) {
    empty = occupied[i % 360] ? 0 : empty + 1;
    if (empty > widest) [widest, gapEnd] = [empty, i];
  }
  return { first: (gapEnd + 1) % 360, width: 360 - Math.min(widest, 359) };
}
