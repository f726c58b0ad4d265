/** Parameters of Holland's profile, SI. */
interface Holland {
  /** Pressure outside the storm less central pressure, Pa. */
  pressureDropPa: number;
  radiusMaxM: number;
  /** Shape, between 1 and 2.5. */
  b: number;
  /** Coriolis parameter, 1/s; either sign. */
  coriolis: number;
  /** Air density, kg/m3. */
  density: number;
}

const AIR_DENSITY = 1.15;

/**
 * Gradient wind (m/s) at a radius (m): `sqrt((B dp / rho) (Rm/r)^B exp(-(Rm/r)^B) + (r f / 2)^2) - r |f| / 2`. Holland (1980), Mon.
 * Wea. Rev. 108, 1212-1218, eq. 4. Above the boundary layer: reduce it to 10 m before comparing with surface winds.
 */
export function hollandGradientMs(radiusM: number, { pressureDropPa, radiusMaxM, b, coriolis, density }: Holland): number {
  if (radiusM <= 0) return 0;
  const shape = (radiusMaxM / radiusM) ** b;
  const inertia = (radiusM * Math.abs(coriolis)) / 2;
  return Math.sqrt(((b * pressureDropPa) / density) * shape * Math.exp(-shape) + inertia * inertia) - inertia;
}

/** Greatest wind (m/s) where the earth's rotation does not matter: `sqrt(B dp / (rho e))`, attained at Rm. Holland (1980), eq. 7. */
export const hollandMaxMs = ({ pressureDropPa, b, density }: Pick<Holland, 'pressureDropPa' | 'b' | 'density'>): number => Math.sqrt((b * pressureDropPa) / (density * Math.E));

/** Pressure (Pa) at a radius (m): `pc + dp exp(-(Rm/r)^B)`. Holland (1980), eq. 3. */
export const hollandPressurePa = (radiusM: number, centralPa: number, { pressureDropPa, radiusMaxM, b }: Pick<Holland, 'pressureDropPa' | 'radiusMaxM' | 'b'>): number =>
  radiusM <= 0 ? centralPa : centralPa + pressureDropPa * Math.exp(-((radiusMaxM / radiusM) ** b));

/** The B (held to 1 to 2.5) with which a pressure drop (Pa) gives a greatest gradient wind (m/s): `rho e Vm^2 / dp`. Holland (1980), eq. 8. */
export const hollandB = (maxMs: number, pressureDropPa: number, density = AIR_DENSITY): number => Math.min(Math.max((density * Math.E * maxMs * maxMs) / pressureDropPa, 1), 2.5);

/** Earth's rotation rate, rad/s (IERS nominal value). */
const ROTATION = 7.292115e-5;

/** Coriolis parameter (1/s) at a latitude in degrees, negative south of the equator. */
export const coriolisParameter = (lat: number): number => 2 * ROTATION * Math.sin((lat * Math.PI) / 180);
