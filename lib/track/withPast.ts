import type { Advisory } from '../advisory';

const HOUR_MS = 3_600_000;

/**
 * The advisory with the analysed positions of earlier advisories before its own, so that wind which has already come is told
 * from wind still to come. Of each earlier advisory only its first point is used, where it lies before this one's first point
 * and within `hours` of it; where two fall on the same time the later issue holds.
 */
export function withPast(advisory: Advisory, earlier: readonly Advisory[], hours = 48): Advisory {
  const firstMs = Date.parse(advisory.points[0].validAt);
  const analysed = new Map<number, Advisory['points'][number]>();
  for (const { points } of [...earlier].sort((a, b) => Date.parse(a.issuedAt) - Date.parse(b.issuedAt))) {
    const validMs = Date.parse(points[0].validAt);
    if (validMs < firstMs && firstMs - validMs <= hours * HOUR_MS) analysed.set(validMs, points[0]);
  }
  const past = [...analysed].sort(([a], [b]) => a - b).map(([, point]) => point);
  return { ...advisory, points: [...past, ...advisory.points] };
}
