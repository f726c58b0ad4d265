import { describe, expect, test } from 'vitest';
import { compassName, motionBetween } from '../../lib/advisory/motion';
import { point } from './fixtures';

describe('from one point to the next', () => {
  const noon = '2031-09-19T12:00:00Z';
  const six = '2031-09-19T18:00:00Z';

  test('a degree of latitude in six hours is 60 nmi, 10 kt', () => {
    const { distanceNmi, hours, speedKt, bearingDeg } = motionBetween(point({ validAt: noon, lat: 20 }), point({ validAt: six, lat: 21 }));
    // 60 nmi to a degree is common practice; the mean sphere gives 60.04.
    expect(distanceNmi).toBeCloseTo(60.04, 2);
    expect(speedKt).toBeCloseTo(10.007, 2);
    expect([hours, bearingDeg]).toEqual([6, 0]);
  });

  test('across the 180th meridian is a short way', () => {
    const { distanceNmi, bearingDeg } = motionBetween(point({ validAt: noon, lat: 0, lon: 179.5 }), point({ validAt: six, lat: 0, lon: -179.5 }));
    expect(distanceNmi).toBeCloseTo(60.04, 2);
    expect(bearingDeg).toBeCloseTo(90, 9);
  });

  test('a storm that stays where it is has no speed, even in no time', () => {
    expect(motionBetween(point(), point()).speedKt).toBe(0);
  });
});

describe('sixteen compass points', () => {
  test.each([[0, 'NORTH'], [360, 'NORTH'], [11, 'NORTH'], [12, 'NORTH-NORTHEAST'], [45, 'NORTHEAST'], [65, 'EAST-NORTHEAST'], [110, 'EAST-SOUTHEAST'], [250, 'WEST-SOUTHWEST'], [280, 'WEST'], [290, 'WEST-NORTHWEST'], [349, 'NORTH']])('%i degrees is %s', (bearing, name) => expect(compassName(bearing)).toBe(name));
});
