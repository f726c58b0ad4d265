import { booleanClockwise, booleanPointInPolygon } from '@turf/turf';
import type { MultiPolygon, Polygon, Position } from 'geojson';
import fc from 'fast-check';
import { describe, expect, test } from 'vitest';
import { cutAtAntimeridian, destination, quadrantRing } from '../../lib/geo';

const polygon = (...coordinates: Position[][]): Polygon => ({ type: 'Polygon', coordinates });

/** Area on the plane of longitude and latitude, which a vertex more on an edge does not change. */
function squareDegrees(polygons: Position[][][]): number {
  return polygons.flat().reduce((sum, ring) => sum + ring.slice(1).reduce((twice, [lon, lat], i) => twice + (ring[i][0] * lat - lon * ring[i][1]), 0) / 2, 0);
}

function expectValid({ coordinates }: MultiPolygon): void {
  for (const rings of coordinates) {
    rings.forEach((ring, i) => {
      expect(ring.length).toBeGreaterThanOrEqual(4);
      expect(ring[0]).toEqual(ring[ring.length - 1]);
      // RFC 7946, section 3.1.6: exterior rings counterclockwise, interior rings clockwise.
      expect(booleanClockwise(ring)).toBe(i > 0);
      for (const [lon] of ring) expect(Math.abs(lon)).toBeLessThanOrEqual(180);
      for (let k = 1; k < ring.length; k++) expect(Math.abs(ring[k][0] - ring[k - 1][0])).toBeLessThan(180);
    });
  }
}

describe('cut at the antimeridian', () => {
  test('a polygon that does not cross is left as it is', () => {
    const here = polygon([[-60, 20], [-50, 20], [-50, 30], [-60, 20]]);
    expect(cutAtAntimeridian(here).coordinates).toEqual([here.coordinates]);
  });

  test('the example of RFC 7946, section 3.1.9, is cut in two', () => {
    const cut = cutAtAntimeridian(polygon([[170, 40], [190, 40], [190, 50], [170, 50], [170, 40]]));
    expectValid(cut);
    expect(cut.coordinates).toHaveLength(2);
    const corners = cut.coordinates.map(([ring]) => new Set(ring.map(String)));
    expect(corners).toContainEqual(new Set(['180,40', '180,50', '170,50', '170,40']));
    expect(corners).toContainEqual(new Set(['-170,40', '-170,50', '-180,50', '-180,40']));
  });

  test('a ring that jumps from one side to the other is the same ring', () => {
    const jumping = cutAtAntimeridian(polygon([[170, 40], [-170, 40], [-170, 50], [170, 50], [170, 40]]));
    const runningOn = cutAtAntimeridian(polygon([[170, 40], [190, 40], [190, 50], [170, 50], [170, 40]]));
    expect(jumping).toEqual(runningOn);
  });

  test('a comb that crosses many times falls into as many teeth', () => {
    const comb = polygon([[178, 0], [182, 0], [182, 1], [179, 1], [179, 2], [182, 2], [182, 3], [179, 3], [179, 4], [182, 4], [182, 5], [178, 5], [178, 0]]);
    const cut = cutAtAntimeridian(comb);
    expectValid(cut);
    expect(cut.coordinates).toHaveLength(4);
    expect(squareDegrees(cut.coordinates)).toBeCloseTo(squareDegrees([comb.coordinates]), 9);
  });

  test('a hole across the meridian becomes part of both outlines, a hole beside it stays a hole', () => {
    const cut = cutAtAntimeridian(
      polygon(
        [[170, 0], [190, 0], [190, 20], [170, 20], [170, 0]],
        [[178, 8], [178, 12], [182, 12], [182, 8], [178, 8]],
        [[172, 2], [172, 4], [174, 4], [174, 2], [172, 2]],
      ),
    );
    expectValid(cut);
    expect(cut.coordinates.map((rings) => rings.length).sort()).toEqual([1, 2]);
    expect(booleanPointInPolygon([179, 10], cut)).toBe(false);
    expect(booleanPointInPolygon([-179, 10], cut)).toBe(false);
    expect(booleanPointInPolygon([173, 3], cut)).toBe(false);
    expect(booleanPointInPolygon([175, 10], cut)).toBe(true);
  });

  test('wrongly wound rings are put right', () => {
    const cut = cutAtAntimeridian(polygon([[170, 40], [170, 50], [190, 50], [190, 40], [170, 40]]));
    expectValid(cut);
    expect(cut.coordinates).toHaveLength(2);
  });

  test('a vertex on the meridian itself leaves no sliver', () => {
    const cut = cutAtAntimeridian(polygon([[178, 0], [180, 2], [178, 4], [178, 0]]));
    expectValid(cut);
    expect(cut.coordinates).toHaveLength(1);
  });

  test('rings of storms anywhere keep their area and what they hold', () => {
    const radius = fc.double({ min: 20, max: 900, noNaN: true });
    fc.assert(
      fc.property(fc.double({ min: -50, max: 50, noNaN: true }), fc.double({ min: 174, max: 186, noNaN: true }), radius, radius, radius, radius, (lat, lon, ne, se, sw, nw) => {
        const radii = [ne, se, sw, nw] as const;
        const cut = cutAtAntimeridian(polygon(quadrantRing(lat, lon, radii)));
        const elsewhere = polygon(quadrantRing(lat, 10, radii));
        expectValid(cut);
        expect(squareDegrees(cut.coordinates) / squareDegrees([elsewhere.coordinates])).toBeCloseTo(1, 9);
        radii.forEach((km, q) => {
          for (const share of [0.5, 0.98, 1.02]) {
            const place = destination(lat, lon, 45 + 90 * q, km * share);
            expect(booleanPointInPolygon([place.lon, place.lat], cut)).toBe(share < 1);
          }
        });
      }),
      { numRuns: 60 },
    );
  });
});
