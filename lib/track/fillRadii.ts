import type { Point } from '../advisory';
import type { QuadrantKm } from '../geo';
import { THRESHOLD_KEYS, THRESHOLDS_KT, nmiToKm } from '../units';
import type { ByThreshold } from '../units';
import { climatologyRadiiKm } from './climatologyRadii';
import { anomalyKept } from './fading';
import type { Motion } from './motion';

const NONE: QuadrantKm = [0, 0, 0, 0];
/** An inferred ring lies at least this far inside the next weaker one, and a given one this little. */
const INFERRED_INSIDE = 0.95;
const GIVEN_INSIDE = 0.999;
/** The storm's size against climatology is believed within these bounds. */
const SIZE_BOUNDS = [0.3, 3] as const;

/** Rings at every point (km), null where the advisory has none at all, and which of them the advisory gave: `given[threshold][point]`. */
export interface FilledRadii {
  km: ByThreshold<QuadrantKm>[] | null;
  given: boolean[][];
}

/**
 * Rings at every point. A ring the wind does not reach is 0. A ring not given lies on the line between the times where it is
 * given; before the first and after the last such time it is the last given one, grown and shrunk as climatology does with the
 * storm's strength, and fading into climatology; a threshold given nowhere has climatology's radii times the storm's size
 * against climatology elsewhere.
 */
export function fillRadii(points: Point[], leadHours: Float64Array, motion: Motion[], windsKt: number[], oneMinute: number): FilledRadii {
  const given = THRESHOLD_KEYS.map((key, t) =>
    points.map((point, i): QuadrantKm | null => {
      if (windsKt[i] < THRESHOLDS_KT[t] * oneMinute) return NONE;
      const ring = point.radiiNm?.[key];
      return ring ? [nmiToKm(ring.ne), nmiToKm(ring.se), nmiToKm(ring.sw), nmiToKm(ring.nw)] : null;
    }),
  );
  const flags = given.map((rings) => rings.map((ring) => ring !== null));
  if (!points.some(({ radiiNm }) => radiiNm && Object.keys(radiiNm).length > 0)) return { km: null, given: flags };

  const climatology = THRESHOLDS_KT.map((kt) =>
    points.map((point, i) => climatologyRadiiKm(kt * oneMinute, windsKt[i], point.lat, motion[i].motionKt, motion[i].motionTowardDeg)),
  );
  const size = sizeAgainstClimatology(given, climatology);
  const filled = given.map((rings, t) => fillThreshold(rings, climatology[t], leadHours, size, windsKt, THRESHOLDS_KT[t] * oneMinute));
  return { km: points.map((_, i) => ordered(filled.map((rings) => rings[i]), flags.map((flag) => flag[i]))), given: flags };
}

const mean = (ring: QuadrantKm): number => (ring[0] + ring[1] + ring[2] + ring[3]) / 4;

const map = (ring: QuadrantKm, make: (km: number, quadrant: number) => number): QuadrantKm => [make(ring[0], 0), make(ring[1], 1), make(ring[2], 2), make(ring[3], 3)];

function sizeAgainstClimatology(given: (QuadrantKm | null)[][], climatology: QuadrantKm[][]): number {
  let logs = 0;
  let count = 0;
  given.forEach((rings, t) =>
    rings.forEach((ring, i) => {
      if (!ring || mean(ring) === 0 || mean(climatology[t][i]) === 0) return;
      logs += Math.log(mean(ring) / mean(climatology[t][i]));
      count++;
    }),
  );
  return count === 0 ? 1 : clampSize(Math.exp(logs / count));
}

const clampSize = (size: number): number => Math.min(Math.max(size, SIZE_BOUNDS[0]), SIZE_BOUNDS[1]);

function fillThreshold(rings: (QuadrantKm | null)[], climatology: QuadrantKm[], leadHours: Float64Array, size: number, windsKt: number[], thresholdKt: number): QuadrantKm[] {
  const isGiven = (i: number): boolean => rings[i] !== null && windsKt[i] >= thresholdKt;
  const known = rings.map((_, i) => i).filter(isGiven);
  return rings.map((ring, i) => {
    if (ring) return ring;
    const before = known.filter((k) => k < i).at(-1);
    const after = known.find((k) => k > i);
    if (before !== undefined && after !== undefined) {
      const f = (leadHours[i] - leadHours[before]) / (leadHours[after] - leadHours[before]);
      return map(rings[before]!, (km, q) => km + f * (rings[after]![q] - km));
    }
    const nearest = before ?? after;
    if (nearest === undefined) return map(climatology[i], (km) => km * size);
    const kept = anomalyKept(leadHours[i] - leadHours[nearest]);
    const then = mean(climatology[nearest]);
    const growth = then > 0 ? clampSize(mean(climatology[i]) / then) : 1;
    return map(climatology[i], (km, q) => km + kept * (rings[nearest]![q] * growth - km));
  });
}

/** Rings at 34, 50 and 64 kt made to lie inside one another; what is given moves only where given rings contradict. */
function ordered(rings: QuadrantKm[], given: boolean[]): ByThreshold<QuadrantKm> {
  const inner = rings.map((ring) => [...ring]);
  for (let q = 0; q < 4; q++) {
    for (let t = 1; t < 3; t++) if (!given[t]) inner[t][q] = Math.min(inner[t][q], INFERRED_INSIDE * inner[t - 1][q]);
    for (let t = 1; t >= 0; t--) inner[t][q] = Math.max(inner[t][q], inner[t + 1][q] / (given[t] ? GIVEN_INSIDE : INFERRED_INSIDE));
  }
  const [r34, r50, r64] = inner as unknown as QuadrantKm[];
  return { '34': r34, '50': r50, '64': r64 };
}
