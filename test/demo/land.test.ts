import { createRequire } from 'node:module';
import { readFileSync } from 'node:fs';
import { area, bbox, booleanClockwise, booleanPointInPolygon, booleanValid, kinks } from '@turf/turf';
import type { FeatureCollection, MultiPolygon, Polygon, Position } from 'geojson';
import { feature } from 'topojson-client';
import type { Topology } from 'topojson-specification';
import { describe, expect, test } from 'vitest';
import { distanceKm } from '../../lib/geo';
import { assetsOf, cellsOf, coast, feederFeatures, textOf } from './shipped';

/** Whether a place lies on an island of the demo, asked of turf; boxes first, so that 100,000 places take seconds. */
function onLand(): (lon: number, lat: number) => boolean {
  const islands = coast.features.map((island) => ({ island, box: bbox(island) }));
  return (lon, lat) => islands.some(({ island, box }) => lon >= box[0] && lon <= box[2] && lat >= box[1] && lat <= box[3] && booleanPointInPolygon([lon, lat], island));
}

describe('every place is on land', () => {
  const isLand = onLand();

  test.each(['hospitals.csv', 'shelters.csv', 'bridges.csv', 'substations.csv', 'depots.csv'])('%s', (file) => {
    for (const { id, geometry } of assetsOf(file)) expect(isLand(...((geometry as { coordinates: Position }).coordinates as [number, number])), id).toBe(true);
  });

  test('properties', () => {
    const wet = assetsOf('properties.csv').filter(({ geometry }) => !isLand(...((geometry as { coordinates: Position }).coordinates as [number, number])));
    expect(wet.map(({ id }) => id)).toEqual([]);
  }, 120_000);

  test('population cells', () => {
    const { count, lat, lon } = cellsOf();
    expect(Array.from({ length: count }, (_, i) => i).filter((i) => !isLand(lon[i], lat[i]))).toEqual([]);
  }, 120_000);

  test('the corners of feeders', () => {
    for (const { properties, geometry } of feederFeatures.features) for (const [lon, lat] of geometry.coordinates) expect(isLand(lon, lat), String(properties.id)).toBe(true);
  }, 60_000);

  test('the towns of the map', () => {
    const { places } = JSON.parse(textOf('world.json')) as { places: { name: string; lat: number; lon: number }[] };
    for (const { name, lat, lon } of places) expect(isLand(lon, lat), name).toBe(true);
  });
});

describe('the country', () => {
  test('has a main island about 300 km long', () => {
    const [west, , east] = bbox(coast.features[0]);
    const lengthKm = distanceKm(25.2, west, 25.2, east);
    expect(lengthKm).toBeGreaterThan(280);
    expect(lengthKm).toBeLessThan(345);
  });

  test('has islands that are valid polygons, and do not cross themselves', () => {
    for (const island of coast.features) {
      expect(booleanValid(island)).toBe(true);
      expect(kinks(island).features).toEqual([]);
    }
  }, 60_000);

  test('turns its outer rings counter-clockwise and its lakes clockwise (RFC 7946, section 3.1.6)', () => {
    for (const { geometry } of coast.features) geometry.coordinates.forEach((ring, i) => expect(booleanClockwise(ring)).toBe(i > 0));
  });

  test('has smaller islands, and a long thin barrier coast to the south', () => {
    const [main, ...others] = coast.features;
    expect(others.length).toBeGreaterThan(10);
    expect(area(others[0])).toBeLessThan(area(main) / 10);
    const barriers = others.filter((island) => {
      const [west, south, east, north] = bbox(island);
      const spanKm = distanceKm(south, west, north, east);
      return north < 25.3 && spanKm > 25 && area(island) / 1e6 / spanKm < 5;
    });
    expect(barriers.length).toBeGreaterThanOrEqual(3);
  });

  test('lies in open ocean: no land of Natural Earth within 300 km (1:10 million, package world-atlas)', () => {
    const path = createRequire(import.meta.url).resolve('world-atlas/land-10m.json');
    const topology = JSON.parse(readFileSync(path, 'utf8')) as Topology;
    const land = feature(topology, topology.objects.land) as unknown as FeatureCollection<Polygon | MultiPolygon>;
    const corners = land.features.flatMap(({ geometry }) => (geometry.type === 'Polygon' ? [geometry.coordinates] : geometry.coordinates)).flat(2);
    const [west, south, east, north] = bbox(coast);
    for (const [lat, lon] of [[south, west], [south, east], [north, west], [north, east], [25.2, -48.5]]) {
      expect(corners.reduce((least, [x, y]) => Math.min(least, distanceKm(lat, lon, y, x)), Infinity)).toBeGreaterThan(300);
    }
  });
});
