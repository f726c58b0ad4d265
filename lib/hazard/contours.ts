import { contours } from 'd3-contour';
import type { MultiPolygon, Position } from 'geojson';
import { cutAtAntimeridian } from '../geo';
import type { Grid } from './grid';

/** Coordinates are rounded to this many decimals of a degree (about 100 m). */
const DECIMALS = 3;

/**
 * Where a gridded field is at or above a level, as an RFC 7946 MultiPolygon (right-hand rule, cut at the antimeridian), with
 * linear interpolation between grid points; null where it nowhere is. Values are in grid order.
 */
export function areaAtOrAbove(grid: Grid, values: Float32Array | Float64Array, level: number): MultiPolygon | null {
  const [contour] = contours().size([grid.columns, grid.rows]).thresholds([level])(Array.from(values));
  const toPosition = ([x, y]: Position): Position => [round(grid.west + (x - 0.5) * grid.stepLon), round(grid.south + (y - 0.5) * grid.stepLat)];
  const polygons = contour.coordinates
    .map((polygon) => polygon.map((ring) => withoutRepeats(ring.map(toPosition))).filter((ring) => ring.length >= 4))
    .filter((polygon) => polygon.length > 0);
  if (polygons.length === 0) return null;
  return cutAtAntimeridian({ type: 'MultiPolygon', coordinates: polygons });
}

/** Corners that rounding has put on one spot are one corner. */
const withoutRepeats = (ring: Position[]): Position[] => ring.filter(([lon, lat], i) => i === 0 || lon !== ring[i - 1][0] || lat !== ring[i - 1][1]);

const round = (degrees: number): number => Number(degrees.toFixed(DECIMALS));
