export const EXPOSURES = ['in-land', 'off-land', 'off-sea', 'at-sea'] as const;
/** In-land: roughly open terrain. Off-land and off-sea: wind off the land and off the sea at a coastline. At-sea: more than 20 km offshore. */
export type AveragingExposure = (typeof EXPOSURES)[number];

/**
 * Gust factors G(tau, T0): the greatest wind averaged over `tau` seconds within `T0` seconds, over the mean of those `T0`
 * seconds, as `table[exposure][T0][tau]`. Harper, Kepert and Ginger (2010), Guidelines for converting between various wind
 * averaging periods in tropical cyclone conditions, WMO/TD-No. 1555, table 1.1.
 */
export const GUST_FACTORS = {
  'in-land': { 3600: { 3: 1.75, 60: 1.28, 600: 1.08 }, 600: { 3: 1.66, 60: 1.21, 120: 1.12, 180: 1.09 }, 60: { 3: 1.49 } },
  'off-land': { 3600: { 3: 1.6, 60: 1.22, 600: 1.06 }, 600: { 3: 1.52, 60: 1.16, 120: 1.09, 180: 1.06 }, 60: { 3: 1.36 } },
  'off-sea': { 3600: { 3: 1.45, 60: 1.17, 600: 1.05 }, 600: { 3: 1.38, 60: 1.11, 120: 1.05, 180: 1.03 }, 60: { 3: 1.23 } },
  'at-sea': { 3600: { 3: 1.3, 60: 1.11, 600: 1.03 }, 600: { 3: 1.23, 60: 1.05, 120: 1.02, 180: 1 }, 60: { 3: 1.11 } },
} as const satisfies Record<AveragingExposure, Record<3600 | 600 | 60, Partial<Record<3 | 60 | 120 | 180 | 600, number>>>>;

/**
 * A storm's maximum 1-minute wind over its maximum 10-minute wind: both are the greatest of their kind within the hour, so the
 * ratio is G(60, 3600) / G(600, 3600). At sea 1.08, the inverse of the 0.93 of WMO/TD-No. 1555, table 1.2.
 */
export const oneMinuteOverTenMinute = (exposure: AveragingExposure): number => GUST_FACTORS[exposure][3600][60] / GUST_FACTORS[exposure][3600][600];
