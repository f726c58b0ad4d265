import { DateTime } from 'luxon';
import { describe, expect, test } from 'vitest';
import { stripRow } from '../../app/board/stripView';
import { positionIn, sixHourLines, stripSpan } from '../../app/board/timeScale';
import { wallOffsetHours } from '../../app/board/wallOffset';
import { moments, zoneRow } from './sample';

const hour = 3_600_000;

describe('the six-hour grid', () => {
  test.each(['Etc/GMT+4', 'Asia/Kolkata', 'Australia/Adelaide', 'America/New_York'])('stands at 00, 06, 12 and 18 local in %s, as luxon reckons it', (timeZone) => {
    // The night American clocks go back (2031-11-02) is inside.
    const fromMs = Date.parse('2031-11-01T09:20:00Z');
    const lines = sixHourLines({ fromMs, toMs: fromMs + 48 * hour }, timeZone);
    expect(lines.length).toBeGreaterThanOrEqual(8);
    for (const line of lines) {
      const local = DateTime.fromMillis(line.atMs, { zone: timeZone });
      expect(local.hour % 6, local.toISO()!).toBe(0);
      expect(local.minute).toBe(0);
      expect(line.midnight).toBe(local.hour === 0);
    }
  });

  test('a zone is as far from UTC as luxon says, on both sides of a change', () => {
    for (const at of ['2031-07-01T00:00:00Z', '2031-12-01T00:00:00Z'])
      for (const zone of ['America/New_York', 'Asia/Kathmandu', 'Pacific/Chatham'])
        expect(wallOffsetHours(Date.parse(at), zone), `${zone} ${at}`).toBeCloseTo(DateTime.fromISO(at, { zone }).offset / 60, 9);
  });
});

describe('the span', () => {
  test('holds now, at least a day and a half, and the last end of wind', () => {
    const span = stripSpan(0, [60 * hour, null], [null]);
    expect(positionIn(span, 0)).toBeGreaterThan(0);
    expect(span.toMs).toBe(63 * hour);
    expect(stripSpan(0, [], []).toMs).toBe(36 * hour);
  });

  test('reaches back to a deadline that has passed, but not without end', () => {
    expect(stripSpan(0, [], [-3 * hour]).fromMs).toBeLessThan(-3 * hour);
    expect(stripSpan(0, [], [-500 * hour]).fromMs).toBe(-1.5 * hour);
    expect(stripSpan(0, [900 * hour], []).toMs).toBe(168 * hour);
  });
});

describe('a row', () => {
  const arrival = { '34': moments({ track: '2031-09-20T01:00:00Z', early: '2031-09-19T22:00:00Z', median: '2031-09-20T02:00:00Z', late: '2031-09-20T06:00:00Z' }), '50': moments(), '64': moments() };
  const end = { '34': moments({ track: '2031-09-20T12:00:00Z', median: '2031-09-20T13:00:00Z', late: '2031-09-20T18:00:00Z' }), '50': moments(), '64': moments() };

  test('runs from early over median arrival to median end, fading to the late end', () => {
    const [bar] = stripRow(zoneRow({ arrival, end }), 'members').bars;
    expect([bar.earlyMs, bar.startMs, bar.endMs, bar.lateMs].map((at) => new Date(at!).toISOString())).toEqual([
      '2031-09-19T22:00:00.000Z', '2031-09-20T02:00:00.000Z', '2031-09-20T13:00:00.000Z', '2031-09-20T18:00:00.000Z',
    ]);
  });

  test('has no early and late parts on the track alone', () => {
    const [bar] = stripRow(zoneRow({ arrival, end }), 'track').bars;
    expect(bar).toMatchObject({ earlyMs: null, lateMs: null, startMs: Date.parse('2031-09-20T01:00:00Z') });
  });

  test('has no bar for a wind that does not come', () => {
    expect(stripRow(zoneRow({ arrival, end }), 'members').bars.map((bar) => bar.threshold)).toEqual(['34']);
  });
});
