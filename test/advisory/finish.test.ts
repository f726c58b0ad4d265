import { describe, expect, test } from 'vitest';
import { finish, pathText } from '../../lib/advisory/finish';
import { advisory, bulletin, errorsOf, point, read } from './fixtures';
import type { Draft } from '../../lib/advisory/draft';

/** A draft whose point 1 stands on line 20 and its wind on line 21. */
const draft = (given: unknown): Draft => ({
  advisory: given,
  placeOf: (path) => (path === 'points.1.maxWindKt' ? { line: 21, column: 4 } : path.startsWith('points.1') ? { line: 20 } : {}),
  warnings: [{ code: 'column-unknown', message: 'from the reader' }],
});

const second = point({ validAt: '2031-09-19T18:00:00Z', lat: 24.9 });

describe('what every form goes through', () => {
  test('what the model allows comes out, with the reader’s warnings before the checks’', () => {
    const reading = finish('csv', draft(advisory({ points: [point(), point({ ...second, maxWindKt: 200 })] })));
    expect(reading).toMatchObject({ ok: true, format: 'csv' });
    expect(reading.ok && reading.warnings.map(({ code }) => code)).toEqual(['column-unknown', 'wind-above-record', 'wind-jump']);
  });

  test('a check’s warning gets the place of what it is about', () => {
    const reading = finish('csv', draft(advisory({ points: [point(), point({ ...second, maxWindKt: 200 })] })));
    expect(reading.ok && reading.warnings[1]).toMatchObject({ path: 'points[1].maxWindKt', line: 21, column: 4 });
  });

  test('an error gets the place of what it is about', () => {
    expect(finish('csv', draft(advisory({ points: [point(), point({ ...second, maxWindKt: -5 })] })))).toEqual({ ok: false, format: 'csv', errors: [{ path: 'points[1].maxWindKt', line: 21, column: 4, message: 'wind cannot be negative; found -5' }] });
  });

  test('NaN and Infinity are no numbers', () => {
    for (const lat of [Number.NaN, Number.POSITIVE_INFINITY]) {
      expect(finish('csv', draft(advisory({ points: [point(), point({ ...second, lat })] })))).toMatchObject({ ok: false, errors: [{ path: 'points[1].lat', line: 20 }] });
    }
  });

  test('order of time is an error in every form', () => {
    expect(finish('csv', draft(advisory({ points: [second, point()] })))).toMatchObject({ ok: false, errors: [{ path: 'points[1].validAt', line: 20, message: expect.stringContaining('earlier than 2031-09-19T18:00:00Z of points[0]') as string }] });
  });

  test('what is no advisory at all', () => {
    expect(finish('json', draft(null))).toMatchObject({ ok: false, errors: [{ message: 'expected object; found null' }] });
  });
});

describe('an advisory is held against what is known besides', () => {
  test('the event’s clock', () => {
    expect(read(bulletin(), { nowMs: Date.parse('2031-09-19T08:00:00Z') }).warnings).toEqual([expect.objectContaining({ code: 'issued-in-future', path: 'issuedAt', line: 3, column: 1 })]);
  });

  test('the advisory before', () => {
    const previous = advisory({ storm: { id: 'AL102031', name: 'Nilo' } });
    expect(read(bulletin(), { previous }).warnings).toEqual([expect.objectContaining({ code: 'storm-differs', path: 'storm.id', line: 1 })]);
  });

  test('neither stops it', () => {
    expect(read(bulletin(), { nowMs: 0, previous: advisory({ issuedAt: '2040-01-01T00:00:00Z' }) }).warnings.map(({ code }) => code)).toEqual(['issued-in-future', 'older-than-previous']);
  });
});

test('a path is written as a programmer would', () => {
  expect(pathText(['points', 3, 'radiiNm', '34', 'ne'])).toBe('points[3].radiiNm.34.ne');
  expect(pathText([])).toBe('');
});

test('a long value is quoted short', () => {
  const text = JSON.stringify(advisory({ averaging: 'x'.repeat(1000) as '1-min' }));
  expect(errorsOf(text)[0]!.message.length).toBeLessThan(120);
});
