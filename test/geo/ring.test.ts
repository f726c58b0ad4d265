import { area, booleanClockwise } from '@turf/turf';
import fc from 'fast-check';
import { describe, expect, test } from 'vitest';
import { bearingDeg, cutAtAntimeridian, distanceKm, EARTH_RADIUS_KM, quadrantRing } from '../../lib/geo';

const radius = fc.double({ min: 1, max: 800, noNaN: true });
const lat = fc.double({ min: -60, max: 60, noNaN: true });
const lon = fc.double({ min: -180, max: 180, noNaN: true });

describe('a ring by quadrant', () => {
  test('is closed and counterclockwise', () => {
    fc.assert(
      fc.property(lat, lon, radius, radius, radius, radius, (centreLat, centreLon, ne, se, sw, nw) => {
        const ring = quadrantRing(centreLat, centreLon, [ne, se, sw, nw]);
        expect(ring[0]).toEqual(ring[ring.length - 1]);
        expect(booleanClockwise(ring)).toBe(false);
      }),
    );
  });

  test('holds each radius within its quadrant', () => {
    const radiiKm = [200, 150, 100, 50] as const;
    for (const [placeLon, placeLat] of quadrantRing(20, -58, radiiKm)) {
      const bearing = bearingDeg(20, -58, placeLat, placeLon);
      const offAxis = Math.abs(((bearing + 45) % 90) - 45);
      if (offAxis < 1) continue;
      expect(distanceKm(20, -58, placeLat, placeLon)).toBeCloseTo(radiiKm[Math.floor(bearing / 90)], 6);
    }
  });

  test('of equal radii has the area of a spherical cap within 0.5 %', () => {
    for (const [centreLat, km] of [[0, 100], [25, 300], [-45, 500]] as const) {
      const cap = 2 * Math.PI * EARTH_RADIUS_KM ** 2 * (1 - Math.cos(km / EARTH_RADIUS_KM));
      const polygon = { type: 'Polygon' as const, coordinates: [quadrantRing(centreLat, 10, [km, km, km, km])] };
      expect(Math.abs(area(polygon) / 1e6 / cap - 1)).toBeLessThan(0.005);
    }
  });

  test('with radii in one quadrant alone is a quarter, from the centre', () => {
    const ring = quadrantRing(20, -58, [100, 0, 0, 0]);
    expect(ring).toContainEqual([-58, 20]);
    for (const [placeLon, placeLat] of ring) {
      expect(placeLon).toBeGreaterThan(-58 - 1e-9);
      expect(placeLat).toBeGreaterThan(20 - 0.01);
    }
  });

  test('without any radius is empty', () => {
    expect(quadrantRing(20, -58, [0, 0, 0, 0])).toEqual([]);
  });

  test('never jumps across the antimeridian', () => {
    for (const side of [179.9, -179.9, 180, -180]) {
      const ring = quadrantRing(-17, side, [300, 200, 100, 250]);
      for (let i = 1; i < ring.length; i++) expect(Math.abs(ring[i][0] - ring[i - 1][0])).toBeLessThan(5);
    }
  });

  test('refuses a radius that is none, saying which', () => {
    expect(() => quadrantRing(20, -58, [100, -5, 0, 0])).toThrow('-5 km');
    expect(() => quadrantRing(20, -58, [NaN, 0, 0, 0])).toThrow('NaN');
  });

  test('around a pole is closed over it', () => {
    const cut = cutAtAntimeridian({ type: 'Polygon', coordinates: [quadrantRing(89, 0, [500, 500, 500, 500])] });
    const cap = 2 * Math.PI * EARTH_RADIUS_KM ** 2 * (1 - Math.cos(500 / EARTH_RADIUS_KM));
    expect(Math.abs(area(cut) / 1e6 / cap - 1)).toBeLessThan(0.01);
  });
});
