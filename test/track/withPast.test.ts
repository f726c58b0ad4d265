import { expect, test } from 'vitest';
import type { Advisory } from '../../lib/advisory';
import { withPast } from '../../lib/track/withPast';

const advisory = (hour: number, number: string, lat: number): Advisory => ({
  storm: { name: 'Quillon' },
  number,
  centre: 'Test centre',
  issuedAt: new Date(Date.UTC(2031, 8, 19, hour)).toISOString(),
  averaging: '1-min',
  points: [0, 12].map((lead) => ({ validAt: new Date(Date.UTC(2031, 8, 19, hour + lead)).toISOString(), lat: lat + lead / 10, lon: -48, maxWindKt: 60 })),
});

test('earlier analysed positions come first, in order of time', () => {
  const points = withPast(advisory(12, '3', 22), [advisory(6, '2', 21), advisory(0, '1', 20)]).points;
  expect(points.map(({ lat }) => lat)).toEqual([20, 21, 22, 23.2]);
});

test('of two analyses of one time the later issue holds', () => {
  const corrected = { ...advisory(0, '1A', 20.4), issuedAt: '2031-09-19T01:00:00.000Z' };
  expect(withPast(advisory(6, '2', 21), [corrected, advisory(0, '1', 20)]).points[0].lat).toBe(20.4);
});

test('a position after this advisory, or long before it, is left out', () => {
  expect(withPast(advisory(12, '3', 22), [advisory(18, '4', 23)]).points).toHaveLength(2);
  expect(withPast(advisory(80, '14', 30), [advisory(0, '1', 20)], 48).points).toHaveLength(2);
});
