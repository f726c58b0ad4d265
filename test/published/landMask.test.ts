import { createRequire } from 'node:module';
import { readFileSync } from 'node:fs';
import { feature } from 'topojson-client';
import type { Topology } from 'topojson-specification';
import type { FeatureCollection, MultiPolygon, Polygon } from 'geojson';
import { expect, test } from 'vitest';
import { makeLandMask } from '../../lib/geo';

// Natural Earth 1:10 million land (public domain) from npm world-atlas; facts of geography, no source needed.
const require = createRequire(import.meta.url);
const topology = JSON.parse(readFileSync(require.resolve('world-atlas/land-10m.json'), 'utf8')) as Topology;
const { features } = feature(topology, topology.objects.land) as unknown as FeatureCollection<MultiPolygon | Polygon>;
const land: MultiPolygon = { type: 'MultiPolygon', coordinates: features.flatMap(({ geometry }) => (geometry.type === 'Polygon' ? [geometry.coordinates] : geometry.coordinates)) };

test('Florida is land, the Gulf Stream beside it is not', () => {
  const mask = makeLandMask(land, { west: -85, south: 22, east: -75, north: 32 }, 1.5);
  expect(mask.isLand(28.0, -81.5)).toBe(true);
  expect(mask.isLand(26.5, -79.5)).toBe(false);
  // Orlando lies some 60 km from the Atlantic.
  expect(mask.coastDistanceKm(28.54, -81.38)).toBeGreaterThan(40);
  expect(mask.coastDistanceKm(28.54, -81.38)).toBeLessThan(75);
});

test('Fiji\'s Vanua Levu and Taveuni are land on both sides of the 180th meridian', () => {
  const mask = makeLandMask(land, { west: 175, south: -22, east: -175, north: -12 }, 1);
  expect(mask.isLand(-16.6, 179.4)).toBe(true);
  expect(mask.isLand(-16.85, -179.97)).toBe(true);
  expect(mask.isLand(-17.8, 178)).toBe(true);
  expect(mask.isLand(-18, -178)).toBe(false);
});

test('ten degrees square at 1.5 km take well under 300 ms', () => {
  const run = (): number => {
    const start = performance.now();
    makeLandMask(land, { west: -85, south: 22, east: -75, north: 32 }, 1.5);
    return performance.now() - start;
  };
  expect(Math.min(run(), run(), run())).toBeLessThan(300);
});
