import type { MultiPolygon, Polygon } from 'geojson';
import { describe, expect, test } from 'vitest';
import { destination, makeLandMask, quadrantRing } from '../../lib/geo';
import { rasterise } from '../../lib/geo/rasterise';

const rectangle = (west: number, south: number, east: number, north: number): number[][] => [
  [west, south],
  [east, south],
  [east, north],
  [west, north],
  [west, south],
];

const island: Polygon = { type: 'Polygon', coordinates: [rectangle(-59, 24, -57, 26)] };
const bounds = { west: -62, south: 22, east: -54, north: 28 };

describe('a rectangular island', () => {
  const mask = makeLandMask(island, bounds);

  test('is land inside and sea outside', () => {
    expect(mask.isLand(25, -58)).toBe(true);
    expect(mask.isLand(25, -60)).toBe(false);
    expect(mask.isLand(25, -56.98)).toBe(false);
    expect(mask.isLand(25, -57.02)).toBe(true);
  });

  test('has its coast where it is, to a kilometre', () => {
    for (const km of [5, 20, 60]) {
      const inland = destination(25, -57, 270, km);
      const offshore = destination(25, -57, 90, km);
      expect(Math.abs(mask.coastDistanceKm(inland.lat, inland.lon) - km)).toBeLessThan(1);
      expect(Math.abs(mask.coastDistanceKm(offshore.lat, offshore.lon) + km)).toBeLessThan(1);
    }
  });

  test('is as far from a corner as a great circle says', () => {
    const place = destination(26, -57, 45, 80);
    expect(Math.abs(mask.coastDistanceKm(place.lat, place.lon) + 80)).toBeLessThan(1.5);
  });

  test('distances are not told apart beyond 200 km', () => {
    expect(mask.coastDistanceKm(25, -54.1)).toBe(-200);
  });

  test('outside the bounds is open sea', () => {
    expect(mask.isLand(25, 10)).toBe(false);
    expect(mask.coastDistanceKm(60, -58)).toBe(-200);
  });
});

test('a lake is not land, and an island in it is', () => {
  const mask = makeLandMask(
    { type: 'MultiPolygon', coordinates: [[rectangle(-59, 24, -57, 26), rectangle(-58.5, 24.5, -57.5, 25.5)], [rectangle(-58.1, 24.9, -57.9, 25.1)]] },
    bounds,
  );
  expect(mask.isLand(25.3, -58)).toBe(false);
  expect(mask.isLand(25, -58)).toBe(true);
  expect(mask.isLand(25.8, -58)).toBe(true);
});

test('land that two polygons claim is land', () => {
  const mask = makeLandMask({ type: 'MultiPolygon', coordinates: [island.coordinates, island.coordinates] }, bounds);
  expect(mask.isLand(25, -58)).toBe(true);
});

describe('across the antimeridian', () => {
  const halves: MultiPolygon = { type: 'MultiPolygon', coordinates: [[rectangle(179, -17, 180, -16)], [rectangle(-180, -17, -179, -16)]] };

  test.each([
    ['east below west', { west: 177, south: -19, east: -177, north: -14 }],
    ['east past 180', { west: 177, south: -19, east: 183, north: -14 }],
    ['west past -180', { west: -183, south: -19, east: -177, north: -14 }],
  ])('an island in two halves is whole: bounds with %s', (_case, box) => {
    const mask = makeLandMask(halves, box);
    for (const lon of [179.2, 179.99, 180, -180, -179.99, -179.2]) expect(mask.isLand(-16.5, lon)).toBe(true);
    expect(mask.isLand(-16.5, 178.8)).toBe(false);
    expect(mask.isLand(-16.5, -178.8)).toBe(false);
    expect(mask.coastDistanceKm(-16.5, 180)).toBeGreaterThan(53);
  });

  test('one polygon that runs on past 180 is met as well', () => {
    const mask = makeLandMask({ type: 'Polygon', coordinates: [rectangle(179, -17, 181, -16)] }, { west: -183, south: -19, east: -177, north: -14 });
    expect(mask.isLand(-16.5, -179.5)).toBe(true);
  });
});

test('every place a kilometre or more off a round coast is on the right side of it', () => {
  const radiusKm = 100;
  const mask = makeLandMask({ type: 'Polygon', coordinates: [quadrantRing(25, -58, [radiusKm, radiusKm, radiusKm, radiusKm])] }, bounds);
  for (const km of [5, 50, 95, 99, 101, 105, 150]) {
    for (let azimuth = 0; azimuth < 360; azimuth += 0.5) {
      const place = destination(25, -58, azimuth, km);
      expect(mask.isLand(place.lat, place.lon)).toBe(km < radiusKm);
      expect(Math.abs(mask.coastDistanceKm(place.lat, place.lon) - (radiusKm - km))).toBeLessThan(1);
    }
  }
});

test('distances to a round coast are right in the mean to a quarter of a cell', () => {
  const mask = makeLandMask({ type: 'Polygon', coordinates: [quadrantRing(25, -58, [100, 100, 100, 100])] }, bounds);
  for (const km of [40, 70, 140, 170]) {
    let error = 0;
    for (let azimuth = 0; azimuth < 360; azimuth++) {
      const place = destination(25, -58, azimuth, km);
      error += (mask.coastDistanceKm(place.lat, place.lon) - (100 - km)) / 360;
    }
    expect(Math.abs(error)).toBeLessThan(0.25);
  }
});

test('a corner that lies on a row of cells is crossed once', () => {
  // A diamond with its corners on the middle row, which is at 25 N: bounds three degrees either side and an even number of steps.
  const diamond: Polygon = { type: 'Polygon', coordinates: [[[-59, 25], [-58, 24], [-57, 25], [-58, 26], [-59, 25]]] };
  const marked = rasterise(diamond, { west: -61, south: 22, stepLon: 0.5, stepLat: 0.5, columns: 13, rows: 13 });
  const row = (lat: number): number[] => [...marked.slice(((lat - 22) / 0.5) * 13, ((lat - 22) / 0.5 + 1) * 13)];
  expect(row(25)).toEqual([0, 0, 0, 0, 1, 1, 1, 1, 0, 0, 0, 0, 0]);
  expect(row(24.5)).toEqual([0, 0, 0, 0, 0, 1, 1, 0, 0, 0, 0, 0, 0]);
  expect(row(22.5).includes(1)).toBe(false);
});

test('a box too large for its cells gets coarser ones, not more memory', () => {
  const mask = makeLandMask(island, { west: -180, south: -60, east: 180, north: 60 }, 1);
  expect(mask.isLand(25, -58)).toBe(true);
  expect(mask.isLand(25, -62)).toBe(false);
});

test('bounds without extent are refused with what they were', () => {
  expect(() => makeLandMask(island, { west: 0, south: 5, east: 10, north: 5 })).toThrow('south 5');
  expect(() => makeLandMask(island, bounds, 0)).toThrow('Unexpected cellKm value: 0');
});
