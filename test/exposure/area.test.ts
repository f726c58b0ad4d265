import { booleanPointInPolygon } from '@turf/turf';
import fc from 'fast-check';
import { describe, expect, test } from 'vitest';
import { makeArea } from '../../lib/exposure/area';
import { square } from './readings';
import { place, polygonWithHole } from './shapes';

describe('a place in an area', () => {
  test('is the one that turf finds in it, for areas of any shape with holes', () => {
    let inside = 0;
    fc.assert(
      fc.property(polygonWithHole, fc.array(place, { minLength: 20, maxLength: 20 }), (polygon, places) => {
        const area = makeArea(polygon);
        for (const [lon, lat] of places) {
          const expected = booleanPointInPolygon([lon, lat], polygon);
          if (expected) inside++;
          expect(area.contains(lat, lon)).toBe(expected);
        }
      }),
      { numRuns: 300, seed: 7 },
    );
    expect(inside).toBeGreaterThan(500);
  });

  test('of several parts is in any of them', () => {
    const area = makeArea({ type: 'MultiPolygon', coordinates: [square(-49, 24).coordinates, square(-46, 25).coordinates] });
    expect([area.contains(24.5, -48.5), area.contains(25.5, -45.5), area.contains(24.5, -45.5), area.contains(25.5, -48.5)]).toEqual([true, true, false, false]);
  });

  test('on a border lies in exactly one of the areas that share it', () => {
    const squares = [square(0, 0), square(1, 0), square(0, 1), square(1, 1)].map(makeArea);
    for (const [lat, lon] of [[0.5, 1], [1, 0.5], [1, 1], [1, 1.5], [1.5, 1]]) expect(squares.filter((area) => area.contains(lat, lon))).toHaveLength(1);
  });

  test('on a slanting border too, whichever way round its ends are written', () => {
    const ends = [[0.1, 0.2], [0.9, 1.7]];
    const left = makeArea({ type: 'Polygon', coordinates: [[[-3, 0.2], ends[0], ends[1], [-3, 1.7], [-3, 0.2]]] });
    const right = makeArea({ type: 'Polygon', coordinates: [[[4, 1.7], ends[1], ends[0], [4, 0.2], [4, 1.7]]] });
    for (let i = 1; i < 1000; i++) {
      const f = i / 1000;
      const [lat, lon] = [0.2 + 1.5 * f, 0.1 + 0.8 * f];
      expect([left, right].filter((area) => area.contains(lat, lon))).toHaveLength(1);
    }
  });
});

describe('the chords of an area', () => {
  test('go around its hole', () => {
    const area = makeArea({ type: 'Polygon', coordinates: [...square(0, 0, 4).coordinates, ...square(1, 1, 2).coordinates] });
    expect(area.chordsAt(2)).toEqual([0, 1, 3, 4]);
    expect(area.chordsAt(0.5)).toEqual([0, 4]);
  });
});
