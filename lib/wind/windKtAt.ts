import { bearingDeg, distanceKm } from '../geo';
import type { StormState } from '../track';
import { inflowAngleDeg } from './inflow';
import { profileKt } from './quadrantProfiles';
import type { QuadrantProfiles } from './quadrantProfiles';

const [NE, SE, SW, NW] = [0, 1, 2, 3];

/** Wind (kt) at a radius and azimuth (degrees) from the centre: neighbouring quadrants blended by squared cosines, each alone at its governing azimuth. */
export function windKtAround(profiles: QuadrantProfiles, radiusKm: number, azimuthDeg: number): number {
  const east = Math.sin((azimuthDeg * Math.PI) / 180);
  const north = Math.cos((azimuthDeg * Math.PI) / 180);
  const [first, second] = Math.abs(east) >= Math.abs(north) ? (east > 0 ? [NE, SE] : [SW, NW]) : north > 0 ? [NE, NW] : [SW, SE];
  const weight = (1 + 2 * east * north) / 2;
  return weight * profileKt(profiles, first, radiusKm) + (1 - weight) * profileKt(profiles, second, radiusKm);
}

/**
 * Wind (kt, 1-minute at 10 m over water) of a storm at a place in degrees, and the direction it blows from: along circles round
 * the centre, counterclockwise north of the equator and clockwise south of it, turned inward by the inflow angle.
 */
export function windKtAt(state: StormState, profiles: QuadrantProfiles, lat: number, lon: number): { windKt: number; fromDeg: number } {
  const radiusKm = distanceKm(state.lat, state.lon, lat, lon);
  const windKt = windKtAround(profiles, radiusKm, bearingDeg(state.lat, state.lon, lat, lon));
  const toCentre = bearingDeg(lat, lon, state.lat, state.lon);
  const turn = 90 - inflowAngleDeg(radiusKm, state.radiusMaxWindKm);
  // Toward the centre, turned right by nearly a right angle, is counterclockwise round it.
  const toward = toCentre + (state.lat < 0 ? -turn : turn);
  return { windKt, fromDeg: (((toward + 180) % 360) + 360) % 360 };
}
