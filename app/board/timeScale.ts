import { wallOffsetHours } from './wallOffset';

const HOUR_MS = 3_600_000;
export const GRID_HOURS = 6;

/** A span of event time. Milliseconds since 1970. */
export interface TimeSpan {
  fromMs: number;
  toMs: number;
}

export interface GridLine {
  atMs: number;
  /** Midnight in the event's time: the label names the day. */
  midnight: boolean;
}

/** Moments at 00, 06, 12 and 18 hours in the event's own time, inside the span. */
export function sixHourLines({ fromMs, toMs }: TimeSpan, timeZone: string): GridLine[] {
  const lines: GridLine[] = [];
  const localHour = (ms: number): number => ms / HOUR_MS + wallOffsetHours(ms, timeZone);
  // Step by the quarter hour: no zone is finer, and an offset that changes overnight moves the lines with it.
  const step = HOUR_MS / 4;
  for (let at = Math.ceil(fromMs / step) * step; at <= toMs && lines.length < 400; at += step) {
    const hour = localHour(at);
    if (Math.abs(hour / GRID_HOURS - Math.round(hour / GRID_HOURS)) < 1e-9) lines.push({ atMs: at, midnight: Math.abs(hour / 24 - Math.round(hour / 24)) < 1e-9 });
  }
  return lines;
}

/** What the strip shows: from a little before now to the last end of any wind, at least a day and a half, at most seven days. */
export function stripSpan(nowMs: number, ends: readonly (number | null)[], starts: readonly (number | null)[]): TimeSpan {
  const given = (values: readonly (number | null)[]): number[] => values.filter((value): value is number => value !== null);
  const overdue = given(starts).filter((start) => start > nowMs - 4 * HOUR_MS);
  const from = Math.min(nowMs - 1.5 * HOUR_MS, ...overdue.map((start) => start - HOUR_MS / 2));
  const to = Math.max(nowMs + 36 * HOUR_MS, ...given(ends).map((end) => end + 3 * HOUR_MS));
  return { fromMs: from, toMs: Math.min(to, nowMs + 168 * HOUR_MS) };
}

/** Share of the span, 0 at its start and 1 at its end; outside values are not held back. */
export const positionIn = (span: TimeSpan, atMs: number): number => (atMs - span.fromMs) / (span.toMs - span.fromMs);
