import { describe, expect, test } from 'vitest';
import { assetRow, impactSchema, mergeChunks, tabulate } from '../../lib/impact';
import type { MemberSummary } from '../../lib/impact';
import { hazardOf, smallExposure } from './world';

const ISSUED = Date.parse('2031-09-19T09:00:00Z');
const run = { eventId: 'E', advisoryId: 'A', issuedAtMs: ISSUED, nowMs: ISSUED + 2 * 3_600_000, seed: 1, computedAt: '2031-09-19T11:00:00.000Z' };
const exposure = smallExposure();
const hazard = hazardOf(
  [70, 40, 33.9, 51, 64, 20, 55],
  [[20, 22, 24], [21, null, null], [null, null, null], [22, 23, null], [20, 22, 24], [null, null, null], [21, 23, null]],
);

describe('on the forecast track', () => {
  const { impact, assets } = tabulate(run, exposure, hazard, null, null);

  test('people at or above a wind are counted where they live, in zones or not', () => {
    expect(impact.totals.peopleAtOrAbove['34'].track).toBe(307);
    expect(impact.totals.peopleAtOrAbove['50'].track).toBe(107);
    expect(impact.totals.peopleAtOrAbove['64'].track).toBe(100);
  });

  test('no range is given before members are computed', () => {
    expect(impact.totals.peopleAtOrAbove['34']).toEqual({ track: 307, mean: null, p10: null, p50: null, p90: null });
    expect(impact.zones[0].chance).toEqual({ '34': null, '50': null, '64': null });
  });

  test('a zone takes the strongest wind and the first arrival in it', () => {
    expect(impact.zones[0].maxWindKt).toBe(70);
    expect(impact.zones[0].arrival['34'].track).toBe('2031-09-20T05:00:00Z');
    expect(impact.zones[0].end['34'].track).toBe('2031-09-20T11:00:00Z');
  });

  test('start-by is arrival less the hours to clear, and slack counts from the event clock', () => {
    expect(impact.zones[0].startBy).toBe('2031-09-19T19:00:00Z');
    expect(impact.zones[0].slackHours).toBe(8);
  });

  test('a zone that no wind reaches, or that has no clearance hours, has no start-by', () => {
    expect(impact.zones[1]).toMatchObject({ startBy: null, slackHours: null, maxWindKt: 33.9 });
    expect(impact.evacuation).toMatchObject({ zonesWithoutClearance: 1, nextStartBy: { zoneId: 'Z1' }, zonesReached: { '34': 1, '50': 1, '64': 1 } });
  });

  test('a line takes the worst of its places', () => {
    const row = assetRow(assets, 1, { id: 'f1', layer: 'L2', class: 'feeder', name: 'Feeder 1', lon: -48.1, lat: 25.15, people: 40 });
    expect(row.maxWindKt).toBe(55);
    expect(row.arrival['34'].track).toBe('2031-09-20T06:00:00Z');
    expect(row.arrival['64'].track).toBeNull();
  });

  test('classes count their assets at or above each wind', () => {
    expect(impact.classes.map((row) => [row.class, row.count, row.atOrAbove['50'].track, row.atOrAbove['64'].track])).toEqual([['hospital', 1, 1, 1], ['feeder', 1, 1, 0]]);
  });

  test('the impact is what the contract says', () => {
    expect(impactSchema.parse({ ...impact, revision: 1 })).toEqual({ ...impact, revision: 1 });
  });
});

/** Four members: zone 1 is reached at 18, 20, 22 h and never; its people are reached whole each time. */
function fourMembers(): MemberSummary {
  const never = Infinity;
  const zoneArrival = new Float32Array(2 * 3 * 4).fill(never);
  zoneArrival.set([18, 20, 22, never]);
  const zoneEnd = new Float32Array(2 * 3 * 4).fill(-never);
  zoneEnd.set([23, 25, 27, -never]);
  const zoneMilliPeople = new Float64Array(2 * 3 * 4);
  zoneMilliPeople.set([300_000, 300_000, 300_000, 0]);
  const milliPeople = new Float64Array(12);
  milliPeople.set([307_000, 307_000, 300_000, 0]);
  return { ...mergeChunks([], { members: 4, assets: 2, zones: 2, classes: 2 }), zoneArrival, zoneEnd, zoneMilliPeople, milliPeople };
}

describe('over members', () => {
  const { impact } = tabulate(run, exposure, hazard, fourMembers(), null);
  const [zone] = impact.zones;

  test('chance is the share of members that reach the zone', () => {
    expect(zone.chance['34']).toBe(0.75);
    expect(impact.zones[1].chance['34']).toBe(0);
  });

  test('early, median and late rise, over the members that reach it', () => {
    expect(zone.arrival['34']).toMatchObject({ early: '2031-09-20T03:24:00Z', median: '2031-09-20T05:00:00Z', late: '2031-09-20T06:36:00Z' });
  });

  test('start-by follows the early arrival', () => {
    expect(zone.startBy).toBe('2031-09-19T17:24:00Z');
  });

  test('a zone that fewer than one member in ten reaches has times and a chance, but no start-by', () => {
    const members = 20;
    const few = { ...mergeChunks([], { members, assets: 2, zones: 2, classes: 2 }) };
    few.zoneArrival[3 * members] = 18;
    few.zoneEnd[3 * members] = 22;
    const withClearance = { ...exposure, zones: exposure.zones.map((entry) => ({ ...entry, clearanceHours: 10 })) };
    const row = tabulate(run, withClearance, hazard, few, null).impact.zones[1];
    expect(row).toMatchObject({ startBy: null, slackHours: null });
    expect(row.chance['34']).toBe(0.05);
    expect(row.arrival['34'].early).not.toBeNull();
  });

  test('the mean of the total is the mean over members, its percentiles are those of joint totals', () => {
    expect(impact.totals.peopleAtOrAbove['34'].mean).toBe(Math.round((307 + 307 + 300) / 4));
    expect(impact.totals.peopleAtOrAbove['34'].p50).toBe(304);
  });
});

describe('change', () => {
  const before = tabulate(run, exposure, hazard, null, null).impact;
  const later = hazardOf([30, 40, 60, 51, 64, 20, 55], [[null, null, null], [25, null, null], [22, 24, null], [22, 23, null], [20, 22, 24], [null, null, null], [21, 23, null]]);
  const { impact } = tabulate({ ...run, advisoryId: 'B' }, exposure, later, null, { impact: before, number: '4' });

  test('says since which advisory and on what', () => {
    expect(impact.change).toMatchObject({ sinceAdvisoryId: 'A', sinceNumber: '4', basis: 'track' });
  });

  test('counts people in less people out', () => {
    expect(impact.change!.people['34']).toBe(Math.round(200 + 50.5 + 7) - 307);
    expect(impact.zones[0].change!.people['34']).toBe(-100);
  });

  test('an arrival that moved later is positive hours, one that came or went has none', () => {
    expect(impact.zones[0].change!.arrivalHours['34']).toBe(5);
    expect(impact.zones[0].change!.arrivalHours['64']).toBeNull();
    expect(impact.zones[1].change!.arrivalHours['34']).toBeNull();
  });
});
