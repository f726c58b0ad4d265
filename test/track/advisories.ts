import fc from 'fast-check';
import type { Advisory, Point } from '../../lib/advisory';
import { normaliseLon } from '../../lib/geo';

export const ISSUED = '2031-09-19T09:00:00Z';
const HOUR_MS = 3_600_000;

export const atLead = (hours: number): string => `${new Date(Date.parse(ISSUED) + hours * HOUR_MS).toISOString().slice(0, 19)}Z`;

/** An advisory of points given as lead hours and what differs. */
export function advisoryOf(points: (Partial<Omit<Point, 'validAt'>> & { lead: number })[], averaging: Advisory['averaging'] = '1-min'): Advisory {
  return {
    storm: { name: 'Test' },
    number: '1',
    centre: 'Test centre',
    issuedAt: ISSUED,
    averaging,
    points: points.map(({ lead, ...point }) => ({ lat: 20, lon: -58, maxWindKt: 60, ...point, validAt: atLead(lead) })),
  };
}

export const ring = (ne: number, se = ne, sw = ne, nw = ne) => ({ ne, se, sw, nw });

const nmi = (least: number, most: number) => fc.integer({ min: least / 5, max: most / 5 }).map((five) => five * 5);

/** Rings that lie inside one another, each in some quadrants perhaps not reached, as a bulletin would have them. */
const rings = (maxWindKt: number) =>
  fc.tuple(...[0, 1, 2, 3].map(() => fc.record({ gale: nmi(40, 250), storm: fc.double({ min: 0.3, max: 0.8, noNaN: true }), hurricane: fc.double({ min: 0.3, max: 0.8, noNaN: true }), missing: fc.integer({ min: 0, max: 8 }) }))).map((quadrants) => {
    const of = (threshold: 34 | 50 | 64) => {
      const [ne, se, sw, nw] = quadrants.map(({ gale, storm, hurricane, missing }, q) => {
        // One quadrant always holds what the maximum says.
        if (q > 0 && missing < (threshold === 34 ? 1 : threshold === 50 ? 2 : 3)) return 0;
        return threshold === 34 ? gale : threshold === 50 ? gale * storm : gale * storm * hurricane;
      });
      return { ne, se, sw, nw };
    };
    return { ...(maxWindKt >= 34 ? { '34': of(34) } : {}), ...(maxWindKt >= 50 ? { '50': of(50) } : {}), ...(maxWindKt >= 64 ? { '64': of(64) } : {}) };
  });

const stormPoint = fc.integer({ min: 5, max: 33 }).chain((five) =>
  fc.record({
    hours: fc.constantFrom(6, 12, 24),
    north: fc.double({ min: -1.5, max: 3, noNaN: true }),
    east: fc.double({ min: -4, max: 4, noNaN: true }),
    maxWindKt: fc.constant(five * 5),
    radiiNm: rings(five * 5),
  }),
);

/** Storms anywhere from the tropics to the middle latitudes of the northern hemisphere, also across the antimeridian, all radii given. */
export const storms: fc.Arbitrary<Advisory> = fc
  .record({ lat: fc.double({ min: 8, max: 30, noNaN: true }), lon: fc.double({ min: -180, max: 180, noNaN: true }), points: fc.array(stormPoint, { minLength: 2, maxLength: 7 }) })
  .map(({ lat, lon, points }) => {
    let [lead, pointLat, pointLon] = [0, lat, lon];
    return advisoryOf(
      points.map(({ hours, north, east, maxWindKt, radiiNm }, i) => {
        if (i > 0) {
          lead += hours;
          pointLat += north;
          pointLon += east;
        }
        return { lead, lat: pointLat, lon: normaliseLon(pointLon), maxWindKt, radiiNm };
      }),
    );
  });

/** The same storm turned about the pole. */
export const turned = (advisory: Advisory, byDeg: number): Advisory => ({ ...advisory, points: advisory.points.map((point) => ({ ...point, lon: normaliseLon(point.lon + byDeg) })) });

/** The same storm seen in a mirror on the equator: north and south change places, in positions and in radii. */
export const mirrored = (advisory: Advisory): Advisory => ({
  ...advisory,
  points: advisory.points.map((point) => ({
    ...point,
    lat: -point.lat,
    ...(point.radiiNm ? { radiiNm: Object.fromEntries(Object.entries(point.radiiNm).map(([key, { ne, se, sw, nw }]) => [key, { ne: se, se: ne, sw: nw, nw: sw }])) } : {}),
  })),
});
