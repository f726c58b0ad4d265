import { UNKNOWN } from './format';

const MINUS = '\u2212';
const NARROW_SPACE = '\u00a0';

/** A length of time in whole hours: `14 h`; below ten hours to the half: `4.5 h`. */
export function formatHours(hours: number | null, locale = 'en'): string {
  if (hours === null || !Number.isFinite(hours)) return UNKNOWN;
  const rounded = Math.abs(hours) < 9.75 ? Math.round(hours * 2) / 2 : Math.round(hours);
  return `${rounded.toLocaleString(locale).replace('-', MINUS)}${NARROW_SPACE}h`;
}

/** A length of time to the minute, signed where negative: `2:36`, `−0:34`, `126:05`. Rounded towards less time left. */
export function formatSpan(hours: number | null): string {
  if (hours === null || !Number.isFinite(hours)) return UNKNOWN;
  // A third of a second of slack absorbs what hours as fractions lose.
  const minutes = Math.floor(hours * 60 + 0.005);
  const size = Math.abs(minutes);
  return `${minutes < 0 ? MINUS : ''}${Math.floor(size / 60)}:${String(size % 60).padStart(2, '0')}`;
}

/** How long ago in words: `just now`, `34 min`, `2 h 14 min`, `3 d 4 h`. */
export function formatAge(hours: number | null): string {
  if (hours === null || !Number.isFinite(hours)) return UNKNOWN;
  const minutes = Math.floor(Math.abs(hours) * 60 + 0.005);
  if (minutes < 1) return 'just now';
  const parts: [number, string][] =
    minutes < 60 ? [[minutes, 'min']] : minutes < 48 * 60 ? [[Math.floor(minutes / 60), 'h'], [minutes % 60, 'min']] : [[Math.floor(minutes / 1440), 'd'], [Math.floor((minutes % 1440) / 60), 'h']];
  return parts.map(([value, unit]) => `${value}${NARROW_SPACE}${unit}`).join(' ');
}

const formats = new Map<string, Intl.DateTimeFormat>();

function timeFormat(locale: string, timeZone: string, options: Intl.DateTimeFormatOptions): Intl.DateTimeFormat {
  const key = `${locale} ${timeZone} ${JSON.stringify(options)}`;
  let format = formats.get(key);
  if (!format) formats.set(key, (format = new Intl.DateTimeFormat(locale, { ...options, timeZone, hourCycle: 'h23' })));
  return format;
}

const CLOCK = { hour: '2-digit', minute: '2-digit' } as const;

function pieces(ms: number, timeZone: string, locale: string, options: Intl.DateTimeFormatOptions): Record<string, string> {
  return Object.fromEntries(timeFormat(locale, timeZone, options).formatToParts(ms).map(({ type, value }) => [type, value]));
}

/** Time of day in a zone, 24 hours: `07:14`, or `07:14:08` with seconds. */
export function formatClock(ms: number | null, timeZone: string, seconds = false, locale = 'en'): string {
  if (ms === null || !Number.isFinite(ms)) return UNKNOWN;
  return timeFormat(locale, timeZone, seconds ? { ...CLOCK, second: '2-digit' } : CLOCK).format(ms);
}

/** Weekday and time in a zone: `Sat 21:40`. */
export function formatDayTime(ms: number | null, timeZone: string, locale = 'en'): string {
  if (ms === null || !Number.isFinite(ms)) return UNKNOWN;
  const { weekday, hour, minute } = pieces(ms, timeZone, locale, { weekday: 'short', ...CLOCK });
  return `${weekday} ${hour}:${minute}`;
}

/** Weekday and date in a zone: `Sat 19 Sep`. */
export function formatDate(ms: number | null, timeZone: string, locale = 'en'): string {
  if (ms === null || !Number.isFinite(ms)) return UNKNOWN;
  const { weekday, day, month } = pieces(ms, timeZone, locale, { weekday: 'short', day: 'numeric', month: 'short' });
  return `${weekday} ${day} ${month}`;
}

/** Time and date in UTC as forecast centres write it: `1114 UTC Sat 19 Sep`. */
export function formatUtc(ms: number | null): string {
  if (ms === null || !Number.isFinite(ms)) return UNKNOWN;
  return `${formatClock(ms, 'UTC').replace(':', '')} UTC ${formatDate(ms, 'UTC')}`;
}
