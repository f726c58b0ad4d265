import { utcMs } from '../instants';

export const MONTHS = ['JAN', 'FEB', 'MAR', 'APR', 'MAY', 'JUN', 'JUL', 'AUG', 'SEP', 'OCT', 'NOV', 'DEC'] as const;
export const WEEKDAYS = ['SUN', 'MON', 'TUE', 'WED', 'THU', 'FRI', 'SAT'] as const;

/** Hours to add to a local time to reach UTC, for the zones the issuing offices write. */
const HOURS_TO_UTC: Record<string, number> = { AST: 4, ADT: 3, EST: 5, EDT: 4, CST: 6, CDT: 5, MST: 7, MDT: 6, PST: 8, PDT: 7, HST: 10, SST: 11, CHST: -10, CVT: 1 };

const MONTH_DAY_YEAR = `(?:(SUN|MON|TUE|WED|THU|FRI|SAT)[A-Z]*\\s+)?(${MONTHS.join('|')})[A-Z]*\\s+(\\d{1,2}),?\\s+(\\d{4})`;
const UTC_HEADER = new RegExp(`^(\\d{3,4})\\s*(?:Z|UTC|GMT)\\s+${MONTH_DAY_YEAR}`, 'i');
const LOCAL_HEADER = new RegExp(`^(\\d{1,2}?)(\\d{2})?\\s*(AM|PM)\\s+([A-Z]{3,4})\\s+${MONTH_DAY_YEAR}`, 'i');

/** Longer than any forecast reaches, shorter than half of any two months. */
const HALF_MONTH_MS = 16 * 24 * 3_600_000;

export interface IssueTime {
  ms: number;
  /** The weekday written, where it is not the date's. */
  wrongWeekday: string | null;
}

/** The issue time on a header line, `0300 UTC FRI JUL 01 2011` or `11 PM AST THU JUN 30 2011`; null if the line is none. */
export function issueTime(text: string): IssueTime | null {
  const utc = UTC_HEADER.exec(text);
  if (utc !== null) {
    const clock = utc[1]!.padStart(4, '0');
    return dated(Number(clock.slice(0, 2)), Number(clock.slice(2)), 0, utc.slice(2));
  }
  const local = LOCAL_HEADER.exec(text);
  const offset = local === null ? undefined : HOURS_TO_UTC[local[4]!.toUpperCase()];
  if (local === null || offset === undefined) return null;
  const hour = (Number(local[1]) % 12) + (local[3]!.toUpperCase() === 'PM' ? 12 : 0);
  return dated(hour, Number(local[2] ?? 0), offset, local.slice(5));
}

function dated(hour: number, minute: number, hoursToUtc: number, [weekday, month, day, year]: (string | undefined)[]): IssueTime | null {
  const ms = utcMs(Number(year), MONTHS.findIndex((name) => name === month!.toUpperCase()) + 1, Number(day), hour, minute);
  if (ms === null) return null;
  const written = weekday?.toUpperCase();
  const wrongWeekday = written !== undefined && written !== WEEKDAYS[new Date(ms).getUTCDay()] ? written : null;
  return { ms: ms + hoursToUtc * 3_600_000, wrongWeekday };
}

/**
 * The instant of `dd/hhmmZ`: the day of that number nearest to the issue time, so that months and years
 * roll over by themselves. Null where no such day is within half a month, or the hour is none.
 */
export function dayTimeNear(day: number, hhmm: string, issuedMs: number): number | null {
  const issued = new Date(issuedMs);
  let best: number | null = null;
  let bestGap = HALF_MONTH_MS;
  for (const shift of [-1, 0, 1]) {
    const month = new Date(Date.UTC(issued.getUTCFullYear(), issued.getUTCMonth() + shift, 1));
    const ms = utcMs(month.getUTCFullYear(), month.getUTCMonth() + 1, day, Number(hhmm.slice(0, 2)), Number(hhmm.slice(2)));
    if (ms === null || Math.abs(ms - issuedMs) > bestGap) continue;
    best = ms;
    bestGap = Math.abs(ms - issuedMs);
  }
  return best;
}
