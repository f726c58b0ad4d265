import type { Stage } from '../advisory';
import { fromUnitVector } from '../geo';
import type { QuadrantKm } from '../geo';
import { byThreshold, THRESHOLD_KEYS, THRESHOLDS_KT } from '../units';
import type { ByThreshold } from '../units';
import type { Inferred, Knot } from './knots';
import { hermite } from './monotoneCubic';
import { motionOf } from './motion';
import { pathAt } from './path';
import { legAt } from './track';
import type { Track } from './track';

/** A wind (1-minute, kt) and how far it reaches by quadrant; a radius inside the radius of maximum wind is as good as none. */
export interface Ring {
  windKt: number;
  radiiKm: QuadrantKm;
}

/** The storm at one moment. Winds are 1-minute at 10 m over water. */
export interface StormState {
  leadHours: number;
  lat: number;
  lon: number;
  motionKt: number;
  motionTowardDeg: number;
  maxWindKt: number;
  minPressureHpa: number;
  radiusMaxWindKm: number;
  /** Greatest distance (NE SE SW NW) of the advisory's 34, 50 and 64 kt; 0 where not reached; null where the advisory has no radii at all. */
  radiiKm: ByThreshold<QuadrantKm | null>;
  /** What the wind profile goes through, strongest first; null where the advisory has no radii at all. */
  rings: readonly Ring[] | null;
  stage: Stage;
  inferred: Inferred;
}

/** The storm at a time, hours since issue; null before the first point and after the last. */
export function stormAt(track: Track, leadHours: number): StormState | null {
  const at = legAt(track, leadHours);
  if (!at) return null;
  const { leg, fraction } = at;
  const { knots, windSlopes, pressureSlopes } = track;
  const a = knots[leg];
  const b = knots[Math.min(leg + 1, knots.length - 1)];
  const hours = b.leadHours - a.leadHours;
  const { position, velocity, heading } = pathAt(track.path, leg, fraction);
  const maxWindKt = a === b ? a.maxWindKt : hermite(fraction, hours, a.maxWindKt, b.maxWindKt, windSlopes[leg], windSlopes[leg + 1]);
  const radiusMaxWindKm = a.radiusMaxWindKm + fraction * (b.radiusMaxWindKm - a.radiusMaxWindKm);
  const rings = ringsBetween(a, b, fraction, maxWindKt, track.oneMinute);
  return {
    leadHours,
    ...fromUnitVector(position),
    ...motionOf(position, velocity, heading),
    maxWindKt,
    minPressureHpa: a === b ? a.minPressureHpa : hermite(fraction, hours, a.minPressureHpa, b.minPressureHpa, pressureSlopes[leg], pressureSlopes[leg + 1]),
    radiusMaxWindKm,
    radiiKm: byThreshold((t, kt) => {
      if (!rings) return null;
      const ring = rings[t];
      if (!ring || maxWindKt < kt * track.oneMinute) return [0, 0, 0, 0];
      return map(ring.radiiKm, (km) => (km < radiusMaxWindKm ? 0 : km));
    }),
    rings: rings && rings.filter((ring) => ring !== null).reverse(),
    stage: fraction === 1 ? b.stage : a.stage,
    inferred: {
      radiusMaxWind: either(a, b, fraction, (knot) => knot.inferred.radiusMaxWind),
      pressure: either(a, b, fraction, (knot) => knot.inferred.pressure),
      radii: byThreshold((t) => either(a, b, fraction, (knot) => knot.inferred.radii[THRESHOLD_KEYS[t]])),
    },
  };
}

const either = (a: Knot, b: Knot, fraction: number, say: (knot: Knot) => boolean): boolean => (fraction < 1 && say(a)) || (fraction > 0 && say(b));

const map = (ring: QuadrantKm, make: (km: number, quadrant: 0 | 1 | 2 | 3) => number): QuadrantKm => [make(ring[0], 0), make(ring[1], 1), make(ring[2], 2), make(ring[3], 3)];

/**
 * Rings at 34, 50 and 64 kt between two points, null for one that matters at neither. Radii change linearly. Where the wind falls
 * under a threshold from one point to the next, its ring draws in to the radius of maximum wind and its wind falls with the
 * maximum, so that the wind field never jumps.
 */
function ringsBetween(a: Knot, b: Knot, fraction: number, maxWindKt: number, oneMinute: number): (Ring | null)[] | null {
  const [from, to] = [a.radiiKm, b.radiiKm];
  if (!from || !to) return null;
  return THRESHOLDS_KT.map((kt, t) => {
    const key = THRESHOLD_KEYS[t];
    const thresholdKt = kt * oneMinute;
    const [holdsA, holdsB] = [a.maxWindKt >= thresholdKt, b.maxWindKt >= thresholdKt];
    if (!holdsA && !holdsB) return null;
    const radiiKm = map(from[key], (kmA, q) => {
      const kmB = to[key][q];
      const start = holdsA || kmB === 0 ? kmA : a.radiusMaxWindKm;
      const end = holdsB || kmA === 0 ? kmB : b.radiusMaxWindKm;
      return start + fraction * (end - start);
    });
    return { windKt: Math.min(thresholdKt, maxWindKt), radiiKm };
  });
}
