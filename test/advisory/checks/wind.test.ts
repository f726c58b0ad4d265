import { describe, expect, test } from 'vitest';
import { checkAdvisory } from '../../../lib/advisory';
import { advisory, codes, point } from '../fixtures';
import type { Point, QuadrantRadii, Warning } from '../../../lib/advisory';

const at = (hour: number, fields: Partial<Point> = {}): Point => point({ validAt: new Date(Date.UTC(2031, 8, 19, 9 + hour)).toISOString(), ...fields });
const checked = (...points: Point[]): Warning[] => checkAdvisory(advisory({ points }));
const steady = (fields: Partial<Point>): Warning[] => checked(at(0, fields), at(6, { ...fields, radiiNm: undefined }));
const ring = (ne: number, se: number, sw: number, nw: number): QuadrantRadii => ({ ne, se, sw, nw });

describe('a wind beyond the record of 185 kt (Patricia, 2015: NHC Tropical Cyclone Report EP202015)', () => {
  test('190 kt is warned of', () => {
    expect(steady({ maxWindKt: 190 })[0]).toMatchObject({ code: 'wind-above-record', path: 'points[0].maxWindKt', message: '190 kt is above the strongest wind on record, 185 kt (Patricia, 2015)' });
  });

  test('185 kt is not', () => expect(codes(steady({ maxWindKt: 185 }))).toEqual([]));
});

describe('a wind of zero', () => {
  test('may mean not known', () => expect(codes(steady({ maxWindKt: 0 }))).toEqual(['wind-zero', 'wind-zero']));
  test('is right once the storm has gone', () => expect(codes(steady({ maxWindKt: 0, stage: 'dissipated' }))).toEqual([]));
});

test('gusts below the sustained wind are warned of', () => {
  expect(steady({ maxWindKt: 70, gustKt: 65 })[0]).toMatchObject({ code: 'gust-below-wind', path: 'points[0].gustKt' });
});

describe('a rise faster than any on record (105 kt in 24 h, Patricia, 2015: same report)', () => {
  test('of 105 kt in 24 h is believed', () => expect(codes(checked(at(0, { maxWindKt: 75 }), at(24, { maxWindKt: 180 })))).toEqual([]));
  test('of 115 kt in 24 h is not', () => expect(codes(checked(at(0, { maxWindKt: 65 }), at(24, { maxWindKt: 180 })))).toEqual(['wind-jump']));
  test('of 50 kt in 6 h is believed', () => expect(codes(checked(at(0, { maxWindKt: 70 }), at(6, { maxWindKt: 120 })))).toEqual([]));
  test('of 70 kt in 6 h is not', () => expect(codes(checked(at(0, { maxWindKt: 70 }), at(6, { maxWindKt: 140 })))).toEqual(['wind-jump']));
});

describe('a fall faster than inland (Kaplan and DeMaria, 1995)', () => {
  test('100 kt to 47 kt in 12 h, as by their formula, is believed', () => expect(codes(checked(at(0, { maxWindKt: 100 }), at(12, { maxWindKt: 47 })))).toEqual([]));
  test('100 kt to 30 kt in 12 h is not', () => expect(codes(checked(at(0, { maxWindKt: 100 }), at(12, { maxWindKt: 30 })))).toEqual(['wind-drop']));
  test('a weak storm may vanish', () => expect(codes(checked(at(0, { maxWindKt: 25 }), at(6, { maxWindKt: 15 })))).toEqual([]));
});

describe('radii', () => {
  test('shrink as the wind rises', () => {
    expect(codes(steady({ maxWindKt: 70, radiiNm: { '34': ring(120, 90, 60, 100), '50': ring(60, 40, 30, 50), '64': ring(30, 20, 10, 25) } }))).toEqual([]);
  });

  test('may be equal', () => {
    expect(codes(steady({ maxWindKt: 70, radiiNm: { '34': ring(60, 40, 30, 50), '50': ring(60, 40, 30, 50) } }))).toEqual([]);
  });

  test('that grow are warned of by quadrant', () => {
    expect(steady({ maxWindKt: 70, radiiNm: { '34': ring(60, 40, 30, 50), '50': ring(70, 40, 35, 50) } })).toEqual([expect.objectContaining({ code: 'radii-grow', path: 'points[0].radiiNm.50', message: expect.stringContaining('50 kt winds reach farther than 34 kt winds to the NE, SW') as string })]);
  });

  test('are held against the next ring given, if one is left out', () => {
    expect(codes(steady({ maxWindKt: 70, radiiNm: { '34': ring(60, 40, 30, 50), '64': ring(70, 40, 30, 50) } }))).toEqual(['radii-grow']);
  });

  test('above the wind itself are warned of', () => {
    expect(steady({ maxWindKt: 45, radiiNm: { '34': ring(60, 40, 30, 50), '50': ring(20, 0, 0, 0) } })).toEqual([expect.objectContaining({ code: 'radii-above-wind', path: 'points[0].radiiNm.50' })]);
  });

  test('of nothing above the wind are no matter', () => {
    expect(codes(steady({ maxWindKt: 45, radiiNm: { '34': ring(60, 40, 30, 50), '50': ring(0, 0, 0, 0) } }))).toEqual([]);
  });
});
