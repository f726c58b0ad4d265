import { describe, expect, test } from 'vitest';
import { checkAdvisory } from '../../../lib/advisory';
import { advisory, codes, point } from '../fixtures';
import type { Advisory } from '../../../lib/advisory';

const previous = advisory({ number: '4', issuedAt: '2031-09-19T03:00:00Z', points: [point({ validAt: '2031-09-19T03:00:00Z', lat: 23.7, lon: -54.6 })] });
const against = (fields: Partial<Advisory>, before: Advisory = previous): string[] => codes(checkAdvisory(advisory(fields), { previous: before }));

describe('the issue time', () => {
  const now = (instant: string): string[] => codes(checkAdvisory(advisory(), { nowMs: Date.parse(instant) }));

  test('in the future of the event’s clock is warned of', () => expect(now('2031-09-19T08:59:00Z')).toEqual(['issued-in-future']));
  test('now or past is not', () => {
    expect(now('2031-09-19T09:00:00Z')).toEqual([]);
    expect(now('2031-09-20T09:00:00Z')).toEqual([]);
  });
  test('without a clock cannot be told', () => expect(codes(checkAdvisory(advisory()))).toEqual([]));
});

describe('the first position', () => {
  const first = (validAt: string): string[] => codes(checkAdvisory(advisory({ points: [point({ validAt }), point({ validAt: '2031-09-19T18:00:00Z', lat: 24.9 })] })));

  test('at issue or a few hours before is usual', () => {
    expect(first('2031-09-19T09:00:00Z')).toEqual([]);
    expect(first('2031-09-19T06:00:00Z')).toEqual([]);
  });
  test('after issue is warned of', () => expect(first('2031-09-19T12:00:00Z')).toEqual(['no-position-at-issue']));
  test('a day before issue is warned of', () => expect(first('2031-09-18T09:00:00Z')).toEqual(['old-position']));
});

test('a next advisory due before this one is warned of', () => {
  expect(codes(checkAdvisory(advisory({ nextDueAt: '2031-09-19T06:00:00Z' })))).toEqual(['next-due-past']);
});

describe('against the advisory before', () => {
  test('a later one of the same storm is as expected', () => expect(against({})).toEqual([]));
  test('an older one is warned of', () => expect(against({ issuedAt: '2031-09-19T02:00:00Z', points: [point({ validAt: '2031-09-19T02:00:00Z' }), point({ validAt: '2031-09-19T12:00:00Z' })] })).toEqual(['older-than-previous']));
  test('another identifier is another storm', () => expect(against({ storm: { id: 'AL102031', name: 'Maro' } })).toEqual(['storm-differs']));
  test('with one identifier, a new name is the same storm now named', () => expect(against({}, { ...previous, storm: { id: 'AL092031', name: 'Nine' } })).toEqual([]));
  test('an identifier in small letters is the same', () => expect(against({ storm: { id: 'al092031', name: 'Maro' } })).toEqual([]));
  test('without an identifier, another name is another storm', () => expect(against({ storm: { name: 'Nilo' } })).toEqual(['storm-differs']));
  test('without an identifier, the same name in capitals is the same storm', () => expect(against({ storm: { name: 'MARO' } })).toEqual([]));
});
