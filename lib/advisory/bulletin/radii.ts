import { THRESHOLD_KEYS } from '../../units';
import type { ThresholdKey } from '../../units';
import type { QuadrantRadii } from '../model';

const RADII_LINE = /^(RADI(?:US|I)\s+IN\s+NM\s+OF\s+)?(-?\d{1,3})\s?KT\b(?:\s+WINDS?)?([. ]*)(.*)$/i;
const QUADRANT = /(-?\d{1,4})\s?(NE|SE|SW|NW)\b/gi;
const ALL_QUADRANTS = /^(\d{1,4})\s?(?:NM\s)?(?:IN\s)?ALL\sQUAD/i;

export type RadiiLine = { threshold: ThresholdKey; radii: QuadrantRadii } | { otherKt: number } | { problem: string };

/**
 * Reads a line of wind radii: `34 KT...175NE 175SE   0SW  30NW.`, or the older
 * `RADIUS IN NM OF 34 KT WINDS  50NE  50SE  50SW  50NW.` Null where the line gives no radii at all.
 */
export function radiiLine(text: string): RadiiLine | null {
  const match = RADII_LINE.exec(text.replace(/\s+/g, ' '));
  if (match === null) return null;
  const [, radiusOf, kt, dots, tail] = match as unknown as [string, string | undefined, string, string, string];
  const quadrants = [...tail.matchAll(QUADRANT)];
  const all = ALL_QUADRANTS.exec(tail);
  if (radiusOf === undefined && quadrants.length === 0 && all === null && !dots.includes('..')) return null;

  const threshold = THRESHOLD_KEYS.find((key) => key === kt);
  if (threshold === undefined) return { otherKt: Number(kt) };
  if (all !== null) {
    const radius = Number(all[1]);
    return { threshold, radii: { ne: radius, se: radius, sw: radius, nw: radius } };
  }
  const found: Partial<QuadrantRadii> = {};
  for (const [, radius, quadrant] of quadrants) {
    const key = quadrant!.toLowerCase() as keyof QuadrantRadii;
    if (found[key] !== undefined) return { problem: `the ${quadrant!.toUpperCase()} radius of the ${kt} kt winds is given twice` };
    found[key] = Number(radius);
  }
  const { ne, se, sw, nw } = found;
  if (ne === undefined || se === undefined || sw === undefined || nw === undefined) {
    const missing = (['ne', 'se', 'sw', 'nw'] as const).filter((key) => found[key] === undefined).map((key) => key.toUpperCase());
    return { problem: `the ${kt} kt radius is missing for ${missing.join(', ')}: write all four, such as "34 KT...175NE 175SE   0SW  30NW."` };
  }
  return { threshold, radii: { ne, se, sw, nw } };
}
