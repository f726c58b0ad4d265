import type { Impact, Moments, Spread, ZoneRow } from '../../lib/impact';
import type { Event, StoredAdvisory } from '../../lib/wire';

/** Small whole values for the tests of the screens. */
export const spread = (track: number, over: Partial<Spread> = {}): Spread => ({ track, mean: null, p10: null, p50: null, p90: null, ...over });
export const moments = (over: Partial<Moments> = {}): Moments => ({ track: null, early: null, median: null, late: null, ...over });

export function zoneRow(over: Partial<ZoneRow> = {}): ZoneRow {
  return {
    id: 'z1',
    name: 'Saltmarsh',
    people: 48_200,
    maxWindKt: 70,
    gustKt: 90,
    rainMm: null,
    chance: { '34': 0.96, '50': 0.7, '64': 0.41 },
    peopleAtOrAbove: { '34': spread(48_200), '50': spread(30_000), '64': spread(9_000) },
    arrival: { '34': moments(), '50': moments(), '64': moments() },
    end: { '34': moments(), '50': moments(), '64': moments() },
    clearanceHours: 14,
    startBy: null,
    slackHours: null,
    change: null,
    ...over,
  };
}

export function impact(revision: number, over: Partial<Impact> = {}): Impact {
  return {
    eventId: 'e1',
    revision,
    advisoryId: 'a1',
    stage: 'members',
    members: 1000,
    seed: 1,
    computedAt: '2031-09-19T09:00:10Z',
    totals: {
      people: 2_400_000,
      peopleInZones: 900_000,
      assets: 55_000,
      peopleAtOrAbove: { '34': spread(1_900_000), '50': spread(880_000), '64': spread(300_000) },
      assetsAtOrAbove: { '34': spread(40_000), '50': spread(20_000), '64': spread(8_000) },
      maxWindKt: 98,
    },
    zones: [],
    classes: [],
    evacuation: { zonesReached: { '34': 0, '50': 0, '64': 0 }, zonesWithoutClearance: 0, nextStartBy: null },
    restoration: null,
    claims: null,
    change: null,
    ...over,
  };
}

export function event(over: Partial<Event> = {}): Event {
  return {
    id: 'e1',
    name: 'Quillon',
    timeZone: 'Etc/GMT+4',
    exercise: true,
    demo: false,
    advisoriesLeft: null,
    revision: 0,
    advisoryId: null,
    now: '2031-09-19T11:00:00Z',
    clock: { startsAt: '2031-09-19T11:00:00Z', anchoredAt: '2026-12-01T09:00:00Z', rate: 1 },
    createdAt: '2026-12-01T09:00:00Z',
    ...over,
  };
}

export function advisory(sequence: number, over: Partial<StoredAdvisory> = {}): StoredAdvisory {
  return {
    id: `a${sequence}`,
    eventId: 'e1',
    sequence,
    format: 'bulletin',
    receivedAt: '2031-09-19T09:00:05Z',
    receivedBy: 'duty',
    supersedes: null,
    warnings: [],
    storm: { name: 'Quillon' },
    number: String(sequence),
    centre: 'Exercise centre',
    issuedAt: '2031-09-19T09:00:00Z',
    averaging: '1-min',
    points: [{ validAt: '2031-09-19T09:00:00Z', lat: 23, lon: -50, maxWindKt: 90 }],
    ...over,
  };
}
