import { describe, expect, test } from 'vitest';
import { dayTimeNear, issueTime } from '../../../lib/advisory/bulletin/times';
import { isoInstant } from '../../../lib/advisory/instants';

const issued = (text: string): string | null => {
  const time = issueTime(text);
  return time === null ? null : isoInstant(time.ms);
};

describe('the issue time of a header', () => {
  test.each([
    ['1900Z TUE JUN 05 2001', '2001-06-05T19:00:00Z'],
    ['0300 UTC FRI JUL 01 2011', '2011-07-01T03:00:00Z'],
    ['300 UTC FRI JUL 01 2011', '2011-07-01T03:00:00Z'],
    ['1500 GMT SAT SEPTEMBER 05 1992', '1992-09-05T15:00:00Z'],
    ['1500 UTC JUL 01 2011', '2011-07-01T15:00:00Z'],
    ['11 PM AST THU JUN 30 2011', '2011-07-01T03:00:00Z'],
    ['1100 PM AST THU JUN 30 2011', '2011-07-01T03:00:00Z'],
    ['500 AM EDT TUE AUG 03 2004...0900 UTC', '2004-08-03T09:00:00Z'],
    ['12 AM CDT WED JUN 06 2001', '2001-06-06T05:00:00Z'],
    ['12 PM CDT WED JUN 06 2001', '2001-06-06T17:00:00Z'],
    ['5 PM HST FRI DEC 31 1999', '2000-01-01T03:00:00Z'],
    ['1 AM CHST SAT JAN 01 2000', '1999-12-31T15:00:00Z'],
  ])('%s is %s', (text, instant) => {
    expect(issued(text)).toBe(instant);
  });

  test.each(['NWS NATIONAL HURRICANE CENTER MIAMI FL', '2500 UTC FRI JUL 01 2011', '0300 UTC FRI FEB 30 2011', '0300 UTC FRI JUL 01', '5 AM XYZ FRI JUL 01 2011', ''])('"%s" is none', (text) => {
    expect(issued(text)).toBeNull();
  });

  test('a weekday that is not the date’s is told', () => {
    expect(issueTime('0300 UTC MON JUL 01 2011')!.wrongWeekday).toBe('MON');
    expect(issueTime('0300 UTC FRI JUL 01 2011')!.wrongWeekday).toBeNull();
  });

  test('a local weekday is held against the local date', () => {
    expect(issueTime('11 PM AST THU JUN 30 2011')!.wrongWeekday).toBeNull();
  });
});

describe('a day of the month near the issue time', () => {
  const near = (day: number, hhmm: string, from: string): string | null => {
    const ms = dayTimeNear(day, hhmm, Date.parse(from));
    return ms === null ? null : isoInstant(ms);
  };

  test('later in the month', () => expect(near(24, '0600', '2004-08-22T09:00:00Z')).toBe('2004-08-24T06:00:00Z'));
  test('in the next month', () => expect(near(2, '1200', '2017-08-28T15:00:00Z')).toBe('2017-09-02T12:00:00Z'));
  test('in the next year', () => expect(near(3, '1200', '2005-12-30T21:00:00Z')).toBe('2006-01-03T12:00:00Z'));
  test('in the month before, for a position just before issue', () => expect(near(31, '2300', '2005-09-01T00:00:00Z')).toBe('2005-08-31T23:00:00Z'));
  test('in the year before', () => expect(near(31, '2300', '2006-01-01T00:00:00Z')).toBe('2005-12-31T23:00:00Z'));
  test('five days on, over a short February', () => expect(near(4, '0000', '2027-02-27T00:00:00Z')).toBe('2027-03-04T00:00:00Z'));
  test('not where the next such day is a month away', () => expect(near(30, '0600', '2027-02-28T21:00:00Z')).toBeNull());
  test.each([[0, '0600'], [32, '0600'], [5, '2400'], [5, '0660'], [99, '9999']])('day %i at %s is none', (day, hhmm) => expect(near(day, hhmm, '2011-07-01T03:00:00Z')).toBeNull());
});
