import { describe, expect, test } from 'vitest';
import { isoInstant, parseInstant, shown, utcMs } from '../../lib/advisory/instants';

const parsed = (text: string): string => {
  const read = parseInstant(text);
  return read.ok ? read.instant : read.message;
};

describe('a time in ISO 8601', () => {
  test.each([
    ['2031-09-19T09:00:00Z', '2031-09-19T09:00:00Z'],
    ['2031-09-19T09:00Z', '2031-09-19T09:00:00Z'],
    ['2031-09-19 09:00 UTC', '2031-09-19T09:00:00Z'],
    ['2031-09-19t0900z', '2031-09-19T09:00:00Z'],
    ['2031-09-19T09:00:30.250Z', '2031-09-19T09:00:30Z'],
    ['2031-09-19T09:00:00+02:00', '2031-09-19T07:00:00Z'],
    ['2031-09-19T22:00:00-0330', '2031-09-20T01:30:00Z'],
    [' 2031-12-31T23:30:00-01:00 ', '2032-01-01T00:30:00Z'],
  ])('%s', (text, instant) => expect(parsed(text)).toBe(instant));

  test('without a zone is refused, since it could be anyone’s', () => expect(parsed('2031-09-19T09:00:00')).toContain('does not say in which zone'));
  test.each(['2031-02-29T09:00Z', '2031-13-01T09:00Z', '2031-09-19T24:00Z', '2031-09-19T09:60Z'])('%s is on no calendar or clock', (text) => expect(parsed(text)).toContain('no day of the calendar'));
  test.each(['', 'NaN', '19/09/2031', '19/0900Z', '1915347600'])('"%s" is none', (text) => expect(parsed(text)).toContain('is not a time'));
});

test('an instant is written in whole seconds of UTC', () => expect(isoInstant(Date.UTC(2031, 8, 19, 9) + 999)).toBe('2031-09-19T09:00:00Z'));

test('years before 100 are not moved into the last century', () => expect(utcMs(31, 9, 19, 9, 0)).toBeNull());

test('a long piece of input is quoted short', () => expect(shown('x'.repeat(100))).toHaveLength(60));
