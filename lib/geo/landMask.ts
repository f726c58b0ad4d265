import type { MultiPolygon, Polygon } from 'geojson';
import type { Bounds } from './bounds';
import { distanceTransform } from './distanceTransform';
import { rasterise } from './rasterise';
import type { RasterGrid } from './rasterise';
import { EARTH_RADIUS_KM } from './sphere';

export interface LandMask {
  isLand(lat: number, lon: number): boolean;
  /** Distance to the coast, km: positive inland, negative at sea, between -200 and 200. */
  coastDistanceKm(lat: number, lon: number): number;
}

/** Distances to the coast are not told apart beyond this. */
const FARTHEST_KM = 200;
/** A larger box gets coarser cells instead of more memory (9 bytes a cell are held, 13 while it is made). */
const MOST_CELLS = 12_000_000;
const KM_PER_DEGREE = (EARTH_RADIUS_KM * Math.PI) / 180;

/**
 * Land within bounds on a grid of about `cellKm`. Holes (lakes) count as sea. Outside the bounds everything is open sea, and
 * land there is not seen from inside: give bounds a margin.
 *
 * Coast distances hold to about half a cell.
 */
export function makeLandMask(polygons: Polygon | MultiPolygon, bounds: Bounds, cellKm = 1): LandMask {
  if (!(cellKm > 0)) throw new RangeError(`Unexpected cellKm value: ${cellKm}. It must be above 0.`);
  const { west, south, north } = bounds;
  const east = bounds.east > west ? bounds.east : bounds.east + 360;
  if (!(north > south) || !(east - west <= 360)) throw new RangeError(`Unexpected bounds: west ${west}, south ${south}, east ${bounds.east}, north ${north}.`);

  const grid = gridOf(west, south, Math.min(east, west + 360), north, cellKm);
  const { stepLon, stepLat, columns, rows } = grid;
  const land = rasterise(polygons, grid);
  const stepX = Float64Array.from({ length: rows }, (_, row) => Math.max(1e-3, KM_PER_DEGREE * stepLon * Math.cos(((south + row * stepLat) * Math.PI) / 180)));
  const signed = signedDistance(land, columns, rows, stepX, KM_PER_DEGREE * stepLat);

  const columnAt = (lon: number): number => {
    const turned = (lon - west) % 360;
    return (turned < 0 ? turned + 360 : turned) / stepLon;
  };
  const coastDistanceKm = (lat: number, lon: number): number => {
    const x = columnAt(lon);
    const y = (lat - south) / stepLat;
    if (!(x <= columns - 1 && y >= 0 && y <= rows - 1)) return -FARTHEST_KM;
    const column = Math.min(x | 0, columns - 2);
    const row = Math.min(y | 0, rows - 2);
    const fx = x - column;
    const fy = y - row;
    const i = row * columns + column;
    const lower = signed[i] + fx * (signed[i + 1] - signed[i]);
    const upper = signed[i + columns] + fx * (signed[i + columns + 1] - signed[i + columns]);
    return lower + fy * (upper - lower);
  };
  return { coastDistanceKm, isLand: (lat, lon) => coastDistanceKm(lat, lon) > 0 };
}

function gridOf(west: number, south: number, east: number, north: number, cellKm: number): RasterGrid {
  const nearest = south <= 0 && north >= 0 ? 0 : Math.min(Math.abs(south), Math.abs(north));
  const widthKm = (east - west) * KM_PER_DEGREE * Math.cos((nearest * Math.PI) / 180);
  const heightKm = (north - south) * KM_PER_DEGREE;
  const stepKm = Math.max(cellKm, Math.sqrt((widthKm * heightKm) / MOST_CELLS));
  const columns = Math.max(1, Math.ceil(widthKm / stepKm)) + 1;
  const rows = Math.max(1, Math.ceil(heightKm / stepKm)) + 1;
  return { west, south, stepLon: (east - west) / (columns - 1), stepLat: (north - south) / (rows - 1), columns, rows };
}

/**
 * The coast lies between the nearest cells of either kind: half a cell before the far one on a straight coast along the grid, next to
 * it on any other, where some cell always lies close behind. A quarter serves both to a quarter of a cell.
 */
function signedDistance(land: Uint8Array, columns: number, rows: number, stepX: Float64Array, stepY: number): Float32Array {
  const toSea = distanceTransform(land, 0, columns, rows, stepX, stepY);
  const toLand = distanceTransform(land, 1, columns, rows, stepX, stepY);
  for (let i = 0; i < land.length; i++) {
    const quarter = 0.25 * Math.min(stepY, stepX[(i / columns) | 0]);
    toSea[i] = land[i] ? Math.min(FARTHEST_KM, toSea[i] - quarter) : -Math.min(FARTHEST_KM, toLand[i] - quarter);
  }
  return toSea;
}
