import { kmToMiles, kmToNmi } from '../../lib/units';
import type { DistanceUnit } from '../../lib/units';

const ROUND = [1, 2, 5];

/** The longest round length of a unit that fits into `mostPx`, and how long it is drawn. */
export function scaleLength(kmPerPx: number, unit: DistanceUnit, mostPx: number): { value: number; px: number } {
  const perPx = unit === 'km' ? kmPerPx : unit === 'nmi' ? kmToNmi(kmPerPx) : kmToMiles(kmPerPx);
  const most = perPx * mostPx;
  const power = 10 ** Math.floor(Math.log10(most));
  const value = Math.max(...ROUND.map((digit) => digit * power).filter((length) => length <= most * (1 + 1e-9)));
  return { value, px: value / perPx };
}
