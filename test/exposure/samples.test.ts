import { along, area, booleanPointInPolygon, distance, length, lineString, pointToLineDistance } from '@turf/turf';
import fc from 'fast-check';
import { describe, expect, test } from 'vitest';
import { alongLine } from '../../lib/exposure/alongLine';
import { assetPlaces } from '../../lib/exposure/assetPlaces';
import { insideArea } from '../../lib/exposure/insideArea';
import { place, polygon, polygonWithHole } from './shapes';
import { square } from './readings';

describe('a line', () => {
  /**
   * Corners up to 33 km apart east and north. Straight in degrees (RFC 7946, 3.1.1) then keeps within L^2 tan(lat) / 8R = 20 m of
   * turf's great circle, and Lx Ly tan(lat) / 8R = 10 m along it.
   */
  const winding = fc.array(place, { minLength: 2, maxLength: 12 }).map((corners) => corners.map(([lon, lat]) => [-48 + (lon + 48) / 10, 25 + (lat - 25) / 10]));

  test('is looked at every two kilometres at most along it, from one end to the other, at the places turf finds there', () => {
    fc.assert(
      fc.property(winding, (corners) => {
        const line = lineString(corners);
        const places = alongLine(corners);
        const stepKm = length(line) / (places.length - 1);
        expect(stepKm).toBeLessThanOrEqual(2);
        expect([places[0], places[places.length - 1]]).toEqual([corners[0], corners[corners.length - 1]]);
        places.forEach((one, k) => expect(distance(one, along(line, k * stepKm))).toBeLessThan(0.025));
      }),
      { numRuns: 30, seed: 3 },
    );
  });

  test('with a corner every ten metres needs no more places than a straight one', () => {
    const corners = Array.from({ length: 601 }, (_, i) => [-48 + i * 1e-4, 25 + (i % 2) * 1e-6]);
    expect(alongLine(corners)).toHaveLength(Math.ceil(length(lineString(corners)) / 2) + 1);
  });

  test('of no length is its ends', () => {
    expect(alongLine([[-48, 25], [-48, 25]])).toEqual([[-48, 25], [-48, 25]]);
  });
});

describe('an area', () => {
  test('is looked at only within it', () => {
    fc.assert(
      fc.property(polygonWithHole, (shape) => {
        for (const [lon, lat] of insideArea(shape)) expect(booleanPointInPolygon([lon, lat], shape)).toBe(true);
      }),
      { numRuns: 100, seed: 5 },
    );
  });

  test('has a place for every step by step of its ground, by turf’s measure of the ground', () => {
    fc.assert(
      fc.property(polygon, (shape) => {
        const [lons, lats] = [shape.coordinates[0].map(([lon]) => lon), shape.coordinates[0].map(([, lat]) => lat)];
        const boxKm2 = distance([Math.min(...lons), 25], [Math.max(...lons), 25]) * distance([0, Math.min(...lats)], [0, Math.max(...lats)]);
        const stepKm = Math.max(2, Math.sqrt(boxKm2 / 2000));
        const expected = area(shape) / 1e6 / stepKm ** 2;
        expect(Math.abs(insideArea(shape).length - expected)).toBeLessThan(2 + 0.06 * expected);
      }),
      { numRuns: 100, seed: 11 },
    );
  });

  test('as thin as a barrier island is looked at all along it', () => {
    const island = { type: 'Polygon' as const, coordinates: [[[-48, 25], [-47.7, 25.1], [-47.7, 25.106], [-48, 25.006], [-48, 25]]] };
    const lons = insideArea(island).map(([lon]) => lon);
    expect(lons.length).toBeGreaterThan(3);
    expect(Math.max(...lons) - Math.min(...lons)).toBeGreaterThan(0.2);
  });

  test('smaller than a step has one place, within it', () => {
    const campus = square(-48, 25, 0.003);
    const places = insideArea(campus);
    expect(places).toHaveLength(1);
    expect(booleanPointInPolygon(places[0], campus)).toBe(true);
  });

  test('of two specks far apart still has a place', () => {
    const specks = { type: 'MultiPolygon' as const, coordinates: [square(-48, 25, 0.001).coordinates, square(-47, 26, 0.002).coordinates] };
    expect(insideArea(specks)).toHaveLength(1);
    expect(booleanPointInPolygon(insideArea(specks)[0], specks)).toBe(true);
  });

  test('of a continent is looked at some two thousand times', () => {
    expect(insideArea(square(-30, 0, 60)).length).toBeLessThan(2300);
  });

  test('with a hundred and fifty thousand corners is looked at in a moment', () => {
    const ring = Array.from({ length: 150_000 }, (_, i): [number, number] => [-48 + Math.cos((2 * Math.PI * i) / 150_000), 25 + Math.sin((2 * Math.PI * i) / 150_000)]);
    expect(insideArea({ type: 'Polygon', coordinates: [[...ring, ring[0]]] }).length).toBeGreaterThan(1000);
  });
});

describe('an asset is shown', () => {
  test('at the middle of its line', () => {
    const { places, middle } = assetPlaces({ type: 'LineString', coordinates: [[-48, 25], [-47.9, 25]] });
    expect(places[middle][0]).toBeCloseTo(-47.95, 1.5);
  });

  test('within its area, never on its outline', () => {
    fc.assert(
      fc.property(polygonWithHole, (shape) => {
        const { places, middle } = assetPlaces(shape);
        expect(booleanPointInPolygon(places[middle], shape, { ignoreBoundary: true })).toBe(true);
      }),
      { numRuns: 50, seed: 2 },
    );
  });

  test('and looked at along its outline too', () => {
    const campus = square(-48, 25, 0.05);
    const { places } = assetPlaces(campus);
    const outline = lineString(campus.coordinates[0]);
    expect(places.filter((one) => pointToLineDistance(one, outline) < 0.01).length).toBeGreaterThanOrEqual(10);
  });
});
