import type { Geometry, Position } from 'geojson';

/** A closed outline, then its holes; lon, lat in degrees. */
export type Polygon = Position[][];

/** The polygons of a geometry, flat; nothing for points and lines. */
export function polygonsOf(geometry: Geometry): Polygon[] {
  if (geometry.type === 'Polygon') return [geometry.coordinates];
  if (geometry.type === 'MultiPolygon') return geometry.coordinates;
  return geometry.type === 'GeometryCollection' ? geometry.geometries.flatMap(polygonsOf) : [];
}

const runOn = (ring: Position[]): Position[] => {
  let shift = 0;
  return ring.map(([lon, lat], i) => {
    if (i > 0) shift -= 360 * Math.round((lon - ring[i - 1][0]) / 360);
    return [lon + shift, lat];
  });
};
const middle = (ring: Position[]): number => {
  const lons = ring.map(([lon]) => lon);
  return (lons.reduce((a, b) => Math.min(a, b)) + lons.reduce((a, b) => Math.max(a, b))) / 2;
};
const turned = (ring: Position[], turns: number): Position[] => (turns === 0 ? ring : ring.map(([lon, lat]) => [lon + 360 * turns, lat]));

/**
 * The same polygon with longitudes that run on past 180 rather than jump, so that no edge crosses the whole map; its middle lies
 * in -180..180. One that goes round a pole cannot run on and stays as it is.
 */
export function runOnPolygon(polygon: Polygon): Polygon {
  const outer = runOn(polygon[0]);
  if (Math.abs(outer[outer.length - 1][0] - outer[0][0]) > 180) return polygon;
  const home = turned(outer, -Math.round(middle(outer) / 360));
  const centre = middle(home);
  return [home, ...polygon.slice(1).map(runOn).map((hole) => turned(hole, Math.round((centre - middle(hole)) / 360)))];
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
