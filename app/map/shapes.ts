import type { Geometry, Position } from 'geojson';

/** A closed outline, then its holes; lon, lat in degrees. */
export type Polygon = Position[][];

/** The polygons of a geometry, flat; nothing for points and lines. */
export function polygonsOf(geometry: Geometry): Polygon[] {
  if (geometry.type === 'Polygon') return [geometry.coordinates];
  if (geometry.type === 'MultiPolygon') return geometry.coordinates;
  return geometry.type === 'GeometryCollection' ? geometry.geometries.flatMap(polygonsOf) : [];
}

const onSeam = (a: Position, b: Position): boolean => Math.abs(a[0]) > 179.999 && Math.abs(b[0]) > 179.999;

/** Outlines as lines, without the edges that only exist because a polygon is cut at the 180th meridian. */
export function outlinesOf(polygons: readonly Polygon[]): Position[][] {
  const lines: Position[][] = [];
  for (const ring of polygons.flat()) {
    let line: Position[] = [];
    for (let i = 0; i < ring.length; i++) {
      if (line.length > 0 && onSeam(ring[i - 1], ring[i])) {
        if (line.length > 1) lines.push(line);
        line = [];
      }
      line.push(ring[i]);
    }
    if (line.length > 1) lines.push(line);
  }
  return lines;
}

/** Whether a place lies inside a polygon and outside its holes: even-odd crossings in the plane of the degrees. */
export function polygonHolds(polygon: Polygon, lon: number, lat: number): boolean {
  let inside = false;
  for (const ring of polygon)
    for (let i = 0, j = ring.length - 1; i < ring.length; j = i++) {
      const [xi, yi] = ring[i];
      const [xj, yj] = ring[j];
      if (yi > lat !== yj > lat && lon < ((xj - xi) * (lat - yi)) / (yj - yi) + xi) inside = !inside;
    }
  return inside;
}
