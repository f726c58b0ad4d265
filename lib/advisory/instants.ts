/** An instant as the advisory model writes it: ISO 8601, UTC, whole seconds. */
export const isoInstant = (ms: number): string => `${new Date(ms).toISOString().slice(0, 19)}Z`;

const ISO = /^(\d{4})-(\d{2})-(\d{2})[T ](\d{2}):?(\d{2})(?::?(\d{2})(?:\.\d+)?)?\s*(Z|UTC|[+-]\d{2}:?\d{2})?$/i;

/**
 * Reads an ISO 8601 time, with `T` or a space, with or without seconds. The zone must be given: a time
 * without one could be anyone's.
 */
export function parseInstant(text: string): { ok: true; instant: string } | { ok: false; message: string } {
  const parts = ISO.exec(text.trim());
  if (parts === null) return { ok: false, message: `"${shown(text)}" is not a time: write it as 2031-09-19T09:00:00Z` };
  const zone = parts[7];
  if (zone === undefined) return { ok: false, message: `"${shown(text)}" does not say in which zone: add Z if it is UTC` };
  const [year, month, day, hour, minute, second] = parts.slice(1, 7).map((part) => Number(part ?? 0)) as [number, number, number, number, number, number];
  const ms = utcMs(year, month, day, hour, minute, second);
  if (ms === null) return { ok: false, message: `"${shown(text)}" is no day of the calendar or hour of the day` };
  const sign = zone.startsWith('-') ? 1 : -1;
  const shiftMinutes = /^[+-]/.test(zone) ? sign * (Number(zone.slice(1, 3)) * 60 + Number(zone.slice(-2))) : 0;
  return { ok: true, instant: isoInstant(ms + shiftMinutes * 60_000) };
}

/** Milliseconds of a UTC date and time (month from 1); null where the calendar or the clock has none such. */
export function utcMs(year: number, month: number, day: number, hour: number, minute: number, second = 0): number | null {
  if (hour > 23 || minute > 59 || second > 59) return null;
  const ms = Date.UTC(year, month - 1, day, hour, minute, second);
  const date = new Date(ms);
  return date.getUTCFullYear() === year && date.getUTCMonth() === month - 1 && date.getUTCDate() === day ? ms : null;
}

/** A piece of input as an error message quotes it. */
export const shown = (text: string): string => (text.length > 60 ? `${text.slice(0, 57)}...` : text);
