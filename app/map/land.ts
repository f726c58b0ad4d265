import { feature } from 'topojson-client';
import type { GeometryCollection, Topology } from 'topojson-specification';
import type { FeatureCollection, Position } from 'geojson';
import { clipPolygons, withoutBox } from './clip';
import { unproject } from './mercator';
import type { Bounds, Camera, Size } from './mercator';
import { outlinesOf, polygonsOf, runOnPolygon } from './shapes';
import type { Polygon } from './shapes';

export interface Land {
  polygons: Polygon[];
  outlines: Position[][];
}

const cache = new Map<string, Promise<Polygon[]>>();

/** Land by file, fetched once a page. Natural Earth (public domain) as packed in world-atlas, or a coast of an exercise's own. */
function loadPolygons(path: string): Promise<Polygon[]> {
  let land = cache.get(path);
  if (!land) {
    land = fetchPolygons(path);
    land.catch(() => cache.delete(path));
    cache.set(path, land);
  }
  return land;
}

async function fetchPolygons(path: string): Promise<Polygon[]> {
  const response = await fetch(path);
  if (!response.ok) throw new Error(`${path}: ${response.status}`);
  const body = (await response.json()) as Topology<{ land: GeometryCollection }> | FeatureCollection;
  const collection = body.type === 'Topology' ? (feature(body, body.objects.land) as FeatureCollection) : body;
  return collection.features.flatMap((one) => polygonsOf(one.geometry)).map(runOnPolygon);
}

/** Where the land of a view comes from: the whole world coarsely, or a box around the view from the 1:10,000,000 data. */
export interface LandWish {
  path: string;
  box: Bounds | null;
}

const FINE_ZOOM = 5.5;
const COARSE = '/land/land-50m.json';
const FINE = '/land/land-10m.json';

/** A box that holds the view with as much again on every side, in steps, so that panning seldom asks for another. */
export function boxAround(camera: Camera, size: Size): Bounds {
  const half = ((size.width / 2) * 360) / (512 * 2 ** camera.zoom);
  const [, north] = unproject(camera, size, 0, 0);
  const [, south] = unproject(camera, size, 0, size.height);
  const tall = north - south;
  const step = camera.zoom < 4 ? 30 : 5;
  return {
    west: Math.floor((camera.lon - 2 * half) / step) * step - step,
    east: Math.ceil((camera.lon + 2 * half) / step) * step + step,
    south: Math.max(-85, Math.floor((south - tall / 2) / step) * step - step),
    north: Math.min(85, Math.ceil((north + tall / 2) / step) * step + step),
  };
}

export const COARSE_WORLD: LandWish = { path: COARSE, box: null };

export const landWish = (camera: Camera, size: Size): LandWish =>
  camera.zoom < FINE_ZOOM || size.width === 0 ? COARSE_WORLD : { path: FINE, box: boxAround(camera, size) };

export async function loadLand({ path, box }: LandWish): Promise<Land> {
  const polygons = await loadPolygons(path);
  if (!box) return { polygons, outlines: outlinesOf(polygons) };
  const inside = clipPolygons(polygons, box);
  return { polygons: inside, outlines: withoutBox(outlinesOf(inside), box) };
}
