import { describe, expect, test } from 'vitest';
import { formatAge, formatClock, formatDate, formatDayTime, formatHours, formatSpan, formatUtc } from '../../lib/units';

const plain = (text: string): string => text.replaceAll('\u00a0', ' ').replaceAll('\u2212', '-');
/** A Saturday. */
const MOMENT = Date.UTC(2026, 8, 19, 11, 14, 8);

describe('lengths of time', () => {
  test.each([
    [14, '14 h'],
    [4.5, '4.5 h'],
    [0, '0 h'],
    [9.8, '10 h'],
  ])('%d hours to clear a zone is %s', (hours, text) => {
    expect(plain(formatHours(hours))).toBe(text);
  });

  test.each([
    [2.6, '2:36'],
    [-34 / 60, '-0:34'],
    [0, '0:00'],
    [126 + 5 / 60, '126:05'],
    [1 / 60, '0:01'],
    [0.99 / 60, '0:00'],
    [-0.01 / 60, '-0:01'],
  ])('%d hours of slack is %s: never more than there is', (hours, text) => {
    expect(plain(formatSpan(hours))).toBe(text);
  });

  test('every whole minute survives being hours', () => {
    for (let minutes = 0; minutes < 10_000; minutes++) expect(formatSpan(minutes / 60)).toBe(`${Math.floor(minutes / 60)}:${String(minutes % 60).padStart(2, '0')}`);
  });

  test.each([
    [0.001, 'just now'],
    [34 / 60, '34 min'],
    [2 + 14 / 60, '2 h 14 min'],
    [76, '3 d 4 h'],
  ])('%d hours ago is %s', (hours, text) => {
    expect(plain(formatAge(hours))).toBe(text);
  });

  test('unknown is a dash', () => {
    for (const format of [formatHours, formatSpan, formatAge]) expect(format(null)).toBe('\u2013');
  });
});

describe('times', () => {
  test('are the zone\'s own, on a clock of 24 hours', () => {
    expect(formatClock(MOMENT, 'Etc/GMT+4')).toBe('07:14');
    expect(formatClock(MOMENT, 'Etc/GMT+4', true)).toBe('07:14:08');
    expect(formatClock(Date.UTC(2026, 8, 19), 'UTC')).toBe('00:00');
  });

  test('the day turns with the zone', () => {
    expect(formatDayTime(Date.UTC(2026, 8, 20, 1, 40), 'Etc/GMT+4')).toBe('Sat 21:40');
    expect(formatDayTime(Date.UTC(2026, 8, 20, 1, 40), 'UTC')).toBe('Sun 01:40');
    expect(formatDate(MOMENT, 'UTC')).toBe('Sat 19 Sep');
  });

  test('summer time is kept', () => {
    expect(formatClock(Date.UTC(2026, 6, 1, 12), 'America/New_York')).toBe('08:00');
    expect(formatClock(Date.UTC(2026, 11, 1, 12), 'America/New_York')).toBe('07:00');
  });

  test('UTC is written as forecast centres do', () => {
    expect(formatUtc(MOMENT)).toBe('1114 UTC Sat 19 Sep');
  });
});
