import { THRESHOLD_KEYS } from '../units';
import { MONTHS, WEEKDAYS } from './bulletin/times';
import { compassName, motionBetween } from './motion';
import { carriedStage } from './stage';
import type { Advisory, Point, QuadrantRadii, Stage } from './model';

const HOUR_MS = 3_600_000;
/** Later points are outlook, as the product has had it since 2003. */
const OUTLOOK_AFTER_HOURS = 72;
/** Column at which the storm's identifier stands. */
const ID_COLUMN = 45;

const REMARKS: Record<Stage, string> = {
  disturbance: 'TROPICAL DISTURBANCE',
  depression: 'TROPICAL CYCLONE',
  tropical: 'TROPICAL CYCLONE',
  subtropical: 'SUBTROPICAL',
  'post-tropical': 'POST-TROP/EXTRATROP',
  'remnant-low': 'POST-TROP/REMNT LOW',
  dissipated: 'DISSIPATED',
};

/** Stages that the product repeats at every point they hold for. */
const SAID_EACH_TIME: readonly Stage[] = ['post-tropical', 'remnant-low'];

/**
 * Writes an advisory in the layout of the public forecast/advisory text product.
 *
 * The product rounds and leaves out: positions to 0.1 degree, winds to 1 kt, radii to 1 nmi, times to
 * the minute; pressure and eye only at the first point; no radius of maximum wind; names in capitals;
 * a dissipated point has a time and no position. What it can carry, `readAdvisory` reads back equal.
 */
export function writeBulletin(advisory: Advisory): string {
  const [first, ...later] = advisory.points as [Point, ...Point[]];
  const lines = [...heading(advisory, first), '', ...located(advisory, first), ''];

  let stage = first.stage;
  let outlook = false;
  for (const point of later) {
    if (!outlook && Date.parse(point.validAt) - Date.parse(advisory.issuedAt) > OUTLOOK_AFTER_HOURS * HOUR_MS) {
      outlook = true;
      lines.push('EXTENDED OUTLOOK...USE FOR GUIDANCE ONLY...ERRORS MAY BE LARGE', '');
    }
    const label = outlook ? 'OUTLOOK' : 'FORECAST';
    lines.push(...(point.stage === 'dissipated' ? [ended(label, point.validAt)] : forecast(label, point, stage)), '');
    stage = point.stage ?? carriedStage(stage, '', point.maxWindKt);
  }
  if (advisory.dissipatesAt !== undefined) lines.push(ended(outlook ? 'OUTLOOK' : 'FORECAST', advisory.dissipatesAt), '');
  if (advisory.nextDueAt !== undefined) lines.push(`NEXT ADVISORY AT ${dayTime(advisory.nextDueAt)}`, '');
  lines.push('$$', '', 'NNNN');
  return `${lines.join('\n')}\n`;
}

function heading({ storm, number, centre, issuedAt }: Advisory, first: Point): string[] {
  const time = new Date(issuedAt);
  const clock = `${two(time.getUTCHours())}${two(time.getUTCMinutes())} UTC`;
  const date = `${WEEKDAYS[time.getUTCDay()]} ${MONTHS[time.getUTCMonth()]} ${two(time.getUTCDate())} ${time.getUTCFullYear()}`;
  return [
    'ZCZC',
    `TTAA00 XXXX ${two(time.getUTCDate())}${two(time.getUTCHours())}${two(time.getUTCMinutes())}`,
    '',
    `${titleOf(first)} ${capitals(storm.name)} FORECAST/ADVISORY NUMBER ${capitals(number).padStart(3)}`,
    storm.id === undefined ? capitals(centre) : `${capitals(centre).padEnd(ID_COLUMN - 1)} ${capitals(storm.id)}`,
    `${clock} ${date}`,
  ];
}

function located({ averaging, points }: Advisory, first: Point): string[] {
  const where = `CENTER LOCATED NEAR ${position(first)} AT ${dayTime(first.validAt)}`;
  const title = titleOf(first);
  const lines = [`${title === 'POTENTIAL TROPICAL CYCLONE' ? 'POTENTIAL TROP CYCLONE' : title} ${where}`, ''];

  const second = points[1];
  if (second !== undefined && second.stage !== 'dissipated') {
    const { bearingDeg, speedKt } = motionBetween(first, second);
    lines.push(
      Math.round(speedKt) === 0
        ? 'PRESENT MOVEMENT STATIONARY'
        : `PRESENT MOVEMENT TOWARD THE ${compassName(bearingDeg)} OR ${three(Math.round(bearingDeg) || 360)} DEGREES AT ${three(speedKt)} KT`,
      '',
    );
  }
  if (first.minPressureHpa !== undefined) lines.push(`ESTIMATED MINIMUM CENTRAL PRESSURE ${String(Math.round(first.minPressureHpa)).padStart(4)} MB`);
  if (first.eyeDiameterNm !== undefined) lines.push(`EYE DIAMETER ${three(first.eyeDiameterNm)} NM`);
  const gust = first.gustKt === undefined ? '' : ` WITH GUSTS TO ${three(first.gustKt)} KT`;
  lines.push(`MAX SUSTAINED WINDS ${three(first.maxWindKt)} KT${gust}.`, ...rings(first, 7));
  lines.push(`WINDS ARE ${averaging === '10-min' ? '10' : '1'}-MINUTE AVERAGES.`);
  lines.push(
    'WINDS VARY GREATLY IN EACH QUADRANT.  RADII IN NAUTICAL',
    'MILES ARE THE LARGEST RADII EXPECTED ANYWHERE IN THAT QUADRANT.',
    '',
    `REPEAT...${where}`,
  );
  return lines;
}

function forecast(label: string, point: Point, before: Stage | undefined): string[] {
  const said = point.stage !== undefined && (SAID_EACH_TIME.includes(point.stage) || point.stage !== carriedStage(before, '', point.maxWindKt));
  const gust = point.gustKt === undefined ? '' : `...GUSTS ${three(point.gustKt)} KT`;
  return [
    `${label} VALID ${dayTime(point.validAt)} ${position(point)}${said ? `...${REMARKS[point.stage!]}` : ''}`,
    `MAX WIND ${three(point.maxWindKt)} KT${gust}.`,
    ...rings(point, 3),
  ];
}

const ended = (label: string, at: string): string => `${label} VALID ${dayTime(at)}...DISSIPATED`;

/** Radii lines, highest threshold first, as the product prints them. */
function rings(point: Point, dots: number): string[] {
  return [...THRESHOLD_KEYS].reverse().flatMap((key) => {
    const ring = point.radiiNm?.[key];
    return ring === undefined ? [] : [`${key} KT${'.'.repeat(dots)}${quadrants(ring)}.`];
  });
}

const quadrants = ({ ne, se, sw, nw }: QuadrantRadii): string => `${three(ne)}NE ${three(se)}SE ${three(sw)}SW ${three(nw)}NW`;

function titleOf({ stage, maxWindKt }: Point): string {
  switch (stage) {
    case 'disturbance':
      return 'POTENTIAL TROPICAL CYCLONE';
    case 'depression':
      return 'TROPICAL DEPRESSION';
    case 'tropical':
      return maxWindKt >= 64 ? 'HURRICANE' : 'TROPICAL STORM';
    case 'subtropical':
      return maxWindKt >= 34 ? 'SUBTROPICAL STORM' : 'SUBTROPICAL DEPRESSION';
    case 'post-tropical':
      return 'POST-TROPICAL CYCLONE';
    case 'remnant-low':
    case 'dissipated':
      return 'REMNANTS OF';
    case undefined:
      return 'TROPICAL CYCLONE';
  }
}

function position({ lat, lon }: Point): string {
  const north = `${Math.abs(lat).toFixed(1).padStart(4)}${lat < 0 ? 'S' : 'N'}`;
  const east = `${Math.abs(lon).toFixed(1).padStart(5)}${lon < 0 ? 'W' : 'E'}`;
  return `${north} ${east}`;
}

function dayTime(instant: string): string {
  const time = new Date(instant);
  return `${two(time.getUTCDate())}/${two(time.getUTCHours())}${two(time.getUTCMinutes())}Z`;
}

/** One line of capitals without brackets or controls: a name cannot break the layout it stands in. */
const capitals = (text: string): string => text.replace(/[<>\p{Cc}]/gu, ' ').toUpperCase().replace(/\s+/g, ' ').trim() || 'UNNAMED';
const two = (value: number): string => String(value).padStart(2, '0');
const three = (value: number): string => String(Math.round(value)).padStart(3);
