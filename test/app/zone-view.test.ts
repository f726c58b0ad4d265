import { describe, expect, test } from 'vitest';
import { headline } from '../../app/board/headlineView';
import { sortZones, zoneView } from '../../app/board/zoneView';
import { urgencyOf } from '../../app/board/urgency';
import { impact, moments, spread, zoneRow } from './sample';

const nowMs = Date.parse('2031-09-19T11:14:00Z');

describe('slack', () => {
  test('counts down on the event clock, and below zero once the start is overdue', () => {
    const row = zoneRow({ startBy: '2031-09-19T10:40:00Z', slackHours: 5 });
    const view = zoneView(row, 'members', nowMs);
    expect(view.slackHours).toBeCloseTo(-34 / 60, 9);
    expect(view.urgency).toBe('overdue');
  });

  test('is soon while less than the six hours between advisories are left', () => {
    expect(urgencyOf(5.99)).toBe('soon');
    expect(urgencyOf(6)).toBe('plain');
    expect(urgencyOf(0)).toBe('soon');
    expect(urgencyOf(-0.01)).toBe('overdue');
  });

  test('that is not known is never urgent and never zero', () => {
    expect(zoneView(zoneRow(), 'members', nowMs)).toMatchObject({ slackHours: null, urgency: 'plain' });
  });
});

describe('the zone table', () => {
  const zones = [
    zoneView(zoneRow({ id: 'late', name: 'B', startBy: '2031-09-20T10:00:00Z' }), 'members', nowMs),
    zoneView(zoneRow({ id: 'none', name: 'A' }), 'members', nowMs),
    zoneView(zoneRow({ id: 'first', name: 'C', startBy: '2031-09-19T09:00:00Z' }), 'members', nowMs),
  ];

  test('shows the least slack first and what has none last', () => {
    expect(sortZones(zones, { column: 'slackHours', descending: false }).map((zone) => zone.id)).toEqual(['first', 'late', 'none']);
    expect(sortZones(zones, { column: 'slackHours', descending: true }).map((zone) => zone.id)).toEqual(['late', 'first', 'none']);
  });

  test('breaks ties by first arrival', () => {
    const tied = ['2031-09-20T09:00:00Z', '2031-09-20T03:00:00Z'].map((early, i) =>
      zoneView(zoneRow({ id: String(i), startBy: '2031-09-19T12:00:00Z', arrival: { '34': moments({ early }), '50': moments(), '64': moments() } }), 'members', nowMs),
    );
    expect(sortZones(tied, { column: 'slackHours', descending: false }).map((zone) => zone.id)).toEqual(['1', '0']);
  });

  test('a zone reached by no member is not reached, one on the track is, before members are known', () => {
    const chance = { '34': 0, '50': 0, '64': 0 };
    expect(zoneView(zoneRow({ chance }), 'members', nowMs).reached).toBe(false);
    const onTrack = zoneRow({ chance: { '34': null, '50': null, '64': null }, arrival: { '34': moments({ track: '2031-09-20T03:00:00Z' }), '50': moments(), '64': moments() } });
    expect(zoneView(onTrack, 'track', nowMs)).toMatchObject({ reached: true, chance34: null });
  });
});

describe('the headline', () => {
  const counted = { '34': spread(1_900_000, { mean: 1_920_000, p10: 1_610_000, p50: 1_900_000, p90: 2_080_000 }), '50': spread(1), '64': spread(0) };
  const totals = { ...impact(1).totals, peopleAtOrAbove: counted };
  const change = { sinceAdvisoryId: 'a0', sinceNumber: '4', basis: 'members' as const, people: { '34': 210_000, '50': 0, '64': -24_000 }, assets: { '34': 0, '50': 0, '64': 0 } };

  test('gives the mean of the members with their 10 to 90 % range', () => {
    expect(headline(impact(1, { totals, change })).counts[0]).toEqual({ threshold: '34', people: 1_920_000, range: { low: 1_610_000, high: 2_080_000 }, change: 210_000 });
  });

  test('gives the count on the track, without a range, until members are computed', () => {
    const [first] = headline(impact(1, { stage: 'track', totals })).counts;
    expect(first).toMatchObject({ people: 1_900_000, range: null });
  });

  test('shows no change where it was measured on another basis than the count', () => {
    expect(headline(impact(1, { stage: 'track', totals, change })).counts[0].change).toBeNull();
    expect(headline(impact(1, { stage: 'track', totals, change })).since).toBeNull();
  });
});
