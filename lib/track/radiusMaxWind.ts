import { ktToMs } from '../units';

/**
 * Radius of maximum wind (km) of a storm of which only strength and latitude are known: `46.4 exp(-0.0155 V + 0.0169 |lat|)`,
 * V the maximum in m/s at flight level, held to the 15 to 80 m/s it was fitted on. Willoughby, Darling and Rahn (2006), Mon. Wea.
 * Rev. 134, 1102-1120, eq. 7a.
 */
export function willoughbyRadiusMaxWindKm(flightMaxMs: number, lat: number): number {
  return 46.4 * Math.exp(-0.0155 * Math.min(Math.max(flightMaxMs, 15), 80) + 0.0169 * Math.abs(lat));
}

/** Earth's rotation rate, rad/s. */
const ROTATION = 7.292e-5;
const GALE_MS = ktToMs(34);

/**
 * Radius of maximum wind (km) from the mean radius of 34 kt: the ratio of angular momentum at the maximum to that at 34 kt is
 * `0.699 exp(-0.00618 (V - V34) - 0.00210 (V - V34) f R34 / 2)`. Chavas and Knaff (2022), Wea. Forecasting 37, 563-579, eqs. 2 to 4
 * and 7, coefficients of its table 2; V in m/s at the surface. Fitted to the North Atlantic, 2004-2020. Below 5 degrees of
 * latitude the rotation at 5 degrees is taken.
 */
export function chavasKnaffRadiusMaxWindKm(maxWindKt: number, meanRadius34Km: number, lat: number): number {
  const max = Math.max(ktToMs(maxWindKt), GALE_MS);
  const f = 2 * ROTATION * Math.sin((Math.max(Math.abs(lat), 5) * Math.PI) / 180);
  const radius = meanRadius34Km * 1000;
  const excess = max - GALE_MS;
  const momentum34 = radius * GALE_MS + 0.5 * f * radius * radius;
  const momentum = momentum34 * 0.699 * Math.exp(-0.00618 * excess - 0.0021 * excess * 0.5 * f * radius);
  return ((max / f) * (Math.sqrt(1 + (2 * f * momentum) / (max * max)) - 1)) / 1000;
}
