import { readFileSync } from 'node:fs';
import { createRequire } from 'node:module';
import { feature } from 'topojson-client';
import type { Topology } from 'topojson-specification';
import type { FeatureCollection, MultiPolygon, Polygon } from 'geojson';
import { makeLandMask } from '../../lib/geo';
import type { LandMask } from '../../lib/geo';

export interface Bounds {
  west: number;
  south: number;
  east: number;
  north: number;
}

const require = createRequire(import.meta.url);

let naturalEarth: MultiPolygon | null = null;

/** Natural Earth land at 1:10 million (public domain, package world-atlas), read once a thread. */
function naturalEarthLand(): MultiPolygon {
  if (naturalEarth) return naturalEarth;
  const topology = JSON.parse(readFileSync(require.resolve('world-atlas/land-10m.json'), 'utf8')) as Topology;
  const land = feature(topology, topology.objects.land) as unknown as FeatureCollection<MultiPolygon | Polygon>;
  naturalEarth = { type: 'MultiPolygon', coordinates: land.features.flatMap(({ geometry }) => polygonsOf(geometry)) };
  return naturalEarth;
}

const polygonsOf = (geometry: MultiPolygon | Polygon): MultiPolygon['coordinates'] =>
  geometry.type === 'Polygon' ? [geometry.coordinates] : geometry.coordinates;

function coastPolygons(coastFile: string): MultiPolygon['coordinates'] {
  const coast = JSON.parse(readFileSync(coastFile, 'utf8')) as FeatureCollection<MultiPolygon | Polygon>;
  return coast.features.flatMap(({ geometry }) => polygonsOf(geometry));
}

const masks = new Map<string, LandMask>();
const MASKS_KEPT = 4;

/** Land within bounds: the world's, and the coast of an invented country where an event has one. */
export function landMask(coastFile: string | null, bounds: Bounds, cellKm: number): LandMask {
  const key = JSON.stringify([coastFile, bounds, cellKm]);
  const held = masks.get(key);
  if (held) return held;
  const coordinates = [...naturalEarthLand().coordinates, ...(coastFile ? coastPolygons(coastFile) : [])];
  const mask = makeLandMask({ type: 'MultiPolygon', coordinates }, bounds, cellKm);
  if (masks.size >= MASKS_KEPT) masks.delete(masks.keys().next().value!);
  masks.set(key, mask);
  return mask;
}

/** Bounds of places with a margin in degrees, rounded outward to whole degrees so that masks are shared between runs. */
export function boundsOf(lat: ArrayLike<number>, lon: ArrayLike<number>, marginDeg: number): Bounds {
  let [west, south, east, north] = [Infinity, Infinity, -Infinity, -Infinity];
  for (let i = 0; i < lat.length; i++) {
    west = Math.min(west, lon[i]);
    east = Math.max(east, lon[i]);
    south = Math.min(south, lat[i]);
    north = Math.max(north, lat[i]);
  }
  return {
    west: Math.floor(west - marginDeg),
    south: Math.max(-90, Math.floor(south - marginDeg)),
    east: Math.ceil(east + marginDeg),
    north: Math.min(90, Math.ceil(north + marginDeg)),
  };
}
