import type { Point } from './model';

const RADIANS = Math.PI / 180;
/** Mean earth radius (IUGG), 6371.0088 km, in nautical miles. */
const EARTH_RADIUS_NMI = 6371.0088 / 1.852;
const COMPASS = ['NORTH', 'NORTH-NORTHEAST', 'NORTHEAST', 'EAST-NORTHEAST', 'EAST', 'EAST-SOUTHEAST', 'SOUTHEAST', 'SOUTH-SOUTHEAST', 'SOUTH', 'SOUTH-SOUTHWEST', 'SOUTHWEST', 'WEST-SOUTHWEST', 'WEST', 'WEST-NORTHWEST', 'NORTHWEST', 'NORTH-NORTHWEST'] as const;

/** Great-circle distance (nmi), initial bearing (degrees, 0 to 360) and mean speed (kt) from one point to the next; speed is infinite where no time passes. */
export function motionBetween(from: Point, to: Point): { distanceNmi: number; bearingDeg: number; speedKt: number } {
  const [fromLat, toLat, dLon] = [from.lat * RADIANS, to.lat * RADIANS, (to.lon - from.lon) * RADIANS];
  const haversine = Math.sin((toLat - fromLat) / 2) ** 2 + Math.cos(fromLat) * Math.cos(toLat) * Math.sin(dLon / 2) ** 2;
  const distanceNmi = 2 * EARTH_RADIUS_NMI * Math.asin(Math.min(1, Math.sqrt(haversine)));
  const bearing = Math.atan2(Math.sin(dLon) * Math.cos(toLat), Math.cos(fromLat) * Math.sin(toLat) - Math.sin(fromLat) * Math.cos(toLat) * Math.cos(dLon));
  const hours = (Date.parse(to.validAt) - Date.parse(from.validAt)) / 3_600_000;
  return { distanceNmi, bearingDeg: (bearing / RADIANS + 360) % 360, speedKt: distanceNmi === 0 ? 0 : distanceNmi / hours };
}

/** The compass point, of sixteen, nearest to a bearing in degrees, as bulletins spell it. */
export const compassName = (bearingDeg: number): string => COMPASS[Math.round(bearingDeg / 22.5) % 16]!;
