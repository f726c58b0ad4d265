import fc from 'fast-check';
import { describe, expect, test } from 'vitest';
import { nmiToKm, THRESHOLD_KEYS, THRESHOLDS_KT } from '../../lib/units';
import { makeTrack, stormAt } from '../../lib/track';
import type { StormState } from '../../lib/track';
import { profileKt, quadrantProfiles, windKtAround } from '../../lib/wind';
import { advisoryOf, ring, storms } from '../track/advisories';

const share = fc.double({ min: 0, max: 1, noNaN: true });

const at = (advisory: Parameters<typeof makeTrack>[0], f: number): StormState => {
  const track = makeTrack(advisory);
  return stormAt(track, track.startLeadHours + f * (track.endLeadHours - track.startLeadHours))!;
};

describe('through an advisory\'s radii', () => {
  test('each given ring is honoured at its governing azimuth to 0.1 kt', () => {
    fc.assert(
      fc.property(storms, (advisory) => {
        const track = makeTrack(advisory);
        advisory.points.forEach((point, i) => {
          const profiles = quadrantProfiles(stormAt(track, track.leadHours[i])!);
          THRESHOLD_KEYS.forEach((key, t) => {
            const given = point.radiiNm?.[key];
            if (!given) return;
            [given.ne, given.se, given.sw, given.nw].forEach((nmi, q) => {
              if (nmi === 0) return;
              expect(Math.abs(profileKt(profiles, q, nmiToKm(nmi)) - THRESHOLDS_KT[t])).toBeLessThan(0.1);
              expect(Math.abs(windKtAround(profiles, nmiToKm(nmi), 45 + 90 * q) - THRESHOLDS_KT[t])).toBeLessThan(0.1);
            });
          });
        });
      }),
    );
  });

  test('a quadrant that a threshold does not reach stays under it everywhere', () => {
    fc.assert(
      fc.property(storms, (advisory) => {
        const track = makeTrack(advisory);
        advisory.points.forEach((point, i) => {
          const storm = stormAt(track, track.leadHours[i])!;
          const profiles = quadrantProfiles(storm);
          THRESHOLD_KEYS.forEach((key, t) => {
            const given = point.radiiNm?.[key];
            if (!given) return;
            [given.ne, given.se, given.sw, given.nw].forEach((nmi, q) => {
              if (nmi > 0) return;
              for (let km = 1; km < 600; km *= 1.15) expect(profileKt(profiles, q, km)).toBeLessThan(THRESHOLDS_KT[t]);
              expect(profileKt(profiles, q, storm.structure!.peakRadiiKm[q])).toBeLessThan(THRESHOLDS_KT[t]);
            });
          });
        });
      }),
    );
  });

  test('the maximum is attained in one quadrant and exceeded in none', () => {
    fc.assert(
      fc.property(storms, share, (advisory, f) => {
        const storm = at(advisory, f);
        const profiles = quadrantProfiles(storm);
        const peaks = [0, 1, 2, 3].map((q) => profileKt(profiles, q, storm.structure?.peakRadiiKm[q] ?? storm.radiusMaxWindKm));
        expect(Math.max(...peaks)).toBeCloseTo(storm.maxWindKt, 6);
      }),
    );
  });

  test('wind rises to its peak, falls beyond it, is never negative and never NaN', () => {
    fc.assert(
      fc.property(storms, share, (advisory, f) => {
        const storm = at(advisory, f);
        const profiles = quadrantProfiles(storm);
        for (let q = 0; q < 4; q++) {
          const peakKm = storm.structure?.peakRadiiKm[q] ?? storm.radiusMaxWindKm;
          let [before, beforeKm] = [0, 0];
          for (let km = 0.5; km < 3000; km *= 1.07) {
            const wind = profileKt(profiles, q, km);
            expect(wind).toBeGreaterThanOrEqual(0);
            if (km <= peakKm) expect(wind).toBeGreaterThanOrEqual(before);
            else if (beforeKm >= peakKm) expect(wind).toBeLessThanOrEqual(before + 1e-9);
            [before, beforeKm] = [wind, km];
          }
        }
      }),
    );
  });

  test('the field changes without a jump as time passes', () => {
    fc.assert(
      fc.property(storms, (advisory) => {
        const track = makeTrack(advisory);
        const leads = [...track.leadHours].slice(1, -1);
        for (const lead of leads) {
          const [before, after] = [lead - 1e-6, lead + 1e-6].map((moment) => quadrantProfiles(stormAt(track, moment)!));
          for (let q = 0; q < 4; q++) for (let km = 5; km < 500; km *= 1.3) expect(Math.abs(profileKt(after, q, km) - profileKt(before, q, km))).toBeLessThan(0.11);
        }
      }),
    );
  });

  test('the wind dies away outward: ten gale radii out it is under 13 kt', () => {
    const profiles = quadrantProfiles(at(advisoryOf([{ lead: 0, maxWindKt: 90, radiiNm: { '34': ring(120), '50': ring(60), '64': ring(35) } }]), 0));
    expect(profileKt(profiles, 0, nmiToKm(1200))).toBeLessThan(13);
    expect(profileKt(profiles, 0, 1e9)).toBeLessThan(0.1);
  });

  test('the centre is calm', () => {
    const profiles = quadrantProfiles(at(advisoryOf([{ lead: 0, maxWindKt: 90, radiiNm: { '34': ring(120) } }]), 0));
    expect(profileKt(profiles, 0, 0)).toBe(0);
  });

  test('motion asymmetry is not added: a fast storm and a slow one with the same radii have the same wind', () => {
    const moving = (lat: number) => quadrantProfiles(at(advisoryOf([{ lead: 0, maxWindKt: 90, radiiNm: { '34': ring(120), '50': ring(60), '64': ring(35) } }, { lead: 12, lat, maxWindKt: 90, radiiNm: { '34': ring(120), '50': ring(60), '64': ring(35) } }]), 0));
    for (const q of [0, 1, 2, 3]) expect(profileKt(moving(28), q, 50)).toBeCloseTo(profileKt(moving(20.5), q, 50), 9);
  });
});

describe('without radii', () => {
  const storm = (lat: number, toLat: number, toLon = -58): StormState => at(advisoryOf([{ lead: 0, lat, maxWindKt: 100 }, { lead: 12, lat: toLat, lon: toLon, maxWindKt: 100 }]), 0);

  test('the right of the track is the strong side in the north, the left in the south', () => {
    const peak = (state: StormState, q: number): number => profileKt(quadrantProfiles(state), q, state.radiusMaxWindKm);
    const northward = storm(20, 24);
    expect(peak(northward, 0)).toBeCloseTo(100, 6);
    expect(peak(northward, 1)).toBeCloseTo(100, 6);
    expect(peak(northward, 3)).toBeLessThan(95);
    const southward = storm(-20, -24);
    expect(peak(southward, 0)).toBeCloseTo(100, 6);
    expect(peak(southward, 2)).toBeLessThan(95);
  });

  test('a storm at rest is symmetric', () => {
    const still = storm(20, 20);
    const profiles = quadrantProfiles(still);
    for (const q of [0, 1, 2, 3]) expect(profileKt(profiles, q, still.radiusMaxWindKm)).toBeCloseTo(100, 9);
  });

  test('gales reach 60 to 250 nmi around a 100 kt storm', () => {
    // The mean 34 kt radius of Atlantic hurricanes lies near 120 nmi; common knowledge of the field, no source.
    const profiles = quadrantProfiles(storm(20, 20));
    expect(profileKt(profiles, 0, nmiToKm(60))).toBeGreaterThan(34);
    expect(profileKt(profiles, 0, nmiToKm(250))).toBeLessThan(34);
  });
});

test('a storm without wind blows nowhere', () => {
  const profiles = quadrantProfiles(at(advisoryOf([{ lead: 0, maxWindKt: 0 }, { lead: 12, lat: 21, maxWindKt: 60, radiiNm: { '34': ring(100), '50': ring(40) } }]), 0));
  for (const q of [0, 1, 2, 3]) for (const km of [1, 30, 300]) expect(profileKt(profiles, q, km)).toBe(0);
});
