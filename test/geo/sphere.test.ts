import fc from 'fast-check';
import { describe, expect, test } from 'vitest';
import { bearingDeg, destination, distanceKm, EARTH_RADIUS_KM, fromUnitVector, normaliseLon, unitVector } from '../../lib/geo';

const lat = fc.double({ min: -89.9, max: 89.9, noNaN: true });
const lon = fc.double({ min: -180, max: 180, noNaN: true });
const bearing = fc.double({ min: 0, max: 360, noNaN: true });
const km = fc.double({ min: 0.001, max: 15_000, noNaN: true });

describe('normaliseLon', () => {
  test.each([
    [180, -180],
    [-180, -180],
    [181, -179],
    [-190, 170],
    [540, -180],
    [359.5, -0.5],
    [0, 0],
  ])('%d is the meridian %d', (from, to) => {
    expect(normaliseLon(from)).toBeCloseTo(to, 12);
  });

  test('a longitude in range keeps its last digit', () => {
    expect(normaliseLon(-58.123456789012345)).toBe(-58.123456789012345);
  });
});

describe('distance', () => {
  test('a degree of a great circle is 111.195 km', () => {
    expect(distanceKm(0, 179.5, 0, -179.5)).toBeCloseTo((EARTH_RADIUS_KM * Math.PI) / 180, 9);
    expect(distanceKm(10, 5, 11, 5)).toBeCloseTo((EARTH_RADIUS_KM * Math.PI) / 180, 9);
  });

  test('does not lose metres between neighbours', () => {
    expect(distanceKm(25, -58, 25 + 1e-8, -58) * 1e6).toBeCloseTo(EARTH_RADIUS_KM * 1e6 * ((1e-8 * Math.PI) / 180), 2);
  });

  test('is the same both ways and after any turn about the pole', () => {
    fc.assert(
      fc.property(lat, lon, lat, lon, lon, (aLat, aLon, bLat, bLon, turn) => {
        const there = distanceKm(aLat, aLon, bLat, bLon);
        expect(distanceKm(bLat, bLon, aLat, aLon)).toBeCloseTo(there, 6);
        expect(distanceKm(aLat, normaliseLon(aLon + turn), bLat, normaliseLon(bLon + turn))).toBeCloseTo(there, 6);
      }),
    );
  });
});

describe('destination', () => {
  test('lies at the distance and bearing asked for', () => {
    fc.assert(
      fc.property(lat, lon, bearing, km, (fromLat, fromLon, azimuth, distance) => {
        const to = destination(fromLat, fromLon, azimuth, distance);
        expect(distanceKm(fromLat, fromLon, to.lat, to.lon)).toBeCloseTo(distance, 6);
        const turn = normaliseLon(bearingDeg(fromLat, fromLon, to.lat, to.lon) - azimuth);
        // One metre sideways at the least distance is what double precision keeps of a bearing.
        expect(Math.abs(turn) * distance).toBeLessThan(1e-4);
      }),
    );
  });

  test('over the pole comes down on the other side', () => {
    const over = destination(89, 20, 0, (2 * EARTH_RADIUS_KM * Math.PI) / 180);
    expect(over.lat).toBeCloseTo(89, 9);
    expect(over.lon).toBeCloseTo(-160, 9);
  });

  test('across the antimeridian stays in range', () => {
    fc.assert(fc.property(lat, lon, bearing, km, (fromLat, fromLon, azimuth, distance) => {
      const to = destination(fromLat, fromLon, azimuth, distance);
      return to.lon >= -180 && to.lon < 180 && Math.abs(to.lat) <= 90;
    }));
  });
});

test('a place comes back from its unit vector', () => {
  fc.assert(
    fc.property(lat, lon, (placeLat, placeLon) => {
      const back = fromUnitVector(unitVector(placeLat, placeLon));
      expect(back.lat).toBeCloseTo(placeLat, 9);
      expect(Math.abs(normaliseLon(back.lon - placeLon))).toBeLessThan(1e-9);
    }),
  );
});
