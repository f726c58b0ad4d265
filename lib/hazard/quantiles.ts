/** The share of members that must reach a threshold before times are given: fewer say too little. */
export const LEAST_CHANCE_FOR_TIMES = 0.05;

/** Early, median and late. */
export const QUANTILES = [0.1, 0.5, 0.9] as const;

/** Width of a bin of the time histograms, hours. */
export const TIME_BIN_HOURS = 0.5;

/**
 * The time before which a share of a histogram's `total` counts lie, interpolated within its bin; `offset` is where the row
 * starts. Hours from the start of the first bin.
 */
export function histogramQuantile(counts: Uint16Array, offset: number, bins: number, total: number, share: number): number {
  const wanted = share * total;
  let below = 0;
  for (let bin = 0; bin < bins; bin++) {
    const here = counts[offset + bin];
    if (here > 0 && below + here >= wanted) return (bin + (wanted - below) / here) * TIME_BIN_HOURS;
    below += here;
  }
  return bins * TIME_BIN_HOURS;
}

/** Quantile of values sorted upward: linear between order statistics (type 7 of Hyndman and Fan, 1996, Am. Stat. 50, 361-365). */
export function sortedQuantile(sorted: ArrayLike<number>, count: number, share: number): number {
  const at = share * (count - 1);
  const i = Math.floor(at);
  return i + 1 < count ? sorted[i] + (at - i) * (sorted[i + 1] - sorted[i]) : sorted[count - 1];
}
