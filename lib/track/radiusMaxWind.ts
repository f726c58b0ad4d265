/**
 * Radius of maximum wind (km) of a storm of which only strength and latitude are known: `46.4 exp(-0.0155 V + 0.0169 |lat|)`,
 * V the maximum in m/s at flight level. Willoughby, Darling and Rahn (2006), Mon. Wea. Rev. 134, 1102-1120, eq. 7a; flight level
 * wind is taken as the surface wind over 0.9 (Powell, Uhlhorn and Kepert, 2009, Wea. Forecasting 24, 868-883, ratio 0.9 for deep
 * convection near the maximum). Valid for 15 to 80 m/s.
 */
export function willoughbyRadiusMaxWindKm(surfaceMaxMs: number, lat: number): number {
  const flightMs = Math.min(Math.max(surfaceMaxMs / 0.9, 15), 80);
  return 46.4 * Math.exp(-0.0155 * flightMs + 0.0169 * Math.abs(lat));
}
