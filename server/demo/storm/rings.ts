import type { Point, QuadrantRadii } from '../../../lib/advisory';

/** Share of the greatest radius by quadrant: a storm that moves north-west is widest ahead and to its right. */
const SHARES: QuadrantRadii = { ne: 1, se: 0.88, sw: 0.56, nw: 0.8 };
const LAST_LEAD_HOURS = { 34: 72, 50: 72, 64: 48 };

/** Wind radii (nmi, to the nearest five) of a storm of this strength, wider as it ages, as far ahead as bulletins give them. */
export function ringsOf(maxWindKt: number, ageHours: number, leadHours: number): NonNullable<Point['radiiNm']> {
  const grown = 1 + Math.max(0, ageHours) / 260;
  const rings: NonNullable<Point['radiiNm']> = {};
  if (maxWindKt >= 34 && leadHours <= LAST_LEAD_HOURS[34]) rings['34'] = quadrants((46 + 0.82 * maxWindKt) * grown);
  if (maxWindKt >= 50 && leadHours <= LAST_LEAD_HOURS[50]) rings['50'] = quadrants((34 + 0.72 * (maxWindKt - 50)) * grown);
  if (maxWindKt >= 64 && leadHours <= LAST_LEAD_HOURS[64]) rings['64'] = quadrants((18 + 0.58 * (maxWindKt - 64)) * grown);
  return rings;
}

const quadrants = (greatestNm: number): QuadrantRadii => ({ ne: five(greatestNm * SHARES.ne), se: five(greatestNm * SHARES.se), sw: five(greatestNm * SHARES.sw), nw: five(greatestNm * SHARES.nw) });

export const five = (value: number): number => 5 * Math.round(value / 5);
