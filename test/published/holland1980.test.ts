import { describe, expect, test } from 'vitest';
import { coriolisParameter, hollandB, hollandGradientMs, hollandMaxMs, hollandPressurePa } from '../../lib/wind';

// Holland (1980), An analytic model of the wind and pressure profiles in hurricanes, Mon. Wea. Rev. 108, 1212-1218. Equations
// as quoted in public documents; the values below follow from them by hand.
const storm = { pressureDropPa: 6000, radiusMaxM: 40_000, b: 1.5, coriolis: 0, density: 1.15 };

describe('Holland (1980)', () => {
  test('the maximum is sqrt(B dp / (rho e)) at Rm: 53.7 m/s for B = 1.5, dp = 60 hPa, rho = 1.15', () => {
    expect(hollandMaxMs(storm)).toBeCloseTo(53.66, 2);
    expect(hollandGradientMs(40_000, storm)).toBeCloseTo(hollandMaxMs(storm), 9);
    for (const radius of [30_000, 39_000, 41_000, 60_000]) expect(hollandGradientMs(radius, storm)).toBeLessThan(hollandMaxMs(storm));
  });

  test('wind and pressure are in gradient balance: V^2 / r + |f| V = (dp/dr) / rho', () => {
    const turning = { ...storm, coriolis: coriolisParameter(25) };
    for (const radius of [10_000, 25_000, 40_000, 80_000, 200_000, 400_000]) {
      const slope = (hollandPressurePa(radius + 1, 94_500, turning) - hollandPressurePa(radius - 1, 94_500, turning)) / 2;
      const wind = hollandGradientMs(radius, turning);
      expect(wind ** 2 / radius + turning.coriolis * wind).toBeCloseTo(slope / turning.density, 6);
    }
  });

  test('the pressure is central at the centre, and has risen by 1/e of the drop at Rm', () => {
    expect(hollandPressurePa(0, 94_500, storm)).toBe(94_500);
    expect(hollandPressurePa(40_000, 94_500, storm)).toBeCloseTo(94_500 + 6000 / Math.E, 6);
    expect(hollandPressurePa(1e9, 94_500, storm)).toBeCloseTo(100_500, 0);
  });

  test('B is the one that gives back the maximum, between 1 and 2.5', () => {
    expect(hollandB(hollandMaxMs(storm), 6000)).toBeCloseTo(1.5, 9);
    expect(hollandB(20, 6000)).toBe(1);
    expect(hollandB(100, 6000)).toBe(2.5);
  });

  test('a larger B draws the wind in', () => {
    const share = (b: number): number => hollandGradientMs(120_000, { ...storm, b }) / hollandMaxMs({ ...storm, b });
    expect(share(2.5)).toBeLessThan(share(1.5));
    expect(share(1.5)).toBeLessThan(share(1));
  });

  test('the hemispheres are alike', () => {
    expect(hollandGradientMs(90_000, { ...storm, coriolis: coriolisParameter(-25) })).toBe(hollandGradientMs(90_000, { ...storm, coriolis: coriolisParameter(25) }));
  });

  test('the Coriolis parameter at 45 degrees is 1.031e-4 per second', () => {
    expect(coriolisParameter(45)).toBeCloseTo(1.031e-4, 7);
    expect(coriolisParameter(0)).toBe(0);
  });
});
