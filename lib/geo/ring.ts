import type { Position } from 'geojson';
import { destination, normaliseLon } from './sphere';

/** Radii (km) in the north-east, south-east, south-west and north-west quadrants. */
export type QuadrantKm = readonly [ne: number, se: number, sw: number, nw: number];

const STEPS_PER_QUADRANT = 24;

/**
 * The outline of radii by quadrant: geodesic arcs joined along the cardinal directions, as a closed RFC 7946 linear ring
 * (right-hand rule: counterclockwise). Longitudes run on past 180 where the ring crosses the antimeridian, so that it never
 * jumps: pass it through `cutAtAntimeridian` before it is written. Empty where no quadrant has a radius.
 */
export function quadrantRing(lat: number, lon: number, radiiKm: QuadrantKm): Position[] {
  for (const radiusKm of radiiKm) if (!(radiusKm >= 0)) throw new RangeError(`Unexpected radius: ${radiusKm} km. A radius is 0 or more.`);
  if (radiiKm.every((radiusKm) => radiusKm === 0)) return [];
  const ring: Position[] = [];
  for (let quadrant = 3; quadrant >= 0; quadrant--) {
    if (radiiKm[quadrant] === 0) {
      push(ring, [lon, lat]);
      continue;
    }
    for (let step = STEPS_PER_QUADRANT; step >= 0; step--) {
      const azimuth = 90 * (quadrant + step / STEPS_PER_QUADRANT);
      const place = destination(lat, lon, azimuth, radiiKm[quadrant]);
      push(ring, [lon + normaliseLon(place.lon - lon), place.lat]);
    }
  }
  ring.push([...ring[0]]);
  return ring;
}

function push(ring: Position[], position: Position): void {
  const last = ring[ring.length - 1];
  if (!last || Math.abs(last[0] - position[0]) > 1e-12 || Math.abs(last[1] - position[1]) > 1e-12) ring.push(position);
}
