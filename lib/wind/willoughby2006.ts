/**
 * Profiles of Willoughby, Darling and Rahn (2006), Mon. Wea. Rev. 134, 1102-1120: winds in m/s at flight level, radii in km,
 * latitudes in degrees (either hemisphere). Fitted to 493 aircraft profiles of 1977 to 2000, maxima of 15 to 80 m/s.
 */
export interface WilloughbyShape {
  /** Exponent of the power law inside the maximum. */
  n: number;
  /** Share of the wind outside that decays over `x2Km`. */
  a: number;
  x1Km: number;
  x2Km: number;
}

/** Shape from strength and latitude: X1 (eq. 10a), n (10b), A (10c); X2 is 25 km. */
export function willoughbyShape(flightMaxMs: number, lat: number): WilloughbyShape {
  const north = Math.abs(lat);
  return {
    n: willoughbyInnerExponent(flightMaxMs, lat),
    a: Math.max(0, 0.0696 + 0.0049 * flightMaxMs - 0.0064 * north),
    x1Km: 317.1 - 2.026 * flightMaxMs + 1.915 * north,
    x2Km: 25,
  };
}

/** Exponent of the wind's rise inside the maximum: `0.4067 + 0.0144 Vmax - 0.0038 |lat|` (eq. 10b). */
export const willoughbyInnerExponent = (flightMaxMs: number, lat: number): number => 0.4067 + 0.0144 * flightMaxMs - 0.0038 * Math.abs(lat);

/** Wind over maximum wind at a radius: a power law inside (eq. 1a), two exponentials outside (eq. 1c with two lengths, eq. 9). Without the transition. */
export function willoughbyShareOfMax(radiusKm: number, radiusMaxKm: number, { n, a, x1Km, x2Km }: WilloughbyShape): number {
  if (radiusKm <= radiusMaxKm) return (Math.max(0, radiusKm) / radiusMaxKm) ** n;
  const beyond = radiusKm - radiusMaxKm;
  return (1 - a) * Math.exp(-beyond / x1Km) + a * Math.exp(-beyond / x2Km);
}
