import fc from 'fast-check';
import { describe, expect, test } from 'vitest';
import { bearingDeg, destination, distanceKm, normaliseLon } from '../../lib/geo';
import { centreAt, makeTrack, stormAt } from '../../lib/track';
import { advisoryOf, storms, turned } from './advisories';

const share = fc.double({ min: 0, max: 1, noNaN: true });

describe('position', () => {
  test('is each point at its time', () => {
    fc.assert(
      fc.property(storms, (advisory) => {
        const track = makeTrack(advisory);
        track.knots.forEach(({ leadHours }, i) => {
          const centre = centreAt(track, leadHours)!;
          expect(distanceKm(centre.lat, centre.lon, advisory.points[i].lat, advisory.points[i].lon)).toBeLessThan(1e-6);
        });
      }),
    );
  });

  test('goes from point to point without turning back, and never strays a third of the leg from the great circle', () => {
    fc.assert(
      fc.property(storms, (advisory) => {
        const track = makeTrack(advisory);
        const { points } = advisory;
        for (let i = 0; i + 1 < points.length; i++) {
          const [a, b] = [points[i], points[i + 1]];
          const legKm = distanceKm(a.lat, a.lon, b.lat, b.lon);
          const way = bearingDeg(a.lat, a.lon, b.lat, b.lon);
          let before = -1e-6;
          for (let f = 0; f <= 1; f += 0.1) {
            const centre = centreAt(track, track.leadHours[i] + f * (track.leadHours[i + 1] - track.leadHours[i]))!;
            const km = distanceKm(a.lat, a.lon, centre.lat, centre.lon);
            const off = km === 0 ? 0 : ((bearingDeg(a.lat, a.lon, centre.lat, centre.lon) - way) * Math.PI) / 180;
            // Progress and departure as on a plane: legs are short.
            expect(km * Math.cos(off)).toBeGreaterThan(before - 0.01 * legKm - 1e-6);
            expect(km * Math.cos(off)).toBeLessThan(legKm * 1.01 + 1e-6);
            expect(Math.abs(km * Math.sin(off))).toBeLessThan(legKm / 3 + 1e-6);
            before = km * Math.cos(off);
          }
        }
      }),
    );
  });

  test('does not care where the meridians are', () => {
    fc.assert(
      fc.property(storms, fc.double({ min: -180, max: 180, noNaN: true }), share, (advisory, byDeg, f) => {
        const track = makeTrack(advisory);
        const lead = track.startLeadHours + f * (track.endLeadHours - track.startLeadHours);
        const here = stormAt(track, lead)!;
        const there = stormAt(makeTrack(turned(advisory, byDeg)), lead)!;
        expect(distanceKm(here.lat, normaliseLon(here.lon + byDeg), there.lat, there.lon)).toBeLessThan(1e-6);
        expect(there.motionKt).toBeCloseTo(here.motionKt, 6);
        expect(Math.abs(normaliseLon(there.motionTowardDeg - here.motionTowardDeg)) * Math.min(here.motionKt, 1)).toBeLessThan(1e-4);
      }),
    );
  });

  test('does not care where the pole is: a path bent the same way elsewhere is the same path', () => {
    // Eight legs of 200 km, each turned 10 degrees from the last, started at different places in different directions.
    const bent = (lat: number, lon: number, start: number) => {
      const places = [{ lat, lon }];
      let way = start;
      for (let i = 0; i < 8; i++) {
        const from = places[i];
        const to = destination(from.lat, from.lon, way, 200);
        places.push(to);
        way = bearingDeg(to.lat, to.lon, from.lat, from.lon) + 180 + 10;
      }
      return makeTrack(advisoryOf(places.map((place, i) => ({ ...place, lead: i * 6 }))));
    };
    const tracks = [bent(10, -40, 300), bent(-70, 170, 10), bent(86, 0, 90)];
    for (let lead = 1; lead < 48; lead += 5) {
      const [reference, ...others] = tracks.map((track) => {
        const [start, end, centre] = [centreAt(track, 0)!, centreAt(track, 48)!, centreAt(track, lead)!];
        return [distanceKm(start.lat, start.lon, centre.lat, centre.lon), distanceKm(end.lat, end.lon, centre.lat, centre.lon), stormAt(track, lead)!.motionKt];
      });
      for (const other of others) other.forEach((value, i) => expect(value).toBeCloseTo(reference[i], 5));
    }
  });

  test('follows a circle sampled every six hours to 1 % of a leg', () => {
    const circle = (hours: number) => destination(20, 175, hours * 5, 400);
    const track = makeTrack(advisoryOf([0, 6, 12, 18, 24, 30].map((lead) => ({ lead, ...circle(lead) }))));
    const leg = distanceKm(circle(6).lat, circle(6).lon, circle(12).lat, circle(12).lon);
    for (let lead = 6; lead <= 24; lead += 0.5) {
      const [truth, centre] = [circle(lead), centreAt(track, lead)!];
      expect(distanceKm(truth.lat, truth.lon, centre.lat, centre.lon) / leg).toBeLessThan(0.01);
    }
  });

  test('a storm that stands still stays, and goes on smoothly', () => {
    const track = makeTrack(advisoryOf([{ lead: 0, lat: 20 }, { lead: 12, lat: 21 }, { lead: 24, lat: 21 }, { lead: 36, lat: 22 }]));
    for (let lead = 12; lead <= 24; lead += 3) {
      expect(centreAt(track, lead)!.lat).toBeCloseTo(21, 9);
      expect(stormAt(track, lead)!.motionKt).toBeCloseTo(0, 9);
      // It faces north, where it goes next.
      expect(Math.cos((stormAt(track, lead)!.motionTowardDeg * Math.PI) / 180)).toBeCloseTo(1, 9);
    }
  });

  test('a storm that turns right round stops at the turn', () => {
    const track = makeTrack(advisoryOf([{ lead: 0, lat: 20 }, { lead: 12, lat: 22 }, { lead: 24, lat: 20 }]));
    expect(stormAt(track, 12)!.motionKt).toBeCloseTo(0, 9);
    expect(centreAt(track, 11)!.lat).toBeLessThanOrEqual(22);
    expect(centreAt(track, 13)!.lat).toBeLessThanOrEqual(22);
  });

  test('motion has no jump at a point', () => {
    fc.assert(
      fc.property(storms, (advisory) => {
        const track = makeTrack(advisory);
        for (const lead of [...track.leadHours].slice(1, -1)) {
          const [before, after] = [stormAt(track, lead - 1e-7)!, stormAt(track, lead)!];
          expect(after.motionKt).toBeCloseTo(before.motionKt, 3);
        }
      }),
    );
  });

  test('motion is the way made good over a short while', () => {
    fc.assert(
      fc.property(storms, fc.double({ min: 0.01, max: 0.98, noNaN: true }), (advisory, f) => {
        const track = makeTrack(advisory);
        const lead = track.startLeadHours + f * (track.endLeadHours - track.startLeadHours);
        const storm = stormAt(track, lead)!;
        const [a, b] = [centreAt(track, lead - 1e-3)!, centreAt(track, lead + 1e-3)!];
        expect(distanceKm(a.lat, a.lon, b.lat, b.lon) / 1.852 / 2e-3).toBeCloseTo(storm.motionKt, 1);
      }),
    );
  });
});

describe('outside the track', () => {
  const track = makeTrack(advisoryOf([{ lead: -3 }, { lead: 9, lat: 21 }]));

  test('there is no storm', () => {
    expect(track.startLeadHours).toBe(-3);
    expect(track.endLeadHours).toBe(9);
    expect(stormAt(track, -3.01)).toBeNull();
    expect(stormAt(track, 9.01)).toBeNull();
    expect(stormAt(track, NaN)).toBeNull();
    expect(stormAt(track, -3)).not.toBeNull();
    expect(stormAt(track, 9)).not.toBeNull();
  });

  test('one point is a storm for one moment, at rest', () => {
    const single = makeTrack(advisoryOf([{ lead: 0, maxWindKt: 70, radiiNm: { '34': { ne: 100, se: 80, sw: 60, nw: 80 } } }]));
    const storm = stormAt(single, 0)!;
    expect([storm.lat, storm.motionKt, storm.maxWindKt]).toEqual([expect.closeTo(20, 9), 0, 70]);
    expect(stormAt(single, 1)).toBeNull();
  });
});

test('points out of order are put in order, and two at one time are refused by name', () => {
  const ordered = makeTrack(advisoryOf([{ lead: 12, lat: 22 }, { lead: 0, lat: 20 }, { lead: 6, lat: 21 }]));
  expect([...ordered.leadHours]).toEqual([0, 6, 12]);
  expect(() => makeTrack(advisoryOf([{ lead: 0 }, { lead: 6, lat: 21 }, { lead: 6, lat: 22 }]))).toThrow('2031-09-19T15:00:00Z');
});

test('points at opposite ends of the earth are refused', () => {
  expect(() => makeTrack(advisoryOf([{ lead: 0, lat: 20, lon: 0 }, { lead: 6, lat: -20, lon: -180 }]))).toThrow('opposite ends');
});
