import fc from 'fast-check';
import type { Polygon, Position } from 'geojson';

const SIDES = 24;

/** A place about (25 N, 48 W). */
export const place = fc.tuple(fc.double({ min: -49.5, max: -46.5, noNaN: true }), fc.double({ min: 23.5, max: 26.5, noNaN: true }));

/** A star around a middle: `reach` degrees along each of its rays. */
function star([lon, lat]: readonly number[], reach: readonly number[]): Position[] {
  const corners = reach.map((r, i): Position => [lon + r * Math.cos((2 * Math.PI * i) / SIDES), lat + r * Math.sin((2 * Math.PI * i) / SIDES)]);
  return [...corners, corners[0]];
}

const reaches = (min: number, max: number) => fc.array(fc.double({ min, max, noNaN: true }), { minLength: SIDES, maxLength: SIDES });

/** A ragged polygon that does not cross itself. */
export const polygon = fc.tuple(place, reaches(0.1, 1.2)).map(([middle, reach]): Polygon => ({ type: 'Polygon', coordinates: [star(middle, reach)] }));
export const polygonWithHole = fc
  .tuple(place, reaches(0.5, 1.4), reaches(0.05, 0.4))
  .map(([middle, reach, hole]): Polygon => ({ type: 'Polygon', coordinates: [star(middle, reach), star(middle, hole).reverse()] }));
