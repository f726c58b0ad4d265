import { expect, test } from 'vitest';
import { decayExponent } from '../../lib/track';
import { modifiedRankine } from '../../lib/wind';

// Hughes (1952), On the low-level wind structure of tropical storms, J. Meteor. 9, 422-428: outside the core V r^x is constant, x
// about 0.4 to 0.6 (from memory).
test('with an exponent of one half, four times as far out there is half the wind', () => {
  expect(modifiedRankine(160, 100, 40, 0.5)).toBeCloseTo(50, 12);
});

test('inside it turns as a solid does, where not told otherwise', () => {
  expect(modifiedRankine(10, 100, 40, 0.5)).toBeCloseTo(25, 12);
  expect(modifiedRankine(40, 100, 40, 0.5)).toBe(100);
});

test('the exponent of two winds at two radii gives both back', () => {
  const x = decayExponent(40, 100, 200, 34);
  expect(modifiedRankine(200, 100, 40, x)).toBeCloseTo(34, 12);
  expect(decayExponent(40, 34, 200, 34)).toBe(0);
});
