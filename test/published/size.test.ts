import { describe, expect, test } from 'vitest';
import { chavasKnaffRadiusMaxWindKm, climatologicalVortex, climatologyRadiiKm, motionAsymmetryKt } from '../../lib/track';
import { inflowAngleDeg, linChavasBackground } from '../../lib/wind';
import { nmiToKm } from '../../lib/units';

describe('Chavas and Knaff (2022), Wea. Forecasting 37, 563-579: radius of maximum wind from the 34 kt radius', () => {
  test('100 kt, 145 nmi (greatest by quadrant, 0.85 of it the mean) at 20 degrees: 38.1 km, the check value the first author publishes with the model', () => {
    expect(chavasKnaffRadiusMaxWindKm(100, 0.85 * nmiToKm(145), 20)).toBeCloseTo(38.1, 1);
  });

  test('grows with the storm\'s size, shrinks with its strength, and not of itself with latitude: what grows there is the storm (its abstract)', () => {
    const of = chavasKnaffRadiusMaxWindKm;
    expect(of(100, 300, 20)).toBeGreaterThan(of(100, 200, 20));
    expect(of(100, 200, 30)).toBeLessThan(of(100, 200, 20));
    expect(of(130, 200, 20)).toBeLessThan(of(100, 200, 20));
  });

  test('is a number at the equator', () => {
    expect(chavasKnaffRadiusMaxWindKm(60, 150, 0)).toBe(chavasKnaffRadiusMaxWindKm(60, 150, 5));
    expect(chavasKnaffRadiusMaxWindKm(60, 150, 0)).toBeGreaterThan(10);
  });
});

describe('Knaff and Zehr (2007), Wea. Forecasting 22, 71-88, eqs. 4-6: the climatological vortex', () => {
  test('Rmax = 66.785 - 0.09102 V + 1.0619 (lat - 25) km, x = 0.1147 + 0.0055 V - 0.001 (lat - 25): coefficients as quoted in public code', () => {
    expect(climatologicalVortex(100, 25).radiusKm).toBeCloseTo(57.683, 3);
    expect(climatologicalVortex(100, 25).exponent).toBeCloseTo(0.6647, 4);
    expect(climatologicalVortex(60, 15).radiusKm).toBeCloseTo(50.7048, 3);
    expect(climatologicalVortex(60, -15)).toEqual(climatologicalVortex(60, 15));
  });

  test('a storm at rest has equal radii, where the vortex holds that wind', () => {
    const { radiusKm, exponent } = climatologicalVortex(100, 25);
    for (const km of climatologyRadiiKm(34, 100, 25, 0, 0)) expect(100 * (radiusKm / km) ** exponent).toBeCloseTo(34, 9);
  });

  test('a moving one is wider on its strong side, and weak sides may not reach a threshold at all', () => {
    const [ne, se, sw, nw] = climatologyRadiiKm(34, 100, 25, 12, 0);
    expect(ne).toBeCloseTo(se, 9);
    expect(sw).toBeCloseTo(nw, 9);
    expect(ne).toBeGreaterThan(nw);
    expect(climatologyRadiiKm(64, 66, 25, 15, 0)[3]).toBe(0);
  });
});

describe('Schwerdt, Ho and Watkins (1979), NOAA TR NWS 23: asymmetry 1.5 T^0.63', () => {
  test.each([
    [5, 4.13],
    [10, 6.4],
    [20, 9.9],
  ])('a storm at %d kt has %d kt more on its strong side', (motionKt, asymmetryKt) => {
    expect(motionAsymmetryKt(motionKt)).toBeCloseTo(asymmetryKt, 1);
  });
});

describe('Lin and Chavas (2012), J. Geophys. Res. 117, D09120 (numbers from memory)', () => {
  test('the surface background wind is 0.55 of the motion, turned 20 degrees cyclonically', () => {
    expect(linChavasBackground(10, 0, 20)).toEqual({ windKt: 5.5, towardDeg: 340 });
    expect(linChavasBackground(10, 0, -20)).toEqual({ windKt: 5.5, towardDeg: 20 });
  });
});

describe('Phadke et al. (2003), Ocean Eng. 30, 553-578, eq. 11: inflow angle', () => {
  test.each([
    [0, 10],
    [20, 15],
    [40, 20],
    [44, 22.5],
    [48, 25],
    [400, 25],
  ])('at %d km around Rmax = 40 km it is %d degrees', (radiusKm, angle) => {
    expect(inflowAngleDeg(radiusKm, 40)).toBeCloseTo(angle, 9);
  });
});
