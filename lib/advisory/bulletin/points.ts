import { saysDissipated } from '../stage';
import { dayTime, forecastLine, locatedLine, position, quantityLine, windLine } from './phrases';
import { radiiLine } from './radii';
import { dayTimeNear } from './times';
import type { ThresholdKey } from '../../units';
import type { InputError, QuadrantRadii, Warning } from '../model';
import type { Line } from './lines';
import type { Position } from './phrases';

/** A point as its lines are read, each value with the line it came from. */
export interface BulletinPoint extends Position {
  line: Line;
  ms: number;
  remark: string;
  wind?: { kt: number; gustKt: number | undefined; line: Line };
  minPressureHpa?: { value: number; line: Line };
  eyeDiameterNm?: { value: number; line: Line };
  rings: Map<ThresholdKey, { radii: QuadrantRadii; line: Line }>;
}

export interface Body {
  points: BulletinPoint[];
  /** What stands before `CENTER LOCATED`. */
  located: string;
  dissipated: { ms: number; remark: string; line: Line } | null;
  nextDue: { ms: number; line: Line } | null;
  averaging: '1-min' | '10-min' | null;
  /** Whether any line shows that nothing was cut off: next advisory, last advisory, end of transmission. */
  closed: boolean;
  errors: InputError[];
  warnings: Warning[];
}

const NEXT_ADVISORY = /^NEXT\s+(?:\w+\s+)?ADVISORY\b/i;
const AVERAGING = /\b(10|1|ONE|TEN)[\s-]?MIN(?:UTE)?S?\b.{0,20}\b(?:AVERAGE|MEAN|SUSTAINED)/i;
const CLOSING = /^(?:NNNN|\$\$)|LAST (?:FORECAST\/|PUBLIC )?ADVISORY/i;

/** Reads everything below the header, in one pass. */
export function readBody(lines: readonly Line[], issuedMs: number): Body {
  const body: Body = { points: [], located: '', dissipated: null, nextDue: null, averaging: null, closed: false, errors: [], warnings: [] };
  const readers = [takeForecast, takeLocation, takeWind, takeRadii, takeQuantity, takeNextAdvisory];
  lines.forEach((line, index) => {
    const averaging = AVERAGING.exec(line.text);
    if (averaging !== null) body.averaging = /^1$|ONE/i.test(averaging[1]!) ? '1-min' : '10-min';
    if (CLOSING.test(line.text)) body.closed = true;
    if (readers.some((take) => take(body, line, issuedMs, lines[index + 1]))) return;
    // A misspelt keyword must not lose a point without a word.
    if (body.points.length > 0 && !/^(?:REPEAT|AT\s)/i.test(line.text) && position(line.text) !== null && dayTime(line.text) !== null) {
      body.warnings.push({ code: 'line-unread', ...at(line), message: `this line has a position and a time but was not understood: "${line.text}"; a forecast line starts with FORECAST VALID or OUTLOOK VALID` });
    }
  });
  return body;
}

function takeForecast(body: Body, line: Line, issuedMs: number): boolean {
  const found = forecastLine(line.text);
  if (found === null) return false;
  if ('problem' in found) return problem(body, line, found.problem);
  const ms = dayTimeNear(found.day, found.hhmm, issuedMs);
  if (ms === null) return problem(body, line, noSuchTime(found));
  if (found.position !== null) open(body, line, ms, found.position, found.remark);
  else if (saysDissipated(found.remark)) body.dissipated ??= { ms, remark: found.remark, line };
  else return problem(body, line, `no position such as "28.3N  94.7W" follows the time in "${line.text}"; only a dissipated storm goes without`);
  return true;
}

function takeLocation(body: Body, line: Line, issuedMs: number, next: Line | undefined): boolean {
  if (!/LOCATED|CENT(?:ER|R)ED/i.test(line.text)) return false;
  const found = locatedLine(line.text) ?? (next === undefined ? null : locatedLine(`${line.text} ${next.text}`));
  if (found === null) return false;
  const ms = dayTimeNear(found.day, found.hhmm, issuedMs);
  if (ms === null) return problem(body, line, noSuchTime(found));
  if (found.kind === 'earlier') return true;
  const first = body.points[0];
  if (first === undefined) {
    body.located = found.before;
    open(body, line, ms, found.position, '');
  } else if (first.lat !== found.position.lat || first.lon !== found.position.lon || first.ms !== ms) {
    body.warnings.push({ code: 'position-repeat-differs', path: 'points.0', ...at(line), message: `the position or its time differs from that on line ${first.line.number}, which was kept` });
  }
  return true;
}

function takeWind(body: Body, line: Line): boolean {
  const found = body.points.length === 0 ? null : windLine(line.text);
  if (found === null) return false;
  if ('problem' in found) return problem(body, line, found.problem);
  const point = body.points.at(-1)!;
  if (point.wind !== undefined) {
    return problem(body, line, `a second maximum wind for the point of line ${point.line.number} (the first is on line ${point.wind.line.number}): is a FORECAST VALID line missing or misspelt above?`);
  }
  point.wind = { ...found, line };
  return true;
}

function takeRadii(body: Body, line: Line): boolean {
  const found = body.points.length === 0 ? null : radiiLine(line.text);
  if (found === null) return false;
  if ('problem' in found) return problem(body, line, found.problem);
  if ('otherKt' in found) {
    body.warnings.push({ code: 'threshold-unused', ...at(line), message: `radii of ${found.otherKt} kt winds were left out: only 34, 50 and 64 kt are computed` });
    return true;
  }
  const { rings, line: own } = body.points.at(-1)!;
  const before = rings.get(found.threshold);
  if (before !== undefined) {
    return problem(body, line, `a second line of ${found.threshold} kt radii for the point of line ${own.number} (the first is on line ${before.line.number}): is a FORECAST VALID line missing or misspelt above?`);
  }
  rings.set(found.threshold, { radii: found.radii, line });
  return true;
}

function takeQuantity(body: Body, line: Line): boolean {
  const point = body.points.at(-1);
  const found = point === undefined ? null : quantityLine(line.text);
  if (point === undefined || found === null) return false;
  if ('problem' in found) return problem(body, line, found.problem);
  point[found.quantity] ??= { value: found.value, line };
  return true;
}

function takeNextAdvisory(body: Body, line: Line, issuedMs: number): boolean {
  if (!NEXT_ADVISORY.test(line.text)) return false;
  body.closed = true;
  const time = dayTime(line.text);
  const ms = time === null ? null : dayTimeNear(time.day, time.hhmm, issuedMs);
  if (ms === null) body.warnings.push({ code: 'next-due-unread', path: 'nextDueAt', ...at(line), message: `no time such as 19/1500Z was found in "${line.text}": the time the next advisory is due stays unknown` });
  else body.nextDue ??= { ms, line };
  return true;
}

function open(body: Body, line: Line, ms: number, { lat, lon }: Position, remark: string): void {
  body.points.push({ line, ms, lat, lon, remark, rings: new Map() });
}

function problem(body: Body, line: Line, message: string): true {
  body.errors.push({ ...at(line), message });
  return true;
}

const at = ({ number, column }: Line): { line: number; column: number } => ({ line: number, column });

const noSuchTime = ({ day, hhmm }: { day: number; hhmm: string }): string => `${day}/${hhmm}Z is no day and hour near the issue time: write day of the month / hhmm, such as 29/1800Z`;
