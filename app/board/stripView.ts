import type { Impact, Moments, ZoneRow } from '../../lib/impact';
import { THRESHOLD_KEYS } from '../../lib/units';
import type { ThresholdKey } from '../../lib/units';

/** A wind at a place, as the strip draws it. Milliseconds since 1970. */
export interface StripBar {
  threshold: ThresholdKey;
  /** Pale part: early to middle arrival. Null while only the track is computed. */
  earlyMs: number | null;
  /** Median over members, else on the track. */
  startMs: number;
  /** Null: blows past the end of the forecast. */
  endMs: number | null;
  /** Fading part. */
  lateMs: number | null;
  chance: number | null;
}

export interface StripRow {
  id: string;
  name: string;
  bars: StripBar[];
  startByMs: number | null;
  /** Share of members that bring 34 kt; below a half the bar is drawn hollow. */
  chance34: number | null;
}

const ms = (instant: string | null): number | null => (instant === null ? null : Date.parse(instant));

function bar(threshold: ThresholdKey, arrival: Moments, end: Moments, chance: number | null, stage: Impact['stage']): StripBar | null {
  const startMs = ms(stage === 'members' ? arrival.median : arrival.track);
  if (startMs === null) return null;
  const endMs = ms(stage === 'members' ? end.median : end.track);
  return {
    threshold,
    earlyMs: stage === 'members' ? ms(arrival.early) : null,
    startMs,
    endMs: endMs === null ? null : Math.max(startMs, endMs),
    lateMs: stage === 'members' ? ms(end.late) : null,
    chance,
  };
}

export function stripRow(row: ZoneRow, stage: Impact['stage']): StripRow {
  return {
    id: row.id,
    name: row.name,
    bars: THRESHOLD_KEYS.flatMap((key) => bar(key, row.arrival[key], row.end[key], row.chance[key], stage) ?? []),
    startByMs: ms(row.startBy),
    chance34: row.chance['34'],
  };
}
