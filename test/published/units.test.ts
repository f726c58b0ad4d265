import { describe, expect, test } from 'vitest';
import { formatDistance, ktToMph, ktToMs, METRES_PER_FOOT, METRES_PER_NMI, MS_PER_KT, MS_PER_MPH, saffirSimpsonCategory, THRESHOLDS_KT } from '../../lib/units';

describe('units are those of NIST Special Publication 811 (2008), appendix B.8, exact', () => {
  test('nautical mile, knot, mile per hour, foot', () => {
    expect(METRES_PER_NMI).toBe(1852);
    expect(MS_PER_KT).toBe(1852 / 3600);
    expect(MS_PER_MPH).toBe(0.44704);
    expect(METRES_PER_FOOT).toBe(0.3048);
  });

  test('appendix B.8 rounds a knot to 0.5144444 m/s', () => {
    expect(ktToMs(1)).toBeCloseTo(0.5144444, 7);
  });
});

describe('the Saffir-Simpson hurricane wind scale (US National Weather Service, 2012), 1-minute winds in kt', () => {
  test.each([
    [0, 34, 63],
    [1, 64, 82],
    [2, 83, 95],
    [3, 96, 112],
    [4, 113, 136],
    [5, 137, 165],
  ])('category %d is %d to %d kt', (category, from, to) => {
    expect(saffirSimpsonCategory(from)).toBe(category);
    expect(saffirSimpsonCategory(to)).toBe(category);
  });

  test('a storm begins at 34 kt, hurricane force at 64 kt: the thresholds in use', () => {
    expect(THRESHOLDS_KT).toEqual([34, 50, 64]);
  });

  // The scale's own mile-an-hour bounds: 74, 96, 111, 130, 157 mph.
  test.each([
    [64, 74],
    [83, 96],
    [96, 111],
    [113, 130],
    [137, 157],
  ])('%d kt is the %d mph of the public scale, rounded as it rounds', (kt, mph) => {
    expect(Math.abs(ktToMph(kt) - mph)).toBeLessThan(1);
  });
});

// Common practice, no source.
describe('rules of thumb', () => {
  test('hurricane force is about 74 mph', () => {
    expect(ktToMph(64)).toBeCloseTo(73.6, 1);
  });

  test('metres a second to miles an hour is a little more than double', () => {
    expect(1 / MS_PER_MPH).toBeGreaterThan(2.2);
    expect(1 / MS_PER_MPH).toBeLessThan(2.3);
  });

  test('3 to 3.5 m are about 10 to 11 ft', () => {
    expect(3 / METRES_PER_FOOT).toBeCloseTo(10, 0);
    expect(Math.floor(3.5 / METRES_PER_FOOT)).toBe(11);
  });

  test('a degree of latitude is 60 nautical miles', () => {
    expect(formatDistance(111.12, 'nmi')).toBe('60\u00a0nmi');
  });
});
