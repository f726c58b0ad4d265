import fc from 'fast-check';
import { describe, expect, test } from 'vitest';
import { kmToNmi, nmiToKm, THRESHOLD_KEYS } from '../../lib/units';
import { chavasKnaffRadiusMaxWindKm, makeTrack, stormAt, willoughbyRadiusMaxWindKm } from '../../lib/track';
import type { StormState } from '../../lib/track';
import { advisoryOf, mirrored, ring, storms } from './advisories';

const nmiAt = (storm: StormState | null, key: '34' | '50' | '64'): number[] => storm!.radiiKm[key]!.map(kmToNmi);

describe('radii', () => {
  test('are the given ones at each point', () => {
    fc.assert(
      fc.property(storms, (advisory) => {
        const track = makeTrack(advisory);
        advisory.points.forEach((point, i) => {
          const storm = stormAt(track, track.leadHours[i])!;
          for (const key of THRESHOLD_KEYS) {
            const given = point.radiiNm?.[key] ?? ring(0);
            [given.ne, given.se, given.sw, given.nw].forEach((nmi, q) => expect(nmiAt(storm, key)[q]).toBeCloseTo(nmi, 6));
            expect(storm.inferred.radii[key]).toBe(false);
          }
        });
      }),
    );
  });

  test('are the given ones where rounding leaves the peak of a quadrant a hair under its threshold (a failure found by seed 535668945)', () => {
    const track = makeTrack(advisoryOf([{ lead: 0, lat: 8, lon: 0, maxWindKt: 25 }, { lead: 6, lat: 8, lon: 0, maxWindKt: 140, radiiNm: { '34': ring(40, 0, 40, 0), '50': ring(12, 0, 19.32640419867838, 0), '64': ring(3.5999999999999996, 0, 7.874999999999999, 0) } }]));
    expect(nmiAt(stormAt(track, 6), '64')[0]).toBeCloseTo(3.6, 6);
  });

  test('lie inside one another at every time', () => {
    fc.assert(
      fc.property(storms, fc.double({ min: 0, max: 1, noNaN: true }), (advisory, f) => {
        const track = makeTrack(advisory);
        const { radiiKm } = stormAt(track, track.startLeadHours + f * (track.endLeadHours - track.startLeadHours))!;
        for (let q = 0; q < 4; q++) {
          expect(radiiKm['64']![q]).toBeLessThanOrEqual(radiiKm['50']![q] + 1e-9);
          expect(radiiKm['50']![q]).toBeLessThanOrEqual(radiiKm['34']![q] + 1e-9);
        }
      }),
    );
  });

  test('change linearly between times where they are given', () => {
    const track = makeTrack(advisoryOf([{ lead: 0, maxWindKt: 60, radiiNm: { '34': ring(100, 80, 60, 40), '50': ring(30) } }, { lead: 12, lat: 21, maxWindKt: 60, radiiNm: { '34': ring(140, 80, 40, 60), '50': ring(20) } }]));
    expect(nmiAt(stormAt(track, 3), '34').map((nmi) => Math.round(nmi * 1e6) / 1e6)).toEqual([110, 80, 55, 45]);
    expect(nmiAt(stormAt(track, 9), '50')[0]).toBeCloseTo(22.5, 9);
  });

  test('a missing ring between two given ones lies on the line', () => {
    const track = makeTrack(
      advisoryOf([{ lead: 0, radiiNm: { '34': ring(100), '50': ring(50) } }, { lead: 12, lat: 21 }, { lead: 36, lat: 22, radiiNm: { '34': ring(160), '50': ring(80) } }]),
    );
    expect(nmiAt(stormAt(track, 12), '34')[0]).toBeCloseTo(120, 9);
    expect(nmiAt(stormAt(track, 12), '50')[0]).toBeCloseTo(60, 9);
    expect(stormAt(track, 12)!.inferred.radii).toEqual({ '34': true, '50': true, '64': false });
  });

  test('end when the wind falls below their threshold, not before and not after', () => {
    const track = makeTrack(advisoryOf([{ lead: 0, maxWindKt: 90, radiiNm: { '34': ring(150), '50': ring(80), '64': ring(40) } }, { lead: 12, lat: 21, maxWindKt: 40, radiiNm: { '34': ring(120) } }]));
    for (let lead = 0; lead <= 12; lead += 0.05) {
      const storm = stormAt(track, lead)!;
      expect(storm.radiiKm['64']!.every((km) => km > 0)).toBe(storm.maxWindKt >= 64);
      expect(storm.radiiKm['50']!.every((km) => km > 0)).toBe(storm.maxWindKt >= 50);
    }
  });

  test('shrink while the storm weakens', () => {
    const track = makeTrack(advisoryOf([{ lead: 0, maxWindKt: 90, radiiNm: { '34': ring(150), '50': ring(80), '64': ring(40) } }, { lead: 12, lat: 21, maxWindKt: 40, radiiNm: { '34': ring(120) } }]));
    let before = Infinity;
    for (let lead = 0; lead <= 12; lead += 0.25) {
      const [nmi] = nmiAt(stormAt(track, lead), '64');
      expect(nmi).toBeLessThanOrEqual(before + 1e-9);
      before = nmi;
    }
  });

  test('a quadrant that is never reached stays unreached', () => {
    const track = makeTrack(
      advisoryOf([{ lead: 0, maxWindKt: 80, radiiNm: { '34': ring(100), '50': ring(60), '64': ring(30, 30, 0, 30) } }, { lead: 12, lat: 21, maxWindKt: 90, radiiNm: { '34': ring(100), '50': ring(60), '64': ring(35, 30, 0, 30) } }]),
    );
    for (let lead = 0; lead <= 12; lead++) expect(stormAt(track, lead)!.radiiKm['64']![2]).toBe(0);
  });

  test('after the last given ones keep the storm\'s size at first and fade into climatology, without a jump', () => {
    const at = (nmi: number) => makeTrack(advisoryOf([{ lead: 0, maxWindKt: 80, radiiNm: { '34': ring(nmi) } }, ...[12, 24, 48, 96, 240, 480].map((lead) => ({ lead, lat: 20 + lead / 100, maxWindKt: 80 }))]));
    const [small, large] = [at(60), at(240)];
    expect(nmiAt(stormAt(large, 12), '34')[0] / 240).toBeGreaterThan(0.85);
    const gap = (lead: number): number => Math.max(...nmiAt(stormAt(large, lead), '34')) - Math.max(...nmiAt(stormAt(small, lead), '34'));
    expect(gap(12)).toBeLessThan(gap(0));
    expect(gap(96)).toBeLessThan(gap(24));
    expect(gap(480)).toBeLessThan(1);
    for (const lead of [12, 24, 48]) expect(Math.abs(nmiAt(stormAt(large, lead + 1e-6), '34')[0] - nmiAt(stormAt(large, lead - 1e-6), '34')[0])).toBeLessThan(0.01);
  });

  test('without any radii in the advisory those of winds it reaches are unknown, the others none', () => {
    const storm = stormAt(makeTrack(advisoryOf([{ lead: 0, maxWindKt: 60 }])), 0)!;
    expect(storm.radiiKm).toEqual({ '34': null, '50': null, '64': [0, 0, 0, 0] });
    expect(storm.inferred.radii).toEqual({ '34': true, '50': true, '64': false });
  });

  test('given rings that contradict: the ring of the stronger wind holds', () => {
    const storm = stormAt(makeTrack(advisoryOf([{ lead: 0, maxWindKt: 90, radiiNm: { '34': ring(100), '50': ring(40), '64': ring(60) } }])), 0);
    expect(nmiAt(storm, '64')[0]).toBeCloseTo(60, 9);
    expect(nmiAt(storm, '50')[0]).toBeGreaterThan(60);
    expect(nmiAt(storm, '50')[0]).toBeLessThan(60.1);
  });

  test('a ring for a wind above the maximum is not believed', () => {
    const storm = stormAt(makeTrack(advisoryOf([{ lead: 0, maxWindKt: 60, radiiNm: { '34': ring(100), '64': ring(30) } }])), 0);
    expect(nmiAt(storm, '64')).toEqual([0, 0, 0, 0]);
  });

  test('are those of the mirror image south of the equator', () => {
    fc.assert(
      fc.property(storms, fc.double({ min: 0, max: 1, noNaN: true }), (advisory, f) => {
        const north = makeTrack(advisory);
        const south = makeTrack(mirrored(advisory));
        const lead = north.startLeadHours + f * (north.endLeadHours - north.startLeadHours);
        const [a, b] = [stormAt(north, lead)!, stormAt(south, lead)!];
        expect(b.radiusMaxWindKm).toBeCloseTo(a.radiusMaxWindKm, 6);
        for (const key of THRESHOLD_KEYS) [1, 0, 3, 2].forEach((q, i) => expect(b.radiiKm[key]![i]).toBeCloseTo(a.radiiKm[key]![q], 6));
      }),
    );
  });
});

describe('radius of maximum wind', () => {
  test('is given where given', () => {
    const storm = stormAt(makeTrack(advisoryOf([{ lead: 0, maxWindKt: 90, radiusMaxWindNm: 22, radiiNm: { '34': ring(120), '64': ring(40) } }])), 0)!;
    expect(storm.radiusMaxWindKm).toBeCloseTo(nmiToKm(22), 9);
    expect(storm.inferred.radiusMaxWind).toBe(false);
  });

  test('comes from the eye where that is given', () => {
    const of = (eyeDiameterNm: number): number => stormAt(makeTrack(advisoryOf([{ lead: 0, maxWindKt: 120, eyeDiameterNm, radiiNm: { '34': ring(150), '64': ring(60) } }])), 0)!.radiusMaxWindKm;
    expect(of(30) - of(10)).toBeCloseTo(nmiToKm(10), 9);
    expect(of(20)).toBeGreaterThan(nmiToKm(10));
  });

  test('comes from the 34 kt radii where there are any, and from strength and latitude where not', () => {
    const withRings = stormAt(makeTrack(advisoryOf([{ lead: 0, maxWindKt: 100, radiiNm: { '34': ring(145) } }])), 0)!;
    expect(withRings.radiusMaxWindKm).toBeCloseTo(chavasKnaffRadiusMaxWindKm(100, 0.85 * nmiToKm(145), 20), 9);
    const without = stormAt(makeTrack(advisoryOf([{ lead: 0, maxWindKt: 100 }])), 0)!;
    expect(without.radiusMaxWindKm).toBeCloseTo(willoughbyRadiusMaxWindKm((100 * 0.514444) / 0.9, 20), 3);
    expect(without.inferred.radiusMaxWind).toBe(true);
  });

  test('lies inside the widest ring of the strongest wind, at every time', () => {
    fc.assert(
      fc.property(storms, fc.double({ min: 0, max: 1, noNaN: true }), (advisory, f) => {
        const track = makeTrack(advisory);
        const storm = stormAt(track, track.startLeadHours + f * (track.endLeadHours - track.startLeadHours))!;
        const strongest = (['64', '50', '34'] as const).map((key) => Math.max(...storm.radiiKm[key]!)).find((km) => km > 0);
        if (strongest !== undefined && storm.maxWindKt > 34) expect(Math.min(...storm.structure!.peakRadiiKm)).toBeLessThanOrEqual(strongest);
        expect(storm.radiusMaxWindKm).toBeGreaterThan(0);
      }),
    );
  });

  test('a ring narrower than it draws that quadrant\'s peak inward', () => {
    const storm = stormAt(makeTrack(advisoryOf([{ lead: 0, maxWindKt: 90, radiusMaxWindNm: 25, radiiNm: { '34': ring(120), '50': ring(60), '64': ring(50, 40, 15, 30) } }])), 0)!;
    expect(storm.structure!.peakRadiiKm[2]).toBeLessThan(nmiToKm(15));
    expect(storm.structure!.peakRadiiKm[0]).toBeCloseTo(nmiToKm(25), 9);
  });
});

test('in 10-minute means the rings belong to the 1-minute winds that go with them', () => {
  const storm = stormAt(makeTrack(advisoryOf([{ lead: 0, maxWindKt: 80, radiiNm: { '34': ring(100), '50': ring(60), '64': ring(30) } }], '10-min')), 0)!;
  expect(storm.structure!.rings.map(({ windKt }) => Math.round(windKt * 10) / 10)).toEqual([69, 53.9, 36.6]);
});
