import { THRESHOLD_KEYS } from '../../units';
import type { Advisory, Point, QuadrantRadii, Warning } from '../model';

/**
 * The strongest sustained wind on record: Patricia, 23 October 2015, 185 kt (Kimberlain, Blake and
 * Cangialosi, 2016, Tropical Cyclone Report EP202015, US National Hurricane Center).
 */
const STRONGEST_ON_RECORD_KT = 185;
/** The same storm's rise in 24 h, 105 kt (same report), with a margin; shorter steps may rise by more in proportion. */
const RISE_IN_24_HOURS_KT = 110;
const RISE_AT_ONCE_KT = 35;
const HOUR_MS = 3_600_000;
const QUADRANTS = ['ne', 'se', 'sw', 'nw'] as const;

/** Winds beyond belief, and radii that contradict each other or the wind. */
export function windChecks({ points }: Advisory): Warning[] {
  return points.flatMap((point, index) => {
    const path = `points[${index}]`;
    return [...strength(point, path), ...change(points[index - 1], point, path), ...rings(point, path)];
  });
}

function strength({ maxWindKt, gustKt, stage }: Point, path: string): Warning[] {
  const warnings: Warning[] = [];
  if (maxWindKt > STRONGEST_ON_RECORD_KT) warnings.push({ code: 'wind-above-record', path: `${path}.maxWindKt`, message: `${maxWindKt} kt is above the strongest wind on record, ${STRONGEST_ON_RECORD_KT} kt (Patricia, 2015)` });
  if (maxWindKt === 0 && stage !== 'dissipated') warnings.push({ code: 'wind-zero', path: `${path}.maxWindKt`, message: 'a wind of 0 kt is read as calm: some files write 0 where the wind is not known' });
  if (gustKt !== undefined && gustKt < maxWindKt) warnings.push({ code: 'gust-below-wind', path: `${path}.gustKt`, message: `gusts of ${gustKt} kt are below the sustained wind of ${maxWindKt} kt` });
  return warnings;
}

function change(before: Point | undefined, { validAt, maxWindKt }: Point, path: string): Warning[] {
  if (before === undefined) return [];
  const hours = (Date.parse(validAt) - Date.parse(before.validAt)) / HOUR_MS;
  const rise = maxWindKt - before.maxWindKt;
  if (rise > RISE_AT_ONCE_KT + ((RISE_IN_24_HOURS_KT - RISE_AT_ONCE_KT) * Math.min(hours, 24)) / 24) {
    return [{ code: 'wind-jump', path: `${path}.maxWindKt`, message: `a rise of ${rise} kt in ${hours} h is beyond the fastest on record (105 kt in 24 h, Patricia, 2015)` }];
  }
  if (-rise > FALL_MARGIN_KT + before.maxWindKt - afterLandfall(before.maxWindKt, hours)) {
    return [{ code: 'wind-drop', path: `${path}.maxWindKt`, message: `a fall of ${-rise} kt in ${hours} h is faster than storms weaken inland` }];
  }
  return [];
}

const FALL_MARGIN_KT = 15;

/** Wind (kt) so many hours after landfall: Kaplan and DeMaria (1995), J. Appl. Meteor. 34, 2499-2512, without its distance term. */
function afterLandfall(landfallKt: number, hours: number): number {
  const background = 26.7;
  const reduced = 0.9 * landfallKt;
  return reduced <= background ? 0 : background + (reduced - background) * Math.exp(-0.095 * hours);
}

function rings({ maxWindKt, radiiNm }: Point, path: string): Warning[] {
  const warnings: Warning[] = [];
  const given = THRESHOLD_KEYS.flatMap((key) => (radiiNm?.[key] === undefined ? [] : [{ key, ring: radiiNm[key] }]));
  given.forEach(({ key, ring }, index) => {
    const at = `${path}.radiiNm.${key}`;
    if (Number(key) > maxWindKt && QUADRANTS.some((quadrant) => ring[quadrant] > 0)) {
      warnings.push({ code: 'radii-above-wind', path: at, message: `radii of ${key} kt winds are given where the maximum wind is only ${maxWindKt} kt` });
    }
    const weaker = given[index - 1];
    const wider = weaker === undefined ? [] : widerQuadrants(weaker.ring, ring);
    if (weaker !== undefined && wider.length > 0) {
      warnings.push({ code: 'radii-grow', path: at, message: `${key} kt winds reach farther than ${weaker.key} kt winds to the ${wider.join(', ').toUpperCase()}: radii must shrink as the wind rises` });
    }
  });
  return warnings;
}

const widerQuadrants = (weaker: QuadrantRadii, stronger: QuadrantRadii): string[] => QUADRANTS.filter((quadrant) => stronger[quadrant] > weaker[quadrant]);
