import fc from 'fast-check';
import { describe, expect, test } from 'vitest';
import { bearingDeg, destination, normaliseLon } from '../../lib/geo';
import { makeTrack, stormAt } from '../../lib/track';
import { inflowAngleDeg, profileKt, quadrantProfiles, windKtAround, windKtAt } from '../../lib/wind';
import { advisoryOf, mirrored, ring, storms, turned } from '../track/advisories';

const share = fc.double({ min: 0, max: 1, noNaN: true });
const azimuth = fc.double({ min: 0, max: 360, noNaN: true });
const km = fc.double({ min: 1, max: 800, noNaN: true });

const stateAt = (advisory: Parameters<typeof makeTrack>[0], f: number) => {
  const track = makeTrack(advisory);
  const state = stormAt(track, track.startLeadHours + f * (track.endLeadHours - track.startLeadHours))!;
  return { state, profiles: quadrantProfiles(state) };
};

describe('around the centre', () => {
  test('each quadrant\'s governing azimuth has that quadrant\'s wind alone', () => {
    fc.assert(
      fc.property(storms, share, km, (advisory, f, radius) => {
        const { profiles } = stateAt(advisory, f);
        for (let q = 0; q < 4; q++) expect(windKtAround(profiles, radius, 45 + 90 * q)).toBeCloseTo(profileKt(profiles, q, radius), 9);
      }),
    );
  });

  test('wind lies between the quadrants beside and has no jump all the way round', () => {
    fc.assert(
      fc.property(storms, share, km, (advisory, f, radius) => {
        const { profiles } = stateAt(advisory, f);
        const quadrants = [0, 1, 2, 3].map((q) => profileKt(profiles, q, radius));
        const [least, most] = [Math.min(...quadrants), Math.max(...quadrants)];
        let before = windKtAround(profiles, radius, -0.5);
        for (let degrees = 0; degrees <= 360; degrees += 0.5) {
          const wind = windKtAround(profiles, radius, degrees);
          expect(wind).toBeGreaterThanOrEqual(least - 1e-9);
          expect(wind).toBeLessThanOrEqual(most + 1e-9);
          expect(Math.abs(wind - before)).toBeLessThanOrEqual(0.01 * (most - least) + 1e-9);
          before = wind;
        }
      }),
      { numRuns: 30 },
    );
  });

  test('due north the north-eastern and north-western quadrants count half each', () => {
    const { profiles } = stateAt(advisoryOf([{ lead: 0, maxWindKt: 80, radiiNm: { '34': ring(120, 100, 60, 80), '50': ring(60, 40, 20, 30) } }]), 0);
    expect(windKtAround(profiles, 100, 0)).toBeCloseTo((profileKt(profiles, 0, 100) + profileKt(profiles, 3, 100)) / 2, 9);
  });
});

describe('wind at a place', () => {
  test('is the same after any turn about the pole, across the antimeridian too', () => {
    fc.assert(
      fc.property(storms, share, azimuth, km, fc.double({ min: -180, max: 180, noNaN: true }), (advisory, f, degrees, radius, byDeg) => {
        const here = stateAt(advisory, f);
        const there = stateAt(turned(advisory, byDeg), f);
        const place = destination(here.state.lat, here.state.lon, degrees, radius);
        const a = windKtAt(here.state, here.profiles, place.lat, place.lon);
        const b = windKtAt(there.state, there.profiles, place.lat, normaliseLon(place.lon + byDeg));
        expect(b.windKt).toBeCloseTo(a.windKt, 5);
        expect(normaliseLon(b.fromDeg - a.fromDeg)).toBeCloseTo(0, 3);
      }),
    );
  });

  test('south of the equator is the mirror image', () => {
    fc.assert(
      fc.property(storms, share, azimuth, km, (advisory, f, degrees, radius) => {
        const north = stateAt(advisory, f);
        const south = stateAt(mirrored(advisory), f);
        const place = destination(north.state.lat, north.state.lon, degrees, radius);
        fc.pre(place.lat > 0);
        const a = windKtAt(north.state, north.profiles, place.lat, place.lon);
        const b = windKtAt(south.state, south.profiles, -place.lat, place.lon);
        expect(b.windKt).toBeCloseTo(a.windKt, 5);
        // A wind from the north-east becomes one from the south-east.
        expect(normaliseLon(b.fromDeg - (180 - a.fromDeg))).toBeCloseTo(0, 3);
      }),
    );
  });

  test('blows counterclockwise and inward in the north', () => {
    const { state, profiles } = stateAt(advisoryOf([{ lead: 0, maxWindKt: 80, radiiNm: { '34': ring(120) } }]), 0);
    const east = destination(state.lat, state.lon, 90, 150);
    // East of the centre it blows from the south, turned 25 degrees toward the centre: from the south-east.
    expect(windKtAt(state, profiles, east.lat, east.lon).fromDeg).toBeCloseTo(bearingDeg(east.lat, east.lon, state.lat, state.lon) - 90 - 25, 6);
    expect(windKtAt(state, profiles, east.lat, east.lon).fromDeg).toBeGreaterThan(135);
    expect(windKtAt(state, profiles, east.lat, east.lon).fromDeg).toBeLessThan(180);
  });

  test('blows clockwise and inward in the south', () => {
    const { state, profiles } = stateAt(advisoryOf([{ lead: 0, lat: -20, maxWindKt: 80, radiiNm: { '34': ring(120) } }]), 0);
    const east = destination(state.lat, state.lon, 90, 150);
    const { fromDeg } = windKtAt(state, profiles, east.lat, east.lon);
    // East of the centre it blows from the north, turned toward the centre: from the north-east.
    expect(fromDeg).toBeGreaterThan(0);
    expect(fromDeg).toBeLessThan(45);
  });

  test('at the centre is calm, and a number', () => {
    const { state, profiles } = stateAt(advisoryOf([{ lead: 0, maxWindKt: 80, radiiNm: { '34': ring(120) } }]), 0);
    const { windKt, fromDeg } = windKtAt(state, profiles, state.lat, state.lon);
    expect(windKt).toBeLessThan(0.1);
    expect(Number.isFinite(fromDeg)).toBe(true);
  });
});

test('the inflow angle is continuous and never above 25 degrees', () => {
  let before = inflowAngleDeg(0, 40);
  for (let radius = 0; radius < 400; radius += 0.1) {
    const angle = inflowAngleDeg(radius, 40);
    expect(Math.abs(angle - before)).toBeLessThan(0.1);
    expect(angle).toBeLessThanOrEqual(25);
    before = angle;
  }
});
