import { feature } from 'topojson-client';
import type { GeometryCollection, Topology } from 'topojson-specification';
import type { FeatureCollection, Position } from 'geojson';
import { outlinesOf, polygonsOf, runOnPolygon } from './shapes';
import type { Polygon } from './shapes';

export interface Land {
  polygons: Polygon[];
  outlines: Position[][];
}

const cache = new Map<string, Promise<Land>>();

/** Land by file, fetched once a page. Natural Earth (public domain) as packed in world-atlas, or a coast of an exercise's own. */
export function loadLand(path: string): Promise<Land> {
  let land = cache.get(path);
  if (!land) {
    land = fetchLand(path);
    land.catch(() => cache.delete(path));
    cache.set(path, land);
  }
  return land;
}

async function fetchLand(path: string): Promise<Land> {
  const response = await fetch(path);
  if (!response.ok) throw new Error(`${path}: ${response.status}`);
  const body = (await response.json()) as Topology<{ land: GeometryCollection }> | FeatureCollection;
  const collection = body.type === 'Topology' ? (feature(body, body.objects.land) as FeatureCollection) : body;
  const polygons = collection.features.flatMap((one) => polygonsOf(one.geometry)).map(runOnPolygon);
  return { polygons, outlines: outlinesOf(polygons) };
}

/** Above this zoom the coast is drawn from the 1:10,000,000 data. */
export const FINE_ZOOM = 5.5;
export const landPath = (zoom: number): string => (zoom >= FINE_ZOOM ? '/land/land-10m.json' : '/land/land-50m.json');
