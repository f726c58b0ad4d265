import { area, booleanPointInPolygon, booleanValid, kinks } from '@turf/turf';
import type { MultiPolygon } from 'geojson';
import { describe, expect, test } from 'vitest';
import { areaAtOrAbove, forecastHazard, forecastPath, gridOver, gridPlaces, makeBlocks, nodeLeads, placesAt, reachBox, tabulateStorm } from '../../lib/hazard';
import type { Grid } from '../../lib/hazard';
import { makeTrack } from '../../lib/track';
import type { Advisory } from '../../lib/advisory';
import { recurving, steady } from './storms';

function swathOf(advisory: Advisory, kt: number, most = 60_000): { grid: Grid; swath: MultiPolygon } {
  const track = makeTrack(advisory);
  const table = tabulateStorm(track, nodeLeads(track, 0.5));
  const grid = gridOver(reachBox(forecastPath(table, 30))!, most, 3);
  const { places, gridIndex } = gridPlaces(grid);
  const hazard = forecastHazard(table, places, makeBlocks(places, null));
  const values = new Float32Array(gridIndex.length);
  gridIndex.forEach((at, i) => (values[at] = hazard.peakKt[i]));
  return { grid, swath: areaAtOrAbove(grid, values, kt)! };
}

const M2_PER_KM2 = 1e6;

describe('the swath of a round storm on a straight course', () => {
  // A stadium: a rectangle as long as the course and two half discs. Plane geometry; the sphere adds less than 1 % at this size,
  // the grid (about 4 km) rounds the rest.
  test.each([
    [34, 120],
    [50, 60],
    [64, 30],
  ] as const)('at %i kt has the area of a stadium of radius %i nmi within 2 %', (kt, radiusNm) => {
    const hours = 48;
    const speedKt = 10;
    const { swath } = swathOf(steady({ hours, speedKt }), kt);
    const radiusKm = radiusNm * 1.852;
    const lengthKm = hours * speedKt * 1.852;
    const stadiumKm2 = 2 * radiusKm * lengthKm + Math.PI * radiusKm ** 2;
    expect(Math.abs(area(swath) / M2_PER_KM2 / stadiumKm2 - 1)).toBeLessThan(0.02);
  });
});

describe('swath polygons', () => {
  const bands = ([34, 50, 64] as const).map((kt) => swathOf(recurving, kt));

  test('are valid, with no ring that crosses itself', () => {
    for (const { swath } of bands) {
      expect(booleanValid(swath)).toBe(true);
      expect(kinks({ type: 'Feature', geometry: swath, properties: {} }).features).toHaveLength(0);
    }
  });

  test('outer rings run anticlockwise (RFC 7946, section 3.1.6)', () => {
    for (const { swath } of bands) for (const [outer] of swath.coordinates) expect(signedArea(outer)).toBeGreaterThan(0);
  });

  test('nest: each corner of a stronger band lies inside the weaker one', () => {
    for (let b = 1; b < bands.length; b++) {
      for (const ring of bands[b].swath.coordinates.flat()) for (const corner of ring) expect(booleanPointInPolygon(corner, bands[b - 1].swath)).toBe(true);
    }
  });

  test('hold the places whose wind clears the threshold, and no others, but for the drawing tolerance of a knot', () => {
    const points = Array.from({ length: 1500 }, (_, i) => ({ lat: 20 + ((i * 7919) % 1500) / 90, lon: -54 + ((i * 104729) % 1500) / 80 }));
    const track = makeTrack(recurving);
    const table = tabulateStorm(track, nodeLeads(track, 0.5));
    const places = placesAt(points.map((p) => p.lat), points.map((p) => p.lon), new Float32Array(points.length).fill(1));
    const hazard = forecastHazard(table, places, makeBlocks(places, null));
    [34, 50, 64].forEach((kt, b) => {
      points.forEach(({ lat, lon }, i) => {
        const margin = hazard.peakKt[i] - kt;
        if (Math.abs(margin) > 1) expect(booleanPointInPolygon([lon, lat], bands[b].swath)).toBe(margin > 0);
      });
    });
  });
});

test('a swath across the 180th meridian is cut there and keeps its area', () => {
  const there = swathOf(steady({ hours: 24, speedKt: 12, lon: -50 }), 34).swath;
  const across = swathOf(steady({ hours: 24, speedKt: 12, lon: 179.5 }), 34).swath;
  const longitudes = across.coordinates.flat(2).map(([lon]) => lon);
  expect(Math.min(...longitudes)).toBeGreaterThanOrEqual(-180);
  expect(Math.max(...longitudes)).toBeLessThanOrEqual(180);
  expect(across.coordinates.length).toBeGreaterThan(1);
  expect(area(across) / area(there)).toBeCloseTo(1, 2);
});

test('a field that nowhere reaches the level has no area', () => {
  const grid = gridOver({ west: 0, east: 1, south: 0, north: 1 }, 100, 5);
  expect(areaAtOrAbove(grid, new Float32Array(grid.columns * grid.rows), 34)).toBeNull();
});

test('a grid keeps within the number of places it is given', () => {
  const grid = gridOver({ west: 170, east: 200, south: -30, north: 10 }, 5_000, 1);
  expect(grid.columns * grid.rows).toBeLessThan(5_600);
  expect(grid.columns * grid.rows).toBeGreaterThan(4_400);
});

const signedArea = (ring: number[][]): number => {
  let sum = 0;
  for (let i = 0; i + 1 < ring.length; i++) sum += ring[i][0] * ring[i + 1][1] - ring[i + 1][0] * ring[i][1];
  return sum / 2;
};
