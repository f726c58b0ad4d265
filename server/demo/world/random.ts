import { uniformFloat64 } from 'pure-rand/distribution/uniformFloat64';
import { xoroshiro128plus } from 'pure-rand/generator/xoroshiro128plus';

/** A seeded stream of chances: the same seed gives the same stream everywhere. */
export interface Random {
  /** Uniform in [low, high). */
  between(low: number, high: number): number;
  /** A whole number from low to high, both included. */
  whole(low: number, high: number): number;
  pick<T>(from: readonly T[]): T;
  /** Log-normal with the given median; `spread` is the standard deviation of the logarithm. */
  around(median: number, spread: number): number;
  /** An index drawn in proportion to weights, given as their running sum. */
  weighted(runningSum: Float64Array): number;
}

export function makeRandom(seed: number): Random {
  const generator = xoroshiro128plus(seed);
  const next = (): number => uniformFloat64(generator);
  const between = (low: number, high: number): number => low + (high - low) * next();
  return {
    between,
    whole: (low, high) => Math.floor(between(low, high + 1)),
    pick: (from) => from[Math.floor(next() * from.length)],
    // Twelve uniforms less six are near enough to normal for sizes and values, and cost no logarithm.
    around: (median, spread) => median * Math.exp(spread * (Array.from({ length: 12 }, next).reduce((sum, value) => sum + value, 0) - 6)),
    weighted: (runningSum) => firstAbove(runningSum, next() * runningSum[runningSum.length - 1]),
  };
}

function firstAbove(rising: Float64Array, value: number): number {
  let low = 0;
  let high = rising.length - 1;
  while (low < high) {
    const middle = (low + high) >> 1;
    if (rising[middle] > value) high = middle;
    else low = middle + 1;
  }
  return low;
}
