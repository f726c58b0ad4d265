/** Pressure outside the storm (hPa) in the fit of Atkinson and Holliday. */
const ENVIRONMENT_HPA = 1010;

/**
 * Maximum 1-minute wind (kt) from central pressure (hPa): `6.7 (1010 - pc)^0.644`. Atkinson and Holliday (1977), Mon. Wea. Rev.
 * 105, 421-427. Western North Pacific, surface.
 */
export const windFromPressureKt = (pressureHpa: number): number => 6.7 * Math.max(0, ENVIRONMENT_HPA - pressureHpa) ** 0.644;

/** The same relation turned round: central pressure (hPa) from maximum 1-minute wind (kt). */
export const pressureFromWindHpa = (maxWindKt: number): number => ENVIRONMENT_HPA - (Math.max(0, maxWindKt) / 6.7) ** (1 / 0.644);
