import { readFileSync } from 'node:fs';
import { createRequire } from 'node:module';
import { feature } from 'topojson-client';
import type { Topology } from 'topojson-specification';
import type { FeatureCollection, MultiPolygon, Polygon } from 'geojson';
import { makeLandMask } from '../../lib/geo';
import type { Bounds, LandMask } from '../../lib/geo';

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
