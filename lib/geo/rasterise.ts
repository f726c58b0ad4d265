import type { MultiPolygon, Polygon, Position } from 'geojson';

/** Cell centres at `west + column * stepLon`, `south + row * stepLat`, row by row from the south. */
export interface RasterGrid {
  west: number;
  south: number;
  stepLon: number;
  stepLat: number;
  columns: number;
  rows: number;
}

/**
 * Marks (1) the cells whose centre lies inside a polygon: even-odd within each polygon, so that holes stay open, and the union
 * of polygons. Edges are straight in longitude and latitude (RFC 7946, section 3.1.1); polygons meet the grid on whichever turn
 * of the globe it lies.
 */
export function rasterise(polygons: Polygon | MultiPolygon, grid: RasterGrid): Uint8Array {
  const marked = new Uint8Array(grid.columns * grid.rows);
  const east = grid.west + (grid.columns - 1) * grid.stepLon;
  for (const rings of polygons.type === 'Polygon' ? [polygons.coordinates] : polygons.coordinates) {
    const box = boxOf(rings[0] ?? []);
    const firstTurn = Math.ceil((grid.west - box.east) / 360);
    const lastTurn = Math.floor((east - box.west) / 360);
    for (let turn = firstTurn; turn <= lastTurn; turn++) fill(rings, box, turn * 360, grid, marked);
  }
  return marked;
}

interface Box {
  west: number;
  east: number;
  south: number;
  north: number;
}

function boxOf(ring: Position[]): Box {
  const box = { west: Infinity, east: -Infinity, south: Infinity, north: -Infinity };
  for (const [lon, lat] of ring) {
    if (lon < box.west) box.west = lon;
    if (lon > box.east) box.east = lon;
    if (lat < box.south) box.south = lat;
    if (lat > box.north) box.north = lat;
  }
  return box;
}

function fill(rings: Position[][], box: Box, shift: number, grid: RasterGrid, marked: Uint8Array): void {
  const { west, south, stepLon, stepLat, columns } = grid;
  const firstRow = Math.max(0, Math.ceil((box.south - south) / stepLat));
  const lastRow = Math.min(grid.rows - 1, Math.floor((box.north - south) / stepLat));
  if (firstRow > lastRow) return;
  const crossings: number[][] = Array.from({ length: lastRow - firstRow + 1 }, () => []);
  for (const ring of rings) {
    for (let i = 1; i < ring.length; i++) {
      const [lonA, latA] = ring[i - 1];
      const [lonB, latB] = ring[i];
      if (latA === latB) continue;
      // A row is crossed when its latitude lies in [lower, upper): a vertex is never counted twice.
      const lower = Math.min(latA, latB);
      const upper = Math.max(latA, latB);
      const to = Math.min(lastRow, Math.ceil((upper - south) / stepLat) - 1);
      for (let row = Math.max(firstRow, Math.ceil((lower - south) / stepLat)); row <= to; row++) {
        const lon = lonA + ((lonB - lonA) * (south + row * stepLat - latA)) / (latB - latA);
        crossings[row - firstRow].push((lon + shift - west) / stepLon);
      }
    }
  }
  for (let row = firstRow; row <= lastRow; row++) {
    const at = crossings[row - firstRow].sort((a, b) => a - b);
    for (let i = 0; i + 1 < at.length; i += 2) {
      const from = Math.max(0, Math.ceil(at[i]));
      const to = Math.min(columns, Math.ceil(at[i + 1]));
      if (from < to) marked.fill(1, row * columns + from, row * columns + to);
    }
  }
}
