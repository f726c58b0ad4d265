import type { Impact, ZoneRow } from '../../lib/impact';
import { urgencyOf } from './urgency';
import type { Urgency } from './urgency';

/** One line of the zone table, ready to write. Instants in ms since 1970. */
export interface ZoneView {
  id: string;
  name: string;
  people: number;
  maxWindKt: number;
  gustKt: number;
  /** Null: members are not computed yet. */
  chance34: number | null;
  chance64: number | null;
  chanceChange34: number | null;
  /** Early arrival of 34 kt over members; on the forecast track until members are computed. */
  arrivesMs: number | null;
  clearanceHours: number | null;
  startByMs: number | null;
  slackHours: number | null;
  urgency: Urgency;
  /** Not reached by 34 kt: on the track while members are computed, else in any member. */
  reached: boolean;
}

const at = (instant: string | null): number | null => (instant === null ? null : Date.parse(instant));

export function zoneView(row: ZoneRow, stage: Impact['stage'], nowMs: number): ZoneView {
  const arrival = row.arrival['34'];
  const startByMs = at(row.startBy);
  const slackHours = startByMs === null ? null : (startByMs - nowMs) / 3_600_000;
  const chance34 = row.chance['34'];
  return {
    id: row.id,
    name: row.name,
    people: row.people,
    maxWindKt: row.maxWindKt,
    gustKt: row.gustKt,
    chance34,
    chance64: row.chance['64'],
    chanceChange34: row.change?.chance['34'] ?? null,
    arrivesMs: at(stage === 'members' ? arrival.early : arrival.track),
    clearanceHours: row.clearanceHours,
    startByMs,
    slackHours,
    urgency: urgencyOf(slackHours),
    reached: stage === 'members' ? (chance34 ?? 0) > 0 : arrival.track !== null,
  };
}

export const ZONE_COLUMNS = ['name', 'people', 'chance34', 'chance64', 'arrivesMs', 'clearanceHours', 'startByMs', 'slackHours'] as const;
export type ZoneColumn = (typeof ZONE_COLUMNS)[number];
export interface ZoneSort {
  column: ZoneColumn;
  descending: boolean;
}

/** Least slack first, then first arrival. */
export const DEFAULT_SORT: ZoneSort = { column: 'slackHours', descending: false };

function compare(a: string | number | null, b: string | number | null): number {
  if (typeof a === 'string' && typeof b === 'string') return a.localeCompare(b, undefined, { numeric: true });
  return Number(a) - Number(b);
}

/** Sorted by one column, unknown values last either way; ties by slack, arrival, then name. */
export function sortZones(zones: readonly ZoneView[], { column, descending }: ZoneSort): ZoneView[] {
  const by = (a: ZoneView, b: ZoneView, key: ZoneColumn, sign: number): number => {
    if (a[key] === null || b[key] === null) return Number(a[key] === null) - Number(b[key] === null);
    return sign * compare(a[key], b[key]);
  };
  return [...zones].sort(
    (a, b) => by(a, b, column, descending ? -1 : 1) || by(a, b, 'slackHours', 1) || by(a, b, 'arrivesMs', 1) || by(a, b, 'chance34', -1) || by(a, b, 'name', 1),
  );
}
