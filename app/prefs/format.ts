import {
  formatClock,
  formatDate,
  formatDayTime,
  formatDistance,
  formatWind,
  UNKNOWN,
  windValue,
} from '../../lib/units';
import type { Prefs } from './prefs';

/** Everything a screen writes in the reader's units and the event's time. Instants in ms since 1970 or ISO 8601; null is unknown. */
export interface Formats {
  timeZone: string;
  windUnit: string;
  wind(kt: number | null): string;
  /** The number without its unit, for columns that carry the unit in the head. */
  windNumber(kt: number | null): string;
  distanceNm(nmi: number | null): string;
  clock(at: Instant, seconds?: boolean): string;
  dayTime(at: Instant): string;
  date(at: Instant): string;
  /** `0900 UTC`. */
  utc(at: Instant): string;
}

type Instant = number | string | null;
const ms = (at: Instant): number | null => (typeof at === 'string' ? Date.parse(at) : at);

export function makeFormats(prefs: Prefs, timeZone: string): Formats {
  const clock12 = (at: number | null, seconds: boolean): string =>
    at === null || !Number.isFinite(at)
      ? UNKNOWN
      : new Intl.DateTimeFormat('en-GB', { timeZone, hour: 'numeric', minute: '2-digit', ...(seconds ? { second: '2-digit' } : {}), hour12: true })
          .format(at)
          .replace(/\s?([ap]m)/, '\u00a0$1');
  const clock = (at: Instant, seconds = false): string => (prefs.hours === '12' ? clock12(ms(at), seconds) : formatClock(ms(at), timeZone, seconds));
  return {
    timeZone,
    windUnit: prefs.wind,
    wind: (kt) => formatWind(kt, prefs.wind),
    windNumber: (kt) => (kt === null || !Number.isFinite(kt) ? UNKNOWN : String(Math.round(windValue(kt, prefs.wind)))),
    distanceNm: (nmi) => formatDistance(nmi === null ? null : nmi * 1.852, prefs.distance),
    clock,
    dayTime: (at) => (prefs.hours === '12' && ms(at) !== null ? `${formatDayTime(ms(at), timeZone).slice(0, 3)} ${clock(at)}` : formatDayTime(ms(at), timeZone)),
    date: (at) => formatDate(ms(at), timeZone),
    utc: (at) => (ms(at) === null ? UNKNOWN : `${formatClock(ms(at), 'UTC').replace(':', '')} UTC`),
  };
}
