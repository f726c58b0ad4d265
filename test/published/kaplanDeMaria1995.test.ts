import { describe, expect, test } from 'vitest';
import { decayedOverLandKt, inlandCorrectionKt, inlandWindKt } from '../../lib/wind';

// Kaplan and DeMaria (1995), A simple empirical model for predicting the decay of tropical cyclone winds after landfall, J. Appl.
// Meteor. 34, 2499-2512: V(t) = Vb + (R V0 - Vb) exp(-a t), R = 0.9, Vb = 26.7 kt, a = 0.095 per hour, constants as quoted in public code.
describe('Kaplan and DeMaria (1995)', () => {
  test.each([
    [0, 90],
    [6, 62.5],
    [12, 46.9],
    [24, 33.2],
  ])('a 100 kt landfall is down to, after %d hours, %d kt', (hours, windKt) => {
    expect(inlandWindKt(100, hours)).toBeCloseTo(windKt, 1);
  });

  test('the wind decays to the background, never below', () => {
    expect(inlandWindKt(100, 1000)).toBeCloseTo(26.7, 9);
    expect(inlandWindKt(25, 10)).toBeCloseTo(22.5, 9);
  });

  test('decay in two stretches is decay in one', () => {
    expect(decayedOverLandKt(decayedOverLandKt(100, 5), 7)).toBeCloseTo(decayedOverLandKt(100, 12), 9);
  });

  test('the correction for distance inland adds wind near the coast and takes some far inland (coefficients from memory)', () => {
    // t (50 - t) (0.0109 ln D - 0.0503) is zero at D = 101 km.
    expect(inlandCorrectionKt(12, 10)).toBeLessThan(0);
    expect(inlandCorrectionKt(12, 101)).toBeCloseTo(0, 0);
    expect(inlandCorrectionKt(12, 400)).toBeGreaterThan(0);
    expect(inlandCorrectionKt(0, 10)).toBeCloseTo(0, 12);
    expect(inlandCorrectionKt(60, 10)).toBeCloseTo(0, 12);
  });
});
