import type { QuadrantKm } from '../geo';
import { THRESHOLD_KEYS, THRESHOLDS_KT } from '../units';
import type { ByThreshold } from '../units';

/** A value (kt) for each of the quadrants NE, SE, SW, NW. */
export type QuadrantKt = readonly [ne: number, se: number, sw: number, nw: number];

/** "Does not reach": the peak of such a quadrant stays this far under the threshold. */
const UNDER_THRESHOLD_KT = 0.1;

const ROUNDING_KT = 1e-9;

/** Whether a quadrant with this peak reaches a threshold; rounding may leave a peak that does a hair under it. */
export const reaches = (peakKt: number, thresholdKt: number): boolean => peakKt >= thresholdKt - ROUNDING_KT;

/** The exponent of a power law that falls from `inner` at `radiusInner` to `outer` at `radiusOuter`; 0 where the wind does not fall. */
export function decayExponent(radiusInner: number, inner: number, radiusOuter: number, outer: number): number {
  return inner > outer ? Math.log(inner / outer) / Math.log(radiusOuter / radiusInner) : 0;
}

/**
 * The peak wind (kt) of each quadrant, at the radius of maximum wind, that a storm's rings imply. The storm's maximum stands in
 * the quadrant with the widest innermost ring, where it sets the exponent of a modified Rankine vortex; that decay, followed
 * inward from their own rings, gives the other peaks. A quadrant that a threshold does not reach peaks just under it.
 */
export function quadrantPeaksKt(maxWindKt: number, radiusMaxWindKm: number, radiiKm: ByThreshold<QuadrantKm>, oneMinute: number): QuadrantKt {
  const peaks = [maxWindKt, maxWindKt, maxWindKt, maxWindKt];
  let reached = false;
  THRESHOLDS_KT.forEach((kt, t) => {
    const windKt = kt * oneMinute;
    if (maxWindKt < windKt) return;
    reached = true;
    const ring = radiiKm[THRESHOLD_KEYS[t]];
    const widest = Math.max(...ring);
    const exponent = widest > radiusMaxWindKm ? decayExponent(radiusMaxWindKm, maxWindKt, widest, windKt) : 0;
    // From the weakest ring to the strongest: each sets the peak anew where it reaches, and caps it where it does not.
    for (let q = 0; q < 4; q++) peaks[q] = ring[q] > 0 ? Math.min(maxWindKt, windKt * Math.max(1, ring[q] / radiusMaxWindKm) ** exponent) : Math.min(peaks[q], windKt - UNDER_THRESHOLD_KT);
  });
  if (reached) peaks[peaks.indexOf(Math.max(...peaks))] = maxWindKt;
  const [ne, se, sw, nw] = peaks;
  return [ne, se, sw, nw];
}

/**
 * Peaks between two points: shares of the maximum change linearly, relative to the greatest among the quadrants that hold the maximum
 * at either point, so that one of those always attains it. No other quadrant rises above its own peaks at both ends.
 */
export function peaksBetween(a: QuadrantKt, maxA: number, b: QuadrantKt, maxB: number, fraction: number, maxWindKt: number): QuadrantKt {
  const share = (peakKt: number, max: number): number => (max > 0 ? peakKt / max : 1);
  const shares = a.map((peakKt, q) => share(peakKt, maxA) + fraction * (share(b[q], maxB) - share(peakKt, maxA)));
  const holds = a.map((peakKt, q) => peakKt >= maxA || b[q] >= maxB);
  const greatest = Math.max(...shares.filter((_, q) => holds[q]));
  const [ne, se, sw, nw] = shares.map((s, q) => {
    const peakKt = (s / greatest) * maxWindKt;
    return holds[q] ? peakKt : Math.min(peakKt, maxWindKt, Math.max(a[q], b[q]));
  });
  return [ne, se, sw, nw];
}
