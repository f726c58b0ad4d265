import type { Point, Stage } from '../advisory';
import { THRESHOLDS_KT, byThreshold, nmiToKm, ktToMs } from '../units';
import type { ByThreshold, ThresholdKey } from '../units';
import type { QuadrantKm } from '../geo';
import { pressureFromWindHpa } from './atkinsonHolliday1977';
import { fading } from './fading';
import { fillRadii } from './fillRadii';
import type { Motion } from './motion';
import { willoughbyRadiusMaxWindKm } from './radiusMaxWind';

/** What was not in the advisory and comes from a published regression or climatology. */
export interface Inferred {
  radiusMaxWind: boolean;
  pressure: boolean;
  radii: ByThreshold<boolean>;
}

/** The storm at one forecast point, complete. Winds are 1-minute at 10 m over water (kt). */
export interface Knot {
  leadHours: number;
  lat: number;
  lon: number;
  maxWindKt: number;
  minPressureHpa: number;
  radiusMaxWindKm: number;
  /** 0: not reached. null: the advisory gives no radii at all. */
  radiiKm: ByThreshold<QuadrantKm> | null;
  stage: Stage;
  inferred: Inferred;
}

/** A ring lies outside the radius of maximum wind. */
const INSIDE_RING = 0.95;
/** The maximum lies in the eyewall, this far outside the eye's edge: Shea and Gray (1973), J. Atmos. Sci. 30, 1544-1564 (about 5 nmi; from memory). */
const EYEWALL_KM = nmiToKm(5);

/** Completes the points of an advisory, in order of time. `oneMinute` turns the centre's winds into 1-minute winds. */
export function makeKnots(points: Point[], leadHours: Float64Array, motion: Motion[], oneMinute: number): Knot[] {
  const winds = points.map((point) => point.maxWindKt * oneMinute);
  const radii = fillRadii(points, leadHours, motion, winds, oneMinute);
  const pressures = fading(points.map((point) => point.minPressureHpa ?? null), winds.map(pressureFromWindHpa), leadHours);
  // Radii of maximum wind fade as ratios, pressures as differences.
  const climatology = points.map((point, i) => Math.log(willoughbyRadiusMaxWindKm(ktToMs(winds[i]), point.lat)));
  const radiiMaxWind = fading(points.map((point) => logOf(givenRadiusMaxWindKm(point))), climatology, leadHours);
  return points.map((point, i) => ({
    leadHours: leadHours[i],
    lat: point.lat,
    lon: point.lon,
    maxWindKt: winds[i],
    minPressureHpa: pressures[i],
    radiusMaxWindKm: withinRings(Math.exp(radiiMaxWind[i]), winds[i], radii.km?.[i] ?? null, oneMinute, point.radiusMaxWindNm === undefined),
    radiiKm: radii.km?.[i] ?? null,
    stage: point.stage ?? (point.maxWindKt < THRESHOLDS_KT[0] ? 'depression' : 'tropical'),
    inferred: {
      radiusMaxWind: point.radiusMaxWindNm === undefined,
      pressure: point.minPressureHpa === undefined,
      radii: byThreshold((t) => !radii.given[t][i]),
    },
  }));
}

function givenRadiusMaxWindKm(point: Point): number | null {
  if (point.radiusMaxWindNm !== undefined) return nmiToKm(point.radiusMaxWindNm);
  return point.eyeDiameterNm === undefined ? null : nmiToKm(point.eyeDiameterNm) / 2 + EYEWALL_KM;
}

const logOf = (value: number | null): number | null => (value === null ? null : Math.log(value));

/**
 * The radius of maximum wind made to agree with the radii: inside every quadrant's innermost ring; and where it is inferred, no
 * farther in proportion than angular momentum allows, which does not fall outward (`V r` at the widest innermost ring is at
 * least `V r` at the maximum).
 */
function withinRings(radiusKm: number, maxWindKt: number, radiiKm: ByThreshold<QuadrantKm> | null, oneMinute: number, inferred: boolean): number {
  if (radiiKm === null) return radiusKm;
  let most = Infinity;
  let innermostFound = false;
  const open = [true, true, true, true];
  for (const key of ['64', '50', '34'] as const satisfies ThresholdKey[]) {
    const ring = radiiKm[key];
    ring.forEach((km, q) => {
      if (km === 0 || !open[q]) return;
      open[q] = false;
      most = Math.min(most, INSIDE_RING * km);
    });
    const widest = Math.max(...ring);
    if (widest > 0 && !innermostFound) {
      innermostFound = true;
      if (inferred) most = Math.min(most, (widest * Number(key) * oneMinute) / maxWindKt);
    }
  }
  return Math.min(radiusKm, most);
}
