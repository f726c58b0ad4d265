import { describe, expect, test } from 'vitest';
import { willoughbyRadiusMaxWindKm } from '../../lib/track';
import { willoughbyShape, willoughbyShareOfMax } from '../../lib/wind';

// Willoughby, Darling and Rahn (2006), Parametric representation of the primary hurricane vortex, part II, Mon. Wea. Rev. 134,
// 1102-1120. Coefficients of eqs. 7a and 10a-c as quoted in public documentation; values by hand for 50 m/s at 25 degrees.
describe('Willoughby, Darling and Rahn (2006)', () => {
  const shape = willoughbyShape(50, 25);

  test('X1 = 317.1 - 2.026 V + 1.915 lat (10a): 263.7 km', () => expect(shape.x1Km).toBeCloseTo(263.675, 3));

  test('n = 0.4067 + 0.0144 V - 0.0038 lat (10b): 1.0317', () => expect(shape.n).toBeCloseTo(1.0317, 4));

  test('A = 0.0696 + 0.0049 V - 0.0064 lat (10c): 0.1546, and never negative', () => {
    expect(shape.a).toBeCloseTo(0.1546, 4);
    expect(willoughbyShape(15, 40).a).toBe(0);
  });

  test('X2 is 25 km', () => expect(shape.x2Km).toBe(25));

  test('Rmax = 46.4 exp(-0.0155 V + 0.0169 lat) (7a): 32.6 km', () => {
    expect(willoughbyRadiusMaxWindKm(50, 25)).toBeCloseTo(32.62, 2);
    expect(willoughbyRadiusMaxWindKm(50, -25)).toBe(willoughbyRadiusMaxWindKm(50, 25));
  });

  test('inside the maximum the wind is V (r / Rmax)^n, outside two exponentials', () => {
    expect(willoughbyShareOfMax(16.31, 32.62, shape)).toBeCloseTo(0.5 ** 1.0317, 4);
    expect(willoughbyShareOfMax(132.62, 32.62, shape)).toBeCloseTo(0.8454 * Math.exp(-100 / 263.675) + 0.1546 * Math.exp(-4), 4);
    expect(willoughbyShareOfMax(32.62, 32.62, shape)).toBeCloseTo(1, 12);
  });
});
