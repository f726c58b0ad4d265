import type { Advisory } from '../advisory';
import { fromUnitVector } from '../geo';
import { oneMinuteOverTenMinute } from '../units';
import { makeKnots } from './knots';
import type { Knot } from './knots';
import { monotoneSlopes } from './monotoneCubic';
import { motionOf } from './motion';
import type { Motion } from './motion';
import { makePath, pathAt } from './path';
import type { Path } from './path';

/**
 * An advisory's storm as a function of time, in hours since issue (`leadHours`; the first point usually lies at or before 0).
 * Plain data: it can be posted to a thread. Winds are 1-minute at 10 m over water.
 */
export interface Track {
  advisory: Advisory;
  issuedAtMs: number;
  startLeadHours: number;
  endLeadHours: number;
  /** The points, complete, in order of time. */
  knots: Knot[];
  leadHours: Float64Array;
  path: Path;
  windSlopes: Float64Array;
  pressureSlopes: Float64Array;
  /** 1-minute wind over the wind in the advisory's own averaging. */
  oneMinute: number;
}

const HOUR_MS = 3_600_000;

/** Ten-minute winds become 1-minute winds by the at-sea factor of WMO/TD-No. 1555, and so do the winds at the rings. */
export function makeTrack(advisory: Advisory): Track {
  const issuedAtMs = Date.parse(advisory.issuedAt);
  const points = [...advisory.points].sort((a, b) => Date.parse(a.validAt) - Date.parse(b.validAt));
  const leadHours = Float64Array.from(points, (point) => (Date.parse(point.validAt) - issuedAtMs) / HOUR_MS);
  for (let i = 1; i < points.length; i++) {
    if (leadHours[i] === leadHours[i - 1]) throw new RangeError(`Two points of the track are at ${points[i].validAt}: keep one of them.`);
  }
  const oneMinute = advisory.averaging === '10-min' ? oneMinuteOverTenMinute('at-sea') : 1;
  const path = makePath(leadHours, points.map((point) => point.lat), points.map((point) => point.lon));
  const motion = points.map((_, i): Motion => {
    const { position, velocity, heading } = i === 0 ? pathAt(path, 0, 0) : pathAt(path, i - 1, 1);
    return motionOf(position, velocity, heading);
  });
  const knots = makeKnots(points, leadHours, motion, oneMinute);
  return {
    advisory,
    issuedAtMs,
    startLeadHours: leadHours[0],
    endLeadHours: leadHours[leadHours.length - 1],
    knots,
    leadHours,
    path,
    windSlopes: monotoneSlopes(leadHours, knots.map((knot) => knot.maxWindKt)),
    pressureSlopes: monotoneSlopes(leadHours, knots.map((knot) => knot.minPressureHpa)),
    oneMinute,
  };
}

/** Place (degrees) of the storm's centre at a time on the track; null before its first point and after its last. */
export function centreAt(track: Track, leadHours: number): { lat: number; lon: number } | null {
  const at = legAt(track, leadHours);
  return at && fromUnitVector(pathAt(track.path, at.leg, at.fraction).position);
}

/** The leg of a track that holds a time, and how far into it the time lies; null outside the track. */
export function legAt({ leadHours }: Track, lead: number): { leg: number; fraction: number } | null {
  const last = leadHours.length - 1;
  if (!(lead >= leadHours[0] && lead <= leadHours[last])) return null;
  let leg = 0;
  while (leg < last - 1 && lead >= leadHours[leg + 1]) leg++;
  return { leg, fraction: last === 0 ? 0 : (lead - leadHours[leg]) / (leadHours[leg + 1] - leadHours[leg]) };
}
