/** Sustained winds (kt) at which forecast centres give radii, and which the tables count by. */
export const THRESHOLDS_KT = [34, 50, 64] as const;
export type ThresholdKt = (typeof THRESHOLDS_KT)[number];

/** The same thresholds as keys of JSON objects. */
export const THRESHOLD_KEYS = ['34', '50', '64'] as const;
export type ThresholdKey = (typeof THRESHOLD_KEYS)[number];

export type ByThreshold<T> = Record<ThresholdKey, T>;

export const byThreshold = <T>(make: (index: 0 | 1 | 2, kt: ThresholdKt) => T): ByThreshold<T> => ({
  '34': make(0, 34),
  '50': make(1, 50),
  '64': make(2, 64),
});
