import { describe, expect, test } from 'vitest';
import { distanceKmFrom, distanceValue, formatChance, formatChange, formatCompactCount, formatCount, formatDistance, formatLatLon, formatWind, saffirSimpsonCategory, windValue } from '../../lib/units';

/** Spaces inside a quantity do not break; here they are written plainly. */
const plain = (text: string): string => text.replaceAll('\u00a0', ' ').replaceAll('\u2212', '-');

describe('winds', () => {
  test.each([
    ['kt', '64 kt'],
    ['m/s', '33 m/s'],
    ['km/h', '119 km/h'],
    ['mph', '74 mph'],
  ] as const)('hurricane force in %s is %s', (unit, text) => {
    expect(plain(formatWind(64, unit))).toBe(text);
  });

  test('an unknown wind is a dash, not a zero', () => {
    expect(formatWind(null, 'kt')).toBe('\u2013');
    expect(formatWind(NaN, 'kt')).toBe('\u2013');
    expect(plain(formatWind(0, 'kt'))).toBe('0 kt');
  });

  test('a change too small to see has no sign', () => {
    expect(plain(formatWind(-0.2, 'kt'))).toBe('0 kt');
  });

  test('a value in a unit is not rounded', () => {
    expect(windValue(10, 'km/h')).toBe(18.52);
  });
});

describe('distances', () => {
  test('have one decimal below ten', () => {
    expect(plain(formatDistance(8.44, 'km'))).toBe('8.4 km');
    expect(plain(formatDistance(9.96, 'km'))).toBe('10 km');
    expect(plain(formatDistance(100, 'nmi'))).toBe('54 nmi');
    expect(plain(formatDistance(100, 'mi'))).toBe('62 mi');
  });

  test('come back from the unit they are shown in', () => {
    for (const unit of ['nmi', 'km', 'mi'] as const) expect(distanceKmFrom(distanceValue(123.4, unit), unit)).toBeCloseTo(123.4, 10);
  });
});

describe('counts', () => {
  test.each([
    [1_924_000, '1.92 M'],
    [884_400, '884 k'],
    [38_000, '38 k'],
    [1_000, '1 k'],
    [999, '999'],
    [999_600, '1 M'],
    [0, '0'],
    [-24_000, '-24 k'],
    [3_100_000_000, '3.1 G'],
  ])('%d in a headline is %s', (count, text) => {
    expect(plain(formatCompactCount(count))).toBe(text);
  });

  test('are grouped as the locale does', () => {
    expect(formatCount(122_400)).toBe('122,400');
    expect(formatCount(122_400, 'de')).toBe('122.400');
  });

  test('a change is signed, and none is none', () => {
    expect(plain(formatChange(210_000))).toBe('+210,000');
    expect(plain(formatChange(-24_000))).toBe('-24,000');
    expect(plain(formatChange(0))).toBe('0');
  });
});

describe('chances', () => {
  test('are whole per cents', () => {
    expect(plain(formatChance(0.406))).toBe('41 %');
  });

  test('what may happen is never 0 %, what may fail never 100 %', () => {
    expect(plain(formatChance(0.001))).toBe('<1 %');
    expect(plain(formatChance(0.999))).toBe('>99 %');
    expect(plain(formatChance(0))).toBe('0 %');
    expect(plain(formatChance(1))).toBe('100 %');
  });
});

test('positions carry their hemispheres', () => {
  expect(plain(formatLatLon(-26.44, 178.06))).toBe('26.4 S 178.1 E');
  expect(plain(formatLatLon(26.4, -58.1))).toBe('26.4 N 58.1 W');
});

test('below hurricane force there is no category', () => {
  expect(saffirSimpsonCategory(63)).toBe(0);
});
