import type { Stage } from '../advisory';
import { fromUnitVector } from '../geo';
import type { QuadrantKm } from '../geo';
import { byThreshold, THRESHOLD_KEYS, THRESHOLDS_KT } from '../units';
import type { ByThreshold } from '../units';
import type { Inferred, Knot } from './knots';
import { hermite } from './monotoneCubic';
import { motionOf } from './motion';
import { pathAt } from './path';
import { peaksBetween, reaches } from './quadrantPeaks';
import type { QuadrantKt } from './quadrantPeaks';
import { legAt } from './track';
import type { Track } from './track';

/** A wind (1-minute, kt) and how far it reaches by quadrant, 0 for nowhere. Where the quadrant's peak is lower, that peak reaches so far. */
export interface Ring {
  windKt: number;
  radiiKm: QuadrantKm;
}

/** Peaks by quadrant, how far from the centre they stand, and the rings outside them, strongest first. */
interface StormStructure {
  peaksKt: QuadrantKt;
  peakRadiiKm: QuadrantKm;
  rings: readonly Ring[];
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
  /** Greatest distance (NE SE SW NW) of the advisory's 34, 50 and 64 kt; 0 where not reached; null where it is reached and the advisory has no radii at all. */
  radiiKm: ByThreshold<QuadrantKm | null>;
  /** What the wind profile goes through; null where the advisory has no radii at all. */
  structure: StormStructure | null;
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
  const structure = structureBetween(a, b, fraction, maxWindKt, track.oneMinute);
  return {
    leadHours,
    ...fromUnitVector(position),
    ...motionOf(position, velocity, heading),
    maxWindKt,
    minPressureHpa: a === b ? a.minPressureHpa : hermite(fraction, hours, a.minPressureHpa, b.minPressureHpa, pressureSlopes[leg], pressureSlopes[leg + 1]),
    radiusMaxWindKm,
    radiiKm: byThreshold((t, kt) => {
      if (!structure) return maxWindKt < kt * track.oneMinute ? [0, 0, 0, 0] : null;
      const { windKt, radiiKm } = structure.rings[2 - t];
      return map(radiiKm, (km, q) => (reaches(structure.peaksKt[q], windKt) ? km : 0));
    }),
    structure,
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
 * Peaks and rings between two points. Radii change linearly. A ring that one point has and the other has not draws in to the
 * quadrant's peak there, and its wind is never above the peak's, so that the wind field changes without a jump.
 */
function structureBetween(a: Knot, b: Knot, fraction: number, maxWindKt: number, oneMinute: number): StormStructure | null {
  if (!a.structure || !b.structure) return null;
  const [from, to] = [a.structure, b.structure];
  const between = (start: number, end: number): number => start + fraction * (end - start);
  const rings = THRESHOLDS_KT.map((kt, t): Ring => {
    const key = THRESHOLD_KEYS[t];
    const radiiKm = map(from.radiiKm[key], (kmA, q) => {
      const kmB = to.radiiKm[key][q];
      return kmA === 0 && kmB === 0 ? 0 : between(kmA || from.peakRadiiKm[q], kmB || to.peakRadiiKm[q]);
    });
    return { windKt: kt * oneMinute, radiiKm };
  });
  return {
    peaksKt: peaksBetween(from.peaksKt, a.maxWindKt, to.peaksKt, b.maxWindKt, fraction, maxWindKt),
    peakRadiiKm: map(from.peakRadiiKm, (km, q) => between(km, to.peakRadiiKm[q])),
    rings: rings.reverse(),
  };
}
