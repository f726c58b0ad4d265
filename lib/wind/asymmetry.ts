import { motionAsymmetryKt, strongSideDeg } from '../track';

/**
 * What motion adds to the wind (kt) at an azimuth from the centre: `1.5 T^0.63 cos(beta)`, beta the angle from the strong side.
 * Schwerdt, Ho and Watkins (1979), NOAA Technical Report NWS 23. Negative on the weak side. A forecast's maximum wind and its
 * radii already contain it.
 */
export function schwerdtAsymmetryKt(azimuthDeg: number, motionKt: number, motionTowardDeg: number, lat: number): number {
  return motionAsymmetryKt(motionKt) * Math.cos(((azimuthDeg - strongSideDeg(motionTowardDeg, lat)) * Math.PI) / 180);
}

/** Share of the motion that the surface background wind keeps, and its turn (degrees) to the cyclonic side. */
const BACKGROUND_SHARE = 0.55;
const BACKGROUND_TURN_DEG = 20;

/**
 * Surface background wind of a moving storm (kt, and the direction it blows toward): 0.55 of the motion, turned 20 degrees
 * cyclonically. Lin and Chavas (2012), J. Geophys. Res. 117, D09120. A vector to be added to a symmetric vortex.
 */
export function linChavasBackground(motionKt: number, motionTowardDeg: number, lat: number): { windKt: number; towardDeg: number } {
  const turned = motionTowardDeg + (lat < 0 ? BACKGROUND_TURN_DEG : -BACKGROUND_TURN_DEG);
  return { windKt: BACKGROUND_SHARE * motionKt, towardDeg: ((turned % 360) + 360) % 360 };
}
