import fc from 'fast-check';
import { describe, expect, test } from 'vitest';
import { makeTrack, pressureFromWindHpa, stormAt } from '../../lib/track';
import { advisoryOf, storms } from './advisories';

describe('maximum wind', () => {
  test('is each point\'s at its time and never leaves the span between neighbours', () => {
    fc.assert(
      fc.property(storms, fc.double({ min: 0, max: 1, noNaN: true }), (advisory, f) => {
        const track = makeTrack(advisory);
        track.leadHours.forEach((lead, i) => expect(stormAt(track, lead)!.maxWindKt).toBeCloseTo(advisory.points[i].maxWindKt, 9));
        for (let i = 0; i + 1 < track.knots.length; i++) {
          const [a, b] = [advisory.points[i].maxWindKt, advisory.points[i + 1].maxWindKt];
          const wind = stormAt(track, track.leadHours[i] + f * (track.leadHours[i + 1] - track.leadHours[i]))!.maxWindKt;
          expect(wind).toBeGreaterThanOrEqual(Math.min(a, b) - 1e-9);
          expect(wind).toBeLessThanOrEqual(Math.max(a, b) + 1e-9);
        }
      }),
    );
  });

  test('in 10-minute means becomes 1-minute: 93 kt are 100 kt', () => {
    // WMO/TD-No. 1555, table 1.2: at sea, 10-minute over 1-minute maximum is 0.93.
    const track = makeTrack(advisoryOf([{ lead: 0, maxWindKt: 93 }], '10-min'));
    expect(stormAt(track, 0)!.maxWindKt).toBeCloseTo(100, 0);
  });
});

describe('pressure', () => {
  const track = makeTrack(advisoryOf([{ lead: 0, maxWindKt: 90, minPressureHpa: 955 }, { lead: 12, lat: 21, maxWindKt: 90 }, { lead: 240, lat: 22, maxWindKt: 90 }]));

  test('is given where given', () => {
    expect(stormAt(track, 0)!.minPressureHpa).toBe(955);
    expect(stormAt(track, 0)!.inferred.pressure).toBe(false);
  });

  test('elsewhere keeps its distance from the wind-pressure relation for a while, and says that it is inferred', () => {
    const [soon, late] = [stormAt(track, 12)!, stormAt(track, 240)!];
    expect(soon.inferred.pressure).toBe(true);
    expect(Math.abs(soon.minPressureHpa - 955)).toBeLessThan(3);
    expect(Math.abs(late.minPressureHpa - pressureFromWindHpa(90))).toBeLessThan(0.5);
  });

  test('between a given and an inferred point is inferred', () => {
    expect(stormAt(track, 6)!.inferred.pressure).toBe(true);
  });
});

describe('stage', () => {
  const track = makeTrack(advisoryOf([{ lead: 0, maxWindKt: 30 }, { lead: 12, lat: 21, maxWindKt: 45 }, { lead: 24, lat: 22, maxWindKt: 40, stage: 'post-tropical' }]));

  test('is that of the last point passed, told by the wind where not given', () => {
    expect([0, 11, 12, 23, 24].map((lead) => stormAt(track, lead)!.stage)).toEqual(['depression', 'depression', 'tropical', 'tropical', 'post-tropical']);
  });
});
