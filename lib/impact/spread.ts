import { sortedQuantile } from '../hazard';
import type { Spread } from './model';

/** Only the forecast track is known. */
export const trackOnly = (track: number): Spread => ({ track, mean: null, p10: null, p50: null, p90: null });

/** Mean and percentiles over members of `values[offset .. offset + members - 1]`, each divided by `unit`. */
export function spreadOver(track: number, values: Float64Array | Uint32Array, offset: number, members: number, unit = 1): Spread {
  const sorted = Float64Array.from(values.subarray(offset, offset + members)).sort();
  let sum = 0;
  for (const value of sorted) sum += value;
  const at = (share: number): number => Math.round(sortedQuantile(sorted, members, share) / unit);
  return { track, mean: Math.round(sum / members / unit), p10: at(0.1), p50: at(0.5), p90: at(0.9) };
}
