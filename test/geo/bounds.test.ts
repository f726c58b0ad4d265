import fc from 'fast-check';
import { expect, test } from 'vitest';
import { boundsOf, normaliseLon } from '../../lib/geo';

test('a box around places, in whole degrees', () => {
  expect(boundsOf([24.2, 26.7], [-59.9, -57.1], 1)).toEqual({ west: -61, south: 23, east: -56, north: 28 });
});

test('across the antimeridian is narrow', () => {
  expect(boundsOf([-17, -18], [178.5, -178.5], 1)).toEqual({ west: 177, south: -19, east: 183, north: -16 });
});

test('around the whole earth is the whole earth', () => {
  const lon = Array.from({ length: 36 }, (_, i) => -175 + i * 10);
  expect(boundsOf(lon.map(() => 10), lon, 6)).toEqual({ west: -180, south: 4, east: 180, north: 16 });
});

test('stops at the poles', () => {
  expect(boundsOf([89], [0], 5)!.north).toBe(90);
});

test('without places there is none', () => {
  expect(boundsOf([], [], 1)).toBeNull();
});

test('holds every place and its margin, wherever they are', () => {
  fc.assert(
    fc.property(fc.array(fc.tuple(fc.double({ min: -60, max: 60, noNaN: true }), fc.double({ min: -180, max: 180, noNaN: true })), { minLength: 1, maxLength: 8 }), (places) => {
      const box = boundsOf(places.map(([lat]) => lat), places.map(([, lon]) => lon), 2)!;
      expect(box.east - box.west).toBeLessThanOrEqual(360);
      for (const [lat, lon] of places) {
        expect(lat - 2).toBeGreaterThanOrEqual(box.south);
        expect(lat + 2).toBeLessThanOrEqual(box.north);
        if (box.east - box.west === 360) continue;
        const east = normaliseLon(lon - box.west) < 0 ? normaliseLon(lon - box.west) + 360 : normaliseLon(lon - box.west);
        expect(east).toBeGreaterThanOrEqual(2);
        expect(east).toBeLessThanOrEqual(box.east - box.west - 2);
      }
    }),
  );
});
