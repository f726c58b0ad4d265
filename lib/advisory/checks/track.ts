import { motionBetween } from '../motion';
import type { CheckContext } from '../checks';
import type { Advisory, Point, Warning } from '../model';

/** Faster than storms move, but for some in transition at high latitude; common practice, no source. */
const FASTEST_STORM_KT = 60;
/** Tropical cyclones do not live within a few degrees of the equator; common practice, no source. */
const EQUATOR_BELT_DEG = 4;
/** Official forecasts give a point at least every 24 h; a gap above this has one left out. */
const LONGEST_GAP_HOURS = 36;

/** Where the storms of a basin are, as the letters of a storm's identifier name it. Wide: systems leave their basin of birth. */
const BASINS: Record<string, (point: Point) => boolean> = {
  AL: ({ lat, lon }) => lat > 0 && lon > -115 && lon < 30,
  EP: ({ lat, lon }) => lat > 0 && (lon < -75 || lon > 130),
  CP: ({ lat, lon }) => lat > 0 && (lon < -75 || lon > 130),
  WP: ({ lat, lon }) => lat > 0 && (lon > 80 || lon < -130),
  IO: ({ lat, lon }) => lat > 0 && lon > 30 && lon < 120,
  SH: ({ lat }) => lat < 0,
};

/** Jumps, gaps, the equator, and positions on the wrong side of the world. */
export function trackChecks({ storm, points }: Advisory, { previous }: CheckContext): Warning[] {
  const warnings: Warning[] = [];
  if (points.length === 1) warnings.push({ code: 'single-point', path: 'points', message: 'only one position is given: no track can be drawn and nothing after it is forecast' });

  points.forEach((point, index) => {
    const path = `points[${index}]`;
    if (Math.abs(point.lat) < EQUATOR_BELT_DEG) warnings.push({ code: 'near-equator', path: `${path}.lat`, message: `latitude ${point.lat} is within ${EQUATOR_BELT_DEG} degrees of the equator, where tropical cyclones do not live` });
    const before = points[index - 1];
    if (before === undefined) return;
    const { speedKt, distanceNmi, hours } = motionBetween(before, point);
    if (speedKt > FASTEST_STORM_KT) warnings.push({ code: 'track-jump', path, message: `${Math.round(distanceNmi)} nmi in ${round1(hours)} h is ${Math.round(speedKt)} kt, faster than storms move (${FASTEST_STORM_KT} kt): check position and time` });
    if (hours > LONGEST_GAP_HOURS) warnings.push({ code: 'time-gap', path, message: `${round1(hours)} h pass before this point with none between: check that no point was left out` });
  });

  const inBasin = BASINS[storm.id?.slice(0, 2).toUpperCase() ?? ''];
  const astray = inBasin === undefined ? -1 : points.findIndex((point) => !inBasin(point));
  if (astray >= 0) warnings.push({ code: 'outside-basin', path: `points[${astray}]`, message: `this position is outside the basin of storm ${storm.id}: check N or S, E or W` });

  const earlier = previous === undefined ? undefined : nearestBefore(previous.points, points[0]!);
  if (earlier !== undefined) {
    const { speedKt, distanceNmi, hours } = motionBetween(earlier, points[0]!);
    if (speedKt > FASTEST_STORM_KT) warnings.push({ code: 'far-from-previous', path: 'points[0]', message: `${Math.round(distanceNmi)} nmi from where the advisory before put the storm ${round1(hours)} h earlier: is this the same storm?` });
  }
  return warnings;
}

/** The analysed position of the advisory before, where it is earlier than this one. */
const nearestBefore = (points: readonly Point[], first: Point): Point | undefined => (Date.parse(points[0]!.validAt) < Date.parse(first.validAt) ? points[0] : undefined);

const round1 = (value: number): number => Math.round(value * 10) / 10;
