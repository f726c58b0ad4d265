import { EARTH_RADIUS_KM } from '../../../lib/geo';

/** The country's own plane: km east and north of its middle, in open ocean. */
export const MIDDLE = { lat: 25.2, lon: -48.5 };

const KM_PER_DEGREE = (EARTH_RADIUS_KM * Math.PI) / 180;
const KM_PER_DEGREE_LON = KM_PER_DEGREE * Math.cos((MIDDLE.lat * Math.PI) / 180);

export interface Km {
  x: number;
  y: number;
}

export const latOf = (y: number): number => MIDDLE.lat + y / KM_PER_DEGREE;
export const lonOf = (x: number): number => MIDDLE.lon + x / KM_PER_DEGREE_LON;
export const kmOf = (lat: number, lon: number): Km => ({ x: (lon - MIDDLE.lon) * KM_PER_DEGREE_LON, y: (lat - MIDDLE.lat) * KM_PER_DEGREE });

/** Four decimals of a degree, about 11 m: what the demo's files hold. */
export const round4 = (degrees: number): number => Math.round(degrees * 1e4) / 1e4;
export const placeOf = (x: number, y: number): { lat: number; lon: number } => ({ lat: round4(latOf(y)), lon: round4(lonOf(x)) });

/** A grid of samples over the country, row by row from the south-west. */
export interface Grid {
  west: number;
  south: number;
  stepKm: number;
  columns: number;
  rows: number;
}

export const gridOf = (stepKm: number): Grid => ({ west: -236, south: -144, stepKm, columns: Math.round(472 / stepKm) + 1, rows: Math.round(292 / stepKm) + 1 });

export function sampleGrid({ west, south, stepKm, columns, rows }: Grid, valueAt: (x: number, y: number) => number): Float64Array {
  const values = new Float64Array(columns * rows);
  for (let row = 0; row < rows; row++) {
    for (let column = 0; column < columns; column++) values[row * columns + column] = valueAt(west + column * stepKm, south + row * stepKm);
  }
  return values;
}
