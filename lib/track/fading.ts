/**
 * Hours in which what sets this storm apart from climatology fades to 1/e once the advisory no longer says. Between 48 and 72 hours
 * gives the least error of 34 kt radii 36 to 96 hours ahead over the Atlantic best tracks of 2021 and 2022.
 */
const ANOMALY_HOURS = 60;

/** The share of an anomaly that is left after some hours. */
export const anomalyKept = (hours: number): number => Math.exp(-Math.abs(hours) / ANOMALY_HOURS);

/** Given values; elsewhere climatology plus the anomaly of the last given value (before the first: of the first), fading with time. */
export function fading(given: (number | null)[], climatology: number[], leadHours: ArrayLike<number>): number[] {
  return given.map((value, i) => {
    if (value !== null) return value;
    const nearest = nearestIndex(given, i);
    return nearest < 0 ? climatology[i] : climatology[i] + anomalyKept(leadHours[i] - leadHours[nearest]) * (given[nearest]! - climatology[nearest]);
  });
}

function nearestIndex(given: (number | null)[], i: number): number {
  for (let j = i - 1; j >= 0; j--) if (given[j] !== null) return j;
  return given.findIndex((value, j) => j > i && value !== null);
}
