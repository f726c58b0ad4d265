import { issueTime } from './times';
import type { InputError, Warning } from '../model';
import type { Line } from './lines';

export interface Header {
  name: string;
  id: string | undefined;
  number: string;
  centre: string;
  /** What stands before the name: `TROPICAL STORM`, `REMNANTS OF`. */
  title: string;
  issuedMs: number;
  titleLine: Line;
  issueLine: Line;
  centreLine: Line;
  /** Index of the first line after the header. */
  bodyFrom: number;
  warnings: Warning[];
}

const TITLE = /^(.*?)\s*\b(?:(?:SPECIAL|INTERMEDIATE|MARINE)\s+)*(?:FORECAST\s*\/\s*)?ADVISORY\s+(?:NUMBER|NO\.?|NR\.?)\s*(\d{1,3}[A-Z]?)\b(.*)$/i;
/** Words that say what the storm is, before its name. */
const KINDS = /^(?:(?:POTENTIAL|POST-?TROPICAL|SUB-?TROPICAL|EXTRA-?TROPICAL|TROPICAL|SEVERE|SUPER|VERY|CYCLONIC|HURRICANE|TYPHOON|STORM|DEPRESSION|CYCLONE|DISTURBANCE|REMNANTS?|LOW|OF)(?:\s+|$))+/i;
const TRANSMISSION = /^(?:ZCZC|NNNN|\$\$|[A-Z]{4}\d{2}\s|BULLETIN)|DDHHMM/i;
const STORM_ID = /\b([A-Z]{2})\s?(\d{2})(\d{4}|\d{2})\s*$/i;
const CORRECTED = /\bCC[A-Z]\b|\bCOR\b|CORRECT(?:ED|ION)/i;
/** How many lines the issue time may stand below the title. */
const HEADER_REACH = 6;

/** Reads the title, issuing centre and issue time. */
export function readHeader(lines: readonly Line[]): { ok: true; header: Header } | { ok: false; errors: InputError[] } {
  const found = findDatedTitle(lines, 0) ?? findTitle(lines, 0);
  if (found === null) {
    return fail(lines[0]?.number ?? 1, 'no title line such as "HURRICANE ALEX FORECAST/ADVISORY NUMBER 12" was found: paste the whole forecast/advisory, from its header on');
  }
  const { titleLine, number } = found;
  const title = KINDS.exec(found.before)?.[0].trim() ?? '';
  const name = found.before.slice(title.length).trim();
  if (name === '') return fail(titleLine.number, 'the title names no storm: put its name between its kind and FORECAST/ADVISORY', titleLine.column);

  const timeAt = issueTimeAt(lines, found.next);
  if (timeAt === null) {
    return fail(titleLine.number, 'no issue time such as "0900 UTC TUE AUG 03 2004" follows the title: add it, with month and year, on a line below the issuing centre');
  }
  const issued = issueTime(lines[timeAt]!.text)!;
  const between = lines.slice(found.next, timeAt);
  const centreLine = between[0] ?? titleLine;
  const { centre, id } = centreAndId(oneSpaced(between.map((line) => line.text).join(' ')), new Date(issued.ms).getUTCFullYear());

  const warnings: Warning[] = [];
  if (issued.wrongWeekday !== null) {
    warnings.push({ code: 'weekday-mismatch', path: 'issuedAt', line: lines[timeAt]!.number, column: lines[timeAt]!.column, message: `the date is not a ${issued.wrongWeekday}: check day, month and year of the issue time` });
  }
  if (centre === '') warnings.push({ code: 'centre-missing', path: 'centre', line: titleLine.number, message: 'no issuing centre stands between the title and the issue time' });
  const corrected = [...lines.slice(0, found.next), lines[timeAt + 1]].find((line) => line !== undefined && CORRECTED.test(line.text));
  if (corrected !== undefined) {
    warnings.push({ code: 'correction', path: 'number', line: corrected.number, column: corrected.column, message: `this is a correction of advisory ${number}: it replaces the one issued before under that number` });
  }
  return {
    ok: true,
    header: { name: titleCase(name), id, number, centre: centre || 'not stated', title, issuedMs: issued.ms, titleLine, issueLine: lines[timeAt]!, centreLine, bodyFrom: timeAt + 1, warnings },
  };
}

export interface Title {
  /** Kind and name. */
  before: string;
  number: string;
  titleLine: Line;
  /** Index of the first line after the title. */
  next: number;
}

/** The first title at or after `from` that an issue time follows: text may mention an advisory number too. */
export function findDatedTitle(lines: readonly Line[], from: number): Title | null {
  for (let title = findTitle(lines, from); title !== null; title = findTitle(lines, title.next)) {
    if (issueTimeAt(lines, title.next) !== null) return title;
  }
  return null;
}

function issueTimeAt(lines: readonly Line[], from: number): number | null {
  const within = lines.slice(from, from + HEADER_REACH).findIndex((line) => issueTime(line.text) !== null);
  return within < 0 ? null : from + within;
}

/** The first title at or after `from`, over one line or two. */
function findTitle(lines: readonly Line[], from: number): Title | null {
  for (let at = from; at < lines.length; at++) {
    const line = lines[at]!;
    if (!/ADVISORY/i.test(line.text)) continue;
    const alone = TITLE.exec(oneSpaced(line.text));
    const wrapped = alone === null && lines[at + 1] !== undefined ? TITLE.exec(oneSpaced(`${line.text} ${lines[at + 1]!.text}`)) : null;
    const match = alone ?? wrapped;
    if (match === null) continue;
    const above = at > from && !TRANSMISSION.test(lines[at - 1]!.text) ? lines[at - 1]! : null;
    // The kind, or kind and name, may have a line of their own.
    const splits = above !== null && (match[1] === '' || (!KINDS.test(match[1]!) && KINDS.test(above.text)));
    return { before: splits ? oneSpaced(`${above.text} ${match[1]}`).trim() : match[1]!, number: match[2]!.toUpperCase(), titleLine: splits ? above : line, next: at + (alone === null ? 2 : 1) };
  }
  return null;
}

/** `AL0101` in 2001 is AL012001: older bulletins give the year with two digits. */
function centreAndId(text: string, issuedYear: number): { centre: string; id: string | undefined } {
  const match = STORM_ID.exec(text);
  const centre = (match === null ? text : text.slice(0, match.index)).trim();
  if (match === null) return { centre, id: undefined };
  const [, basin, number, year] = match as unknown as [string, string, string, string];
  const full = year.length === 4 ? year : String([issuedYear - 1, issuedYear, issuedYear + 1].find((near) => near % 100 === Number(year)) ?? `${Math.floor(issuedYear / 100)}${year}`);
  return { centre, id: `${basin.toUpperCase()}${number}${full}` };
}

const oneSpaced = (text: string): string => text.replace(/\s+/g, ' ');

const titleCase = (text: string): string => text.toLowerCase().replace(/(^|[\s-])(\p{L})/gu, (_, before: string, letter: string) => before + letter.toUpperCase());

const fail = (line: number, message: string, column?: number): { ok: false; errors: InputError[] } => ({ ok: false, errors: [{ line, ...(column === undefined ? {} : { column }), message }] });
