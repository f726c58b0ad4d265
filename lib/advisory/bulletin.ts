import { isoInstant } from './instants';
import { carriedStage, stageOfTitle } from './stage';
import { failed, nearest } from './draft';
import { findDatedTitle, readHeader } from './bulletin/header';
import { joinedLine, linesOf } from './bulletin/lines';
import { readBody } from './bulletin/points';
import type { Draft, Place, Read } from './draft';
import type { Header } from './bulletin/header';
import type { Line } from './bulletin/lines';
import type { Body, BulletinPoint } from './bulletin/points';
import type { InputError, Point, Stage, Warning } from './model';

/** United States forecast centres average over one minute; others say so or are asked about. */
const ONE_MINUTE_CENTRES = /NATIONAL HURRICANE CENTER|NATIONAL WEATHER SERVICE|\bNWS\b|CENTRAL PACIFIC|JOINT TYPHOON/i;

/**
 * Reads the public forecast/advisory text product, plain or inside a web page: the position at issue, and
 * the forecast and outlook points with winds and radii. Layouts since 1991 were held against it.
 *
 * A point that says only DISSIPATED or ABSORBED has no position; it becomes `dissipatesAt`.
 */
export function readBulletin(text: string): Read {
  const joined = joinedLine(text);
  if (joined !== null) return failed({ line: joined, message: 'the bulletin has lost its line breaks: paste it with each line on its own' });
  const lines = linesOf(text);
  const read = readHeader(lines);
  if (!read.ok) return read;
  const { header } = read;

  const another = findDatedTitle(lines, header.bodyFrom);
  const bodyLines = lines.slice(header.bodyFrom, another === null ? undefined : lines.indexOf(another.titleLine));
  const body = readBody(bodyLines, header.issuedMs);
  const warnings = [...header.warnings, ...body.warnings];
  if (another !== null) warnings.push({ code: 'several-bulletins', line: another.titleLine.number, message: 'a second bulletin starts here and was not read: give each bulletin on its own' });

  const errors = [...body.errors, ...missing(body, lines.at(-1)!, lines)];
  if (errors.length > 0) return failed(errors);
  if (!body.closed) warnings.push({ code: 'end-missing', line: lines.at(-1)!.number, message: 'the text ends without NEXT ADVISORY, $$ or NNNN: check that nothing was cut off' });
  return { ok: true, draft: assemble(header, body, warnings) };
}

/** What a forecast cannot do without. */
function missing({ points }: Body, last: Line, lines: readonly Line[]): InputError[] {
  if (points.length === 0) {
    const isPublic = lines.some((line) => /^SUMMARY OF /i.test(line.text));
    const mend = isPublic ? 'this is the advisory written for the public, which has no forecast positions: give the forecast/advisory of the same number' : 'add the line CENTER LOCATED NEAR 33.5N  76.9W AT 03/0900Z';
    return [{ line: last.number, message: `no position of the centre was found: ${mend}` }];
  }
  return points
    .filter((point) => point.wind === undefined)
    .map((point) => ({ line: point.line.number, column: point.line.column, message: `no maximum wind follows "${point.line.text}": add a line such as MAX WIND  45 KT...GUSTS  55 KT below it` }));
}

function assemble(header: Header, body: Body, warnings: Warning[]): Draft {
  const places = new Map<string, Place>([
    ['storm', at(header.titleLine)],
    ['number', at(header.titleLine)],
    ['centre', at(header.centreLine)],
    ['issuedAt', at(header.issueLine)],
  ]);
  const kept = withoutRepeats(body.points, warnings);
  const points = toPoints(kept, stageOfTitle(header.title) ?? stageOfTitle(body.located), places);

  if (body.averaging === null && !ONE_MINUTE_CENTRES.test(header.centre)) {
    warnings.push({ code: 'averaging-assumed', path: 'averaging', ...at(header.centreLine), message: 'the bulletin does not say over how long its winds are averaged: read as 1-minute winds' });
  }
  const { nextDue } = body;
  if (nextDue !== null) places.set('nextDueAt', at(nextDue.line));
  const ending = endOf(body, kept, warnings);
  if (ending !== undefined) places.set('dissipatesAt', at(body.dissipated!.line));
  const advisory = {
    storm: { ...(header.id === undefined ? {} : { id: header.id }), name: header.name },
    number: header.number,
    centre: header.centre,
    issuedAt: isoInstant(header.issuedMs),
    ...(nextDue === null ? {} : { nextDueAt: isoInstant(nextDue.ms) }),
    ...(ending === undefined ? {} : { dissipatesAt: isoInstant(ending) }),
    averaging: body.averaging ?? '1-min',
    points,
  };
  return { advisory, placeOf: (path) => nearest(places, path) ?? {}, warnings };
}

/** Two points at one time: the first is kept. */
function withoutRepeats(points: readonly BulletinPoint[], warnings: Warning[]): BulletinPoint[] {
  const byTime = new Map<number, BulletinPoint>();
  for (const point of points) {
    const before = byTime.get(point.ms);
    if (before === undefined) byTime.set(point.ms, point);
    else warnings.push({ code: 'time-repeated', ...at(point.line), message: `lines ${before.line.number} and ${point.line.number} give two positions for the same time; that of line ${before.line.number} was kept` });
  }
  return [...byTime.values()];
}

function toPoints(points: readonly BulletinPoint[], titled: Stage | undefined, places: Map<string, Place>): Point[] {
  let stage = titled;
  return points.map((point, index) => {
    const wind = point.wind!;
    if (index > 0) stage = carriedStage(stage, point.remark, wind.kt);
    const path = `points.${index}`;
    places.set(path, at(point.line));
    places.set(`${path}.maxWindKt`, at(wind.line));
    places.set(`${path}.gustKt`, at(wind.line));
    for (const key of ['minPressureHpa', 'eyeDiameterNm'] as const) if (point[key] !== undefined) places.set(`${path}.${key}`, at(point[key].line));
    for (const [threshold, ring] of point.rings) places.set(`${path}.radiiNm.${threshold}`, at(ring.line));
    return {
      validAt: isoInstant(point.ms),
      lat: point.lat,
      lon: point.lon,
      maxWindKt: wind.kt,
      ...(wind.gustKt === undefined ? {} : { gustKt: wind.gustKt }),
      ...(point.minPressureHpa === undefined ? {} : { minPressureHpa: point.minPressureHpa.value }),
      ...(point.eyeDiameterNm === undefined ? {} : { eyeDiameterNm: point.eyeDiameterNm.value }),
      ...(point.rings.size === 0 ? {} : { radiiNm: Object.fromEntries([...point.rings].map(([key, ring]) => [key, ring.radii])) }),
      ...(stage === undefined ? {} : { stage }),
    };
  });
}

/** When the storm is forecast to be gone, if that is after its last position. */
function endOf({ dissipated }: Body, points: readonly BulletinPoint[], warnings: Warning[]): number | undefined {
  if (dissipated === null) return undefined;
  const last = points.at(-1)!;
  if (dissipated.ms <= last.ms) {
    warnings.push({ code: 'position-after-end', ...at(dissipated.line), message: `the storm is said to be gone (${dissipated.remark.toLowerCase()}) before its last position on line ${last.line.number}; the positions were kept` });
    return undefined;
  }
  warnings.push({ code: 'dissipation-forecast', path: 'dissipatesAt', ...at(dissipated.line), message: `forecast to be gone by ${isoInstant(dissipated.ms)} (${dissipated.remark.toLowerCase()}); no position is given for that time` });
  return dissipated.ms;
}

const at = ({ number, column }: Line): Place => ({ line: number, column });
