import type { QuadrantKm } from '../geo';

/**
 * Climatological size of a tropical cyclone: a modified Rankine vortex `V(r) = Vmax (rm / r)^x` outside `rm`.
 *
 * `rm = 66.785 - 0.09102 V + 1.0619 (|lat| - 25)` km and `x = 0.1147 + 0.0055 V - 0.001 (|lat| - 25)`, V the 1-minute maximum
 * in kt: Knaff and Zehr (2007), Wea. Forecasting 22, 71-88, eqs. 4-6, from the radii climatology of Knaff et al. (2007), Wea.
 * Forecasting 22, 781-791, fitted to the Atlantic. Held within the fit's range: 15 to 165 kt, 8 to 45 degrees.
 */
export function climatologicalVortex(maxWindKt: number, lat: number): { radiusKm: number; exponent: number } {
  const wind = Math.min(Math.max(maxWindKt, 15), 165);
  const north = Math.min(Math.max(Math.abs(lat), 8), 45) - 25;
  return { radiusKm: 66.785 - 0.09102 * wind + 1.0619 * north, exponent: 0.1147 + 0.0055 * wind - 0.001 * north };
}

/**
 * Asymmetry (kt) that a storm's motion adds to the right of its track in the northern hemisphere, to the left in the southern:
 * `1.5 T^0.63`, T the forward speed in kt. Schwerdt, Ho and Watkins (1979), NOAA Technical Report NWS 23.
 */
export const motionAsymmetryKt = (motionKt: number): number => 1.5 * Math.max(0, motionKt) ** 0.63;

/** The azimuth (degrees from north) at which motion adds most to the wind: a right angle to the right (north) or left (south). */
export const strongSideDeg = (motionTowardDeg: number, lat: number): number => motionTowardDeg + (lat < 0 ? -90 : 90);

export const QUADRANT_AZIMUTHS_DEG = [45, 135, 225, 315] as const;

/**
 * Radii (km, NE SE SW NW) at which a storm of these means holds `windKt`: the climatological vortex with the wavenumber-one
 * form `V(r, azimuth) = (Vmax - a)(rm / r)^x + a cos(azimuth - strong side)` of Knaff et al. (2007), eq. 1. 0 where the wind is
 * not reached. The asymmetry `a` is Schwerdt's, at most a quarter of the maximum.
 */
export function climatologyRadiiKm(windKt: number, maxWindKt: number, lat: number, motionKt: number, motionTowardDeg: number): QuadrantKm {
  const { radiusKm, exponent } = climatologicalVortex(maxWindKt, lat);
  const asymmetry = Math.min(motionAsymmetryKt(motionKt), maxWindKt / 4);
  const strong = strongSideDeg(motionTowardDeg, lat);
  const [ne, se, sw, nw] = QUADRANT_AZIMUTHS_DEG.map((azimuth) => {
    const symmetric = windKt - asymmetry * Math.cos(((azimuth - strong) * Math.PI) / 180);
    const peak = maxWindKt - asymmetry;
    return peak > symmetric ? radiusKm * (peak / Math.max(symmetric, 1)) ** (1 / exponent) : 0;
  });
  return [ne, se, sw, nw];
}
