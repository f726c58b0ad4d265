import { destination, normaliseLon } from '../geo';
import type { Paths } from './paths';
import { FRAME } from './paths';
import { placesAt } from './blocks';
import type { Places } from './blocks';

/**
 * A regular latitude-longitude grid, row by row from the south-west corner: place `row * columns + column`. East of the
 * corner longitudes may run past 180, so that a grid never breaks at the antimeridian.
 */
export interface Grid {
  west: number;
  south: number;
  stepLon: number;
  stepLat: number;
  columns: number;
  rows: number;
}

const DEG = 180 / Math.PI;

/** The box (degrees; longitudes unwrapped) that holds everywhere any path reaches, with a margin; null when none reaches anywhere. */
export function reachBox(paths: Paths, marginKm = 25): { west: number; east: number; south: number; north: number } | null {
  let box: { west: number; east: number; south: number; north: number } | null = null;
  let reference = NaN;
  for (let at = 0; at < paths.count * paths.nodes; at++) {
    if (paths.reachKm[at] === 0) continue;
    const o = at * FRAME;
    const lat = Math.asin(paths.frame[o + 2]) * DEG;
    let lon = Math.atan2(paths.frame[o + 1], paths.frame[o]) * DEG;
    if (Number.isNaN(reference)) reference = lon;
    lon = reference + normaliseLon(lon - reference);
    const km = paths.reachKm[at] + marginKm;
    const north = Math.min(85, destination(lat, lon, 0, km).lat);
    const south = Math.max(-85, destination(lat, lon, 180, km).lat);
    const widest = Math.max(Math.abs(north), Math.abs(south));
    const halfLon = Math.min(90, km / (111.195 * Math.cos(widest / DEG)));
    if (!box) box = { west: lon - halfLon, east: lon + halfLon, south, north };
    else {
      box.west = Math.min(box.west, lon - halfLon);
      box.east = Math.max(box.east, lon + halfLon);
      box.south = Math.min(box.south, south);
      box.north = Math.max(box.north, north);
    }
  }
  return box;
}

/** A grid of nearly square cells over a box, as fine as `mostPlaces` allows but no finer than `finestKm`. */
export function gridOver(box: { west: number; east: number; south: number; north: number }, mostPlaces: number, finestKm: number): Grid {
  const midLat = (box.south + box.north) / 2;
  const kmPerLon = 111.195 * Math.cos(midLat / DEG);
  const widthKm = (box.east - box.west) * kmPerLon;
  const heightKm = (box.north - box.south) * 111.195;
  const stepKm = Math.max(finestKm, Math.sqrt((widthKm * heightKm) / mostPlaces));
  return {
    west: box.west,
    south: box.south,
    stepLon: stepKm / kmPerLon,
    stepLat: stepKm / 111.195,
    columns: Math.ceil(widthKm / stepKm) + 1,
    rows: Math.ceil(heightKm / stepKm) + 1,
  };
}

/** Side of the square tiles a grid is cut into, so that blocks of its places are compact; a block is a tile. */
const TILE = 8;
export const TILE_PLACES = TILE * TILE;

/** The grid's places over water, tile by tile, and the index in the grid of each. */
export function gridPlaces(grid: Grid): { places: Places; gridIndex: Uint32Array } {
  const count = grid.columns * grid.rows;
  const lat = new Float64Array(count);
  const lon = new Float64Array(count);
  const gridIndex = new Uint32Array(count);
  let n = 0;
  for (let row0 = 0; row0 < grid.rows; row0 += TILE) {
    for (let column0 = 0; column0 < grid.columns; column0 += TILE) {
      for (let row = row0; row < Math.min(row0 + TILE, grid.rows); row++) {
        for (let column = column0; column < Math.min(column0 + TILE, grid.columns); column++) {
          lat[n] = grid.south + row * grid.stepLat;
          lon[n] = grid.west + column * grid.stepLon;
          gridIndex[n++] = row * grid.columns + column;
        }
      }
    }
  }
  return { places: placesAt(lat, lon, new Float32Array(count).fill(1)), gridIndex };
}
