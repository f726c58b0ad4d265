import fc from 'fast-check';
import { describe, expect, test } from 'vitest';
import { kmhToKt, kmToMiles, kmToNmi, ktToKmh, ktToMph, ktToMs, mphToKt, msToKt, nmiToKm } from '../../lib/units';

const value = fc.double({ min: 1e-9, max: 1e5, noNaN: true });

describe('a quantity comes back from every unit', () => {
  test.each([
    ['m/s', ktToMs, msToKt],
    ['mph', ktToMph, mphToKt],
    ['km/h', ktToKmh, kmhToKt],
    ['km', nmiToKm, kmToNmi],
  ])('%s', (_unit, there, back) => {
    fc.assert(fc.property(value, (kt) => Math.abs(back(there(kt)) - kt) <= 1e-12 * kt));
  });

  test('a statute mile is 1.609344 km', () => {
    expect(kmToMiles(1.609344)).toBe(1);
  });
});
