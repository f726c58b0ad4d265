import { bearingDeg, distanceKm } from '../geo';
import { kmToNmi } from '../units';
import type { Point } from './model';

const COMPASS = ['NORTH', 'NORTH-NORTHEAST', 'NORTHEAST', 'EAST-NORTHEAST', 'EAST', 'EAST-SOUTHEAST', 'SOUTHEAST', 'SOUTH-SOUTHEAST', 'SOUTH', 'SOUTH-SOUTHWEST', 'SOUTHWEST', 'WEST-SOUTHWEST', 'WEST', 'WEST-NORTHWEST', 'NORTHWEST', 'NORTH-NORTHWEST'] as const;

/** Great-circle distance (nmi), initial bearing (degrees, 0 to 360), hours and mean speed (kt) from one point to a later one. */
export function motionBetween(from: Point, to: Point): { distanceNmi: number; bearingDeg: number; hours: number; speedKt: number } {
  const distanceNmi = kmToNmi(distanceKm(from.lat, from.lon, to.lat, to.lon));
  const hours = (Date.parse(to.validAt) - Date.parse(from.validAt)) / 3_600_000;
  return { distanceNmi, bearingDeg: bearingDeg(from.lat, from.lon, to.lat, to.lon), hours, speedKt: distanceNmi === 0 ? 0 : distanceNmi / hours };
}

/** The compass point, of sixteen, nearest to a bearing in degrees, as bulletins spell it. */
export const compassName = (bearing: number): string => COMPASS[Math.round(bearing / 22.5) % 16]!;
