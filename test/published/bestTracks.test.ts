import { describe, expect, test } from 'vitest';
import { bearingDeg, destination, distanceKm } from '../../lib/geo';
import { kmToNmi, THRESHOLDS_KT } from '../../lib/units';
import { makeTrack, stormAt } from '../../lib/track';
import { profileKt, quadrantProfiles } from '../../lib/wind';
import { advisoryFrom, bestTracks, isTropical, leadOf } from './bestTrackRecords';

// Atlantic best tracks of 2021 and 2022, US National Hurricane Center (public domain): what was analysed afterwards.
const storms = bestTracks();
const mean = (values: number[]): number => values.reduce((sum, value) => sum + value, 0) / values.length;

test('37 storms are read, up to the 140 kt of Ian in 2022', () => {
  expect(storms).toHaveLength(37);
  expect(storms.flat().length).toBeGreaterThan(950);
  expect(Math.max(...storms.flat().map(({ maxWindKt }) => maxWindKt))).toBe(140);
});

describe.each([
  [12, 15, 0.8],
  [24, 39, 0.85],
])('points %d hours apart, as forecasts have them', (spacing, meanErrorKm, shareOfLine) => {
  const step = spacing / 6;
  const smooth: number[] = [];
  const straight: number[] = [];
  const radiiError: number[] = [];
  for (const storm of storms) {
    if (storm.length < 2 * step + 1) continue;
    const track = makeTrack(advisoryFrom(storm.filter((_, i) => i % step === 0)));
    storm.forEach((record, i) => {
      const state = i % step === 0 ? null : stormAt(track, leadOf(record, storm[0]));
      if (!state) return;
      smooth.push(distanceKm(state.lat, state.lon, record.lat, record.lon));
      const [a, b] = [storm[i - (i % step)], storm[i - (i % step) + step]];
      const line = destination(a.lat, a.lon, bearingDeg(a.lat, a.lon, b.lat, b.lon), (distanceKm(a.lat, a.lon, b.lat, b.lon) * (i % step)) / step);
      straight.push(distanceKm(line.lat, line.lon, record.lat, record.lon));
      if (record.radiiNm) state.radiiKm['34']?.forEach((km, q) => radiiError.push(kmToNmi(km) - record.radiiNm![0][q]));
    });
  }

  test(`the storm between them is found to ${meanErrorKm} km in the mean, nearer than on straight legs`, () => {
    expect(mean(smooth)).toBeLessThan(meanErrorKm);
    expect(mean(smooth) / mean(straight)).toBeLessThan(shareOfLine);
  });

  test('34 kt radii between them are found without bias, to 15 nmi', () => {
    expect(Math.abs(mean(radiiError))).toBeLessThan(2);
    expect(mean(radiiError.map(Math.abs))).toBeLessThan(15);
  });
});

describe('radius of maximum wind inferred from strength and radii', () => {
  const errors: { maxWindKt: number; error: number }[] = [];
  let outsideNarrowest = 0;
  let outsideWidest = 0;
  let hurricanes = 0;
  for (const storm of storms) {
    const records = storm.filter(isTropical);
    if (records.length < 2) continue;
    makeTrack(advisoryFrom(records)).knots.forEach((knot, i) => {
      const { maxWindKt, radiusMaxWindNm, radiiNm } = records[i];
      if (radiusMaxWindNm === null || radiiNm === null || maxWindKt < 34) return;
      errors.push({ maxWindKt, error: kmToNmi(knot.radiusMaxWindKm) - radiusMaxWindNm });
      if (maxWindKt < 64 || maxWindKt > 95) return;
      hurricanes++;
      const innermost = [0, 1, 2, 3].map((q) => [2, 1, 0].map((t) => radiiNm[t][q]).find((nmi) => nmi > 0) ?? Infinity);
      if (radiusMaxWindNm > Math.min(...innermost)) outsideNarrowest++;
      if (radiusMaxWindNm > Math.max(...radiiNm[2])) outsideWidest++;
    });
  }

  test('is found to 10 nmi in the mean, to 7 nmi for major hurricanes', () => {
    expect(errors.length).toBeGreaterThan(500);
    expect(mean(errors.map(({ error }) => Math.abs(error)))).toBeLessThan(10);
    expect(mean(errors.filter(({ maxWindKt }) => maxWindKt >= 96).map(({ error }) => Math.abs(error)))).toBeLessThan(7);
  });

  test('lies outside the narrowest radius of many hurricanes, hardly ever outside the widest 64 kt radius', () => {
    expect(outsideNarrowest / hurricanes).toBeGreaterThan(0.3);
    expect(outsideWidest / hurricanes).toBeLessThan(0.02);
  });
});

describe.each([
  ['64 kt radii from those of 34 and 50 kt', ['34', '50'], 2, 9],
  ['64 kt radii from those of 34 kt', ['34'], 2, 10],
  ['50 kt radii from those of 34 kt', ['34'], 1, 13],
] as const)('%s', (_what, thresholds, t, meanErrorNm) => {
  test(`are found to ${meanErrorNm} nmi, with little bias`, () => {
    const errors: number[] = [];
    for (const storm of storms) {
      const records = storm.filter(isTropical);
      if (records.length < 2) continue;
      const track = makeTrack(advisoryFrom(records, thresholds));
      records.forEach(({ maxWindKt, radiiNm }, i) => {
        if (maxWindKt < THRESHOLDS_KT[t] || !radiiNm) return;
        const { radiiKm } = stormAt(track, track.leadHours[i])!;
        radiiKm[t === 2 ? '64' : '50']!.forEach((km, q) => errors.push(kmToNmi(km) - radiiNm[t][q]));
      });
    }
    expect(errors.length).toBeGreaterThan(800);
    expect(mean(errors.map(Math.abs))).toBeLessThan(meanErrorNm);
    expect(Math.abs(mean(errors))).toBeLessThan(4);
  });
});

test('every analysed radius of two seasons is honoured to 0.1 kt', () => {
  let checked = 0;
  for (const storm of storms) {
    if (storm.length < 2) continue;
    const track = makeTrack(advisoryFrom(storm));
    storm.forEach(({ maxWindKt, radiiNm }, i) => {
      const state = stormAt(track, track.leadHours[i])!;
      const profiles = quadrantProfiles(state);
      THRESHOLDS_KT.forEach((kt, t) => {
        if (maxWindKt < kt || !radiiNm) return;
        radiiNm[t].forEach((nmi, q) => {
          if (nmi === 0 || radiiNm.slice(t + 1).some((stronger, k) => maxWindKt >= THRESHOLDS_KT[t + 1 + k] && stronger[q] >= nmi)) return;
          expect(Math.abs(profileKt(profiles, q, nmi * 1.852) - kt)).toBeLessThan(0.1);
          checked++;
        });
      });
    });
  }
  expect(checked).toBeGreaterThan(3000);
});
