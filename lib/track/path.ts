import { add, cross, dot, length, scale, unitVector } from '../geo';
import type { Vector } from '../geo';
import { harmonicSlope, hermite, hermiteSlope } from './monotoneCubic';

const NONE: Vector = [0, 0, 0];
/** Speed at a point over the slower of the legs it joins, at most: holds the departure sideways under a third of a leg. */
const FASTEST = 1.5;

/** One leg of a path: the great circle from a knot to the next, and how the path enters and leaves it. */
interface Leg {
  hours: number;
  /** Unit vectors to the start, along the great circle there, and to the circle's pole, left of the way. */
  start: Vector;
  along: Vector;
  left: Vector;
  angle: number;
  /** Speeds (radians per hour) at start and end, along the great circle and to its left. */
  alongStart: number;
  alongEnd: number;
  leftStart: number;
  leftEnd: number;
}

/** A smooth way over the sphere through places at times. Plain data. */
export interface Path {
  leadHours: Float64Array;
  legs: Leg[];
  /** The only place of a path without legs. */
  start: Vector;
}

/**
 * A path through every place, with continuous velocity. In each leg's own great-circle frame, progress along the great circle is
 * a monotone cubic (Fritsch and Carlson, 1980), so the storm never turns back between points, and the departure sideways is a
 * cubic that is zero at both ends. The velocity at a point lies between the directions before and after, at the weighted harmonic
 * mean of their speeds (Fritsch and Butland, 1984). Nothing refers to the poles or a meridian, so the path turns with the sphere.
 */
export function makePath(leadHours: Float64Array, lat: ArrayLike<number>, lon: ArrayLike<number>): Path {
  const places = Array.from(leadHours, (_, i) => unitVector(lat[i], lon[i]));
  const legs = places.slice(1).map((place, i) => bareLeg(places[i], place, leadHours[i + 1] - leadHours[i]));

  for (let i = 1; i < legs.length; i++) {
    const [before, after] = [legs[i - 1], legs[i]];
    const arriving = add(scale(before.along, Math.cos(before.angle)), scale(before.start, -Math.sin(before.angle)));
    const velocity = velocityAt(arriving, after.along, before, after);
    before.alongEnd = dot(velocity, arriving);
    before.leftEnd = dot(velocity, before.left);
    after.alongStart = dot(velocity, after.along);
    after.leftStart = dot(velocity, after.left);
  }
  // At the ends the path neither bends nor gains speed: the second derivative is zero.
  const [first] = legs;
  const last = legs[legs.length - 1];
  if (legs.length === 1) first.alongStart = first.alongEnd = first.angle / first.hours;
  if (legs.length > 1) {
    first.alongStart = (3 * (first.angle / first.hours) - first.alongEnd) / 2;
    first.leftStart = -first.leftEnd / 2;
    last.alongEnd = (3 * (last.angle / last.hours) - last.alongStart) / 2;
    last.leftEnd = -last.leftStart / 2;
  }
  return { leadHours, legs, start: places[0] };
}

/**
 * Velocity where two legs meet: along the middle of both directions (unit vectors), at the weighted harmonic mean of both speeds.
 * Beyond a right angle the turn slows the storm, until it stands still where it turns right round.
 */
function velocityAt(arriving: Vector, leaving: Vector, before: Leg, after: Leg): Vector {
  const [speedBefore, speedAfter] = [before.angle / before.hours, after.angle / after.hours];
  const middle = add(arriving, leaving);
  const size = length(middle);
  if (size < 1e-9) return NONE;
  const speed = Math.min(harmonicSlope(speedBefore, speedAfter, before.hours, after.hours), FASTEST * Math.min(speedBefore, speedAfter));
  return scale(middle, (speed * Math.min(1, (size * size) / 2)) / size);
}

function bareLeg(from: Vector, to: Vector, hours: number): Leg {
  const normal = cross(from, to);
  const sine = length(normal);
  const angle = Math.atan2(sine, dot(from, to));
  const still = { hours, start: from, along: NONE, left: NONE, angle: 0, alongStart: 0, alongEnd: 0, leftStart: 0, leftEnd: 0 };
  if (sine < 1e-12) {
    if (angle > 1) throw new RangeError('Two points of a track lie at opposite ends of the earth: no great circle joins them.');
    return still;
  }
  const left = scale(normal, 1 / sine);
  return { ...still, along: cross(left, from), left, angle };
}

/** Where the path is and how it moves. */
export interface PathPoint {
  /** Unit vector. */
  position: Vector;
  /** Radians per hour, tangent to the sphere. */
  velocity: Vector;
  /** Direction of the way as a tangent vector of any length, kept where the speed is zero; zero for a path that never moves. */
  heading: Vector;
}

/** The path on leg `leg`, at `fraction` of its time. */
export function pathAt({ legs, start }: Path, leg: number, fraction: number): PathPoint {
  if (legs.length === 0) return { position: start, velocity: NONE, heading: NONE };
  const { hours, angle, alongStart, alongEnd, leftStart, leftEnd, start: from, along, left } = legs[leg];
  if (angle === 0) return { position: from, velocity: NONE, heading: restingHeading(legs, leg) };
  const s = hermite(fraction, hours, 0, angle, alongStart, alongEnd);
  const c = hermite(fraction, hours, 0, 0, leftStart, leftEnd);
  const ahead = add(scale(from, -Math.sin(s)), scale(along, Math.cos(s)));
  const below = add(scale(from, Math.cos(s)), scale(along, Math.sin(s)));
  const sideways = add(scale(below, -Math.sin(c)), scale(left, Math.cos(c)));
  const speedAlong = hermiteSlope(fraction, hours, 0, angle, alongStart, alongEnd) * Math.cos(c);
  const speedLeft = hermiteSlope(fraction, hours, 0, 0, leftStart, leftEnd);
  const velocity = add(scale(ahead, speedAlong), scale(sideways, speedLeft));
  return { position: add(scale(below, Math.cos(c)), scale(left, Math.sin(c))), velocity, heading: length(velocity) > 1e-9 ? velocity : ahead };
}

/** A storm at rest faces where it goes next, or where it was going. */
function restingHeading(legs: Leg[], leg: number): Vector {
  for (let i = leg + 1; i < legs.length; i++) if (legs[i].angle > 0) return legs[i].along;
  for (let i = leg - 1; i >= 0; i--) if (legs[i].angle > 0) return add(scale(legs[i].along, Math.cos(legs[i].angle)), scale(legs[i].start, -Math.sin(legs[i].angle)));
  return NONE;
}
