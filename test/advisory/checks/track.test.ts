import { describe, expect, test } from 'vitest';
import { checkAdvisory } from '../../../lib/advisory';
import { advisory, codes, point } from '../fixtures';
import type { Point, Warning } from '../../../lib/advisory';

const checked = (...points: Point[]): Warning[] => checkAdvisory(advisory({ points }));
const at = (hour: number, fields: Partial<Point> = {}): Point => point({ validAt: new Date(Date.UTC(2031, 8, 19, 9 + hour)).toISOString(), ...fields });

test('an advisory with nothing odd about it has no warnings', () => {
  expect(checkAdvisory(advisory())).toEqual([]);
});

describe('a jump faster than storms move', () => {
  test('seven degrees of latitude in six hours is 70 kt', () => {
    expect(checked(at(0, { lat: 20 }), at(6, { lat: 27 }))).toEqual([expect.objectContaining({ code: 'track-jump', path: 'points[1]', message: expect.stringContaining('420 nmi in 6 h is 70 kt') as string })]);
  });

  test('five degrees is not', () => {
    expect(codes(checked(at(0, { lat: 20 }), at(6, { lat: 25 })))).toEqual([]);
  });

  test('crossing the 180th meridian is none', () => {
    const points = [at(0, { lat: 18, lon: 179.5 }), at(6, { lat: 18, lon: -179.5 })];
    expect(codes(checkAdvisory(advisory({ storm: { name: 'Maro' }, points })))).toEqual([]);
  });
});

describe('near the equator', () => {
  test('3.9 degrees is warned of in either hemisphere', () => {
    for (const lat of [3.9, -3.9]) {
      expect(codes(checkAdvisory(advisory({ storm: { name: 'Maro' }, points: [at(0, { lat }), at(6, { lat })] })))).toEqual(['near-equator', 'near-equator']);
    }
  });

  test('4 degrees is not', () => {
    expect(codes(checked(at(0, { lat: 4 }), at(6, { lat: 4.2 })))).toEqual([]);
  });
});

describe('points that are missing', () => {
  test('one point alone', () => expect(codes(checked(at(0)))).toEqual(['single-point']));
  test('48 h with none between', () => expect(checked(at(0), at(48))).toEqual([expect.objectContaining({ code: 'time-gap', path: 'points[1]', message: expect.stringContaining('48 h pass') as string })]));
  test('24 h is usual', () => expect(codes(checked(at(0), at(24)))).toEqual([]));
});

describe('the wrong side of the world', () => {
  const basin = (id: string, lat: number, lon: number): string[] => codes(checkAdvisory(advisory({ storm: { id, name: 'Maro' }, points: [at(0, { lat, lon }), at(6, { lat, lon })] })));

  test('an Atlantic storm east of Greenwich by a lost minus sign', () => expect(basin('AL092031', 24, 55.2)).toEqual(['outside-basin']));
  test('a southern storm north of the equator', () => expect(basin('SH092032', 15, 168)).toEqual(['outside-basin']));
  test('a western Pacific storm in the Atlantic', () => expect(basin('WP092031', 15, -60)).toEqual(['outside-basin']));
  test.each([['AL092031', 30, -70], ['AL092031', 15, -95], ['EP092031', 15, -110], ['CP012031', 20, 179], ['WP092031', 15, 130], ['IO012031', 15, 88], ['SH092032', -15, 168], ['SH092032', -20, -170], ['XX012031', 10, 10]])('%s at %i, %i is at home', (id, lat, lon) => expect(basin(id, lat, lon)).toEqual([]));
});

describe('against the advisory before', () => {
  const previous = advisory({ points: [at(-6, { lat: 23.5, lon: -54 }), at(6)] });

  test('a storm that moved on is the same', () => {
    expect(codes(checkAdvisory(advisory(), { previous }))).toEqual([]);
  });

  test('a storm a thousand miles away six hours later is another', () => {
    const far = advisory({ points: [at(0, { lat: 24, lon: -74 }), at(9, { lat: 24.5, lon: -75 })] });
    expect(checkAdvisory(far, { previous })).toEqual([expect.objectContaining({ code: 'far-from-previous', path: 'points[0]', message: expect.stringContaining('is this the same storm?') as string })]);
  });
});
