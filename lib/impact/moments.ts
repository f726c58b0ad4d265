import type { Moments } from './model';

/** Lead hours (hours since issue) as an instant to the minute; NaN or infinite is "never", null. */
export function instantAt(issuedAtMs: number, leadHours: number): string | null {
  if (!Number.isFinite(leadHours)) return null;
  const minute = Math.round((issuedAtMs + leadHours * 3_600_000) / 60_000) * 60_000;
  return new Date(minute).toISOString().replace('.000Z', 'Z');
}

/** The track's moment, with early, median and late taken from `values[offset .. offset + 2]` (lead hours) when there are any. */
export const momentsOf = (issuedAtMs: number, trackLead: number, values: Float32Array | null, offset: number): Moments => ({
  track: instantAt(issuedAtMs, trackLead),
  early: values ? instantAt(issuedAtMs, values[offset]) : null,
  median: values ? instantAt(issuedAtMs, values[offset + 1]) : null,
  late: values ? instantAt(issuedAtMs, values[offset + 2]) : null,
});
