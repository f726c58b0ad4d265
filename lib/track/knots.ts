import type { Point, Stage } from '../advisory';
import { byThreshold, ktToMs, nmiToKm, THRESHOLD_KEYS, THRESHOLDS_KT } from '../units';
import type { ByThreshold } from '../units';
import type { QuadrantKm } from '../geo';
import { pressureFromWindHpa } from './atkinsonHolliday1977';
import { fading } from './fading';
import { fillRadii } from './fillRadii';
import type { Motion } from './motion';
import { quadrantPeaksKt } from './quadrantPeaks';
import type { QuadrantKt } from './quadrantPeaks';
import { chavasKnaffRadiusMaxWindKm, willoughbyRadiusMaxWindKm } from './radiusMaxWind';

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
  /** Peaks and radii by quadrant, 0 where not reached; null where the advisory gives no radii at all. */
  structure: { peaksKt: QuadrantKt; radiiKm: ByThreshold<QuadrantKm> } | null;
  stage: Stage;
  inferred: Inferred;
}

/** Surface wind over the wind at flight level near the maximum: Powell, Uhlhorn and Kepert (2009), Wea. Forecasting 24, 868-883. */
const SURFACE_OVER_FLIGHT = 0.9;
/** Mean radius within a quadrant over the greatest, which is what advisories give: Chavas and Knaff (2022), after DeMaria et al. (2009). */
const MEAN_OVER_GREATEST = 0.85;
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
  const climatology = points.map((point, i) => Math.log(expectedRadiusMaxWindKm(winds[i], point.lat, radii.km?.[i]['34'] ?? null)));
  const radiiMaxWind = fading(points.map((point) => logOf(givenRadiusMaxWindKm(point))), climatology, leadHours);
  const rings = radii.km;
  const radiusMaxWindKm = radiiMaxWind.map((log, i) => {
    const inferred = points[i].radiusMaxWindNm === undefined;
    if (rings === null) return Math.exp(log);
    return Math.min(Math.exp(log), insideOwnRings(rings[i], winds[i], oneMinute, inferred), inferred ? insideVanishingRings(rings, i) : Infinity);
  });
  return points.map((point, i) => ({
    leadHours: leadHours[i],
    lat: point.lat,
    lon: point.lon,
    maxWindKt: winds[i],
    minPressureHpa: pressures[i],
    radiusMaxWindKm: radiusMaxWindKm[i],
    structure: rings && { radiiKm: rings[i], peaksKt: quadrantPeaksKt(winds[i], radiusMaxWindKm[i], rings[i], oneMinute) },
    stage: point.stage ?? (point.maxWindKt < THRESHOLDS_KT[0] ? 'depression' : 'tropical'),
    inferred: {
      radiusMaxWind: point.radiusMaxWindNm === undefined,
      pressure: point.minPressureHpa === undefined,
      radii: byThreshold((t) => !radii.given[t][i]),
    },
  }));
}

/** Radius of maximum wind to expect: from the 34 kt radii where there are any, else from strength and latitude alone. */
function expectedRadiusMaxWindKm(maxWindKt: number, lat: number, radii34Km: QuadrantKm | null): number {
  const reached = radii34Km?.filter((km) => km > 0) ?? [];
  if (reached.length === 0) return willoughbyRadiusMaxWindKm(ktToMs(maxWindKt) / SURFACE_OVER_FLIGHT, lat);
  const meanKm = reached.reduce((sum, km) => sum + km, 0) / reached.length;
  return chavasKnaffRadiusMaxWindKm(maxWindKt, MEAN_OVER_GREATEST * meanKm, lat);
}

function givenRadiusMaxWindKm(point: Point): number | null {
  if (point.radiusMaxWindNm !== undefined) return nmiToKm(point.radiusMaxWindNm);
  return point.eyeDiameterNm === undefined ? null : nmiToKm(point.eyeDiameterNm) / 2 + EYEWALL_KM;
}

const logOf = (value: number | null): number | null => (value === null ? null : Math.log(value));

/**
 * The most that the radius of maximum wind (km) can be beside a point's rings: inside every quadrant's innermost ring; and where it
 * is inferred, no farther in proportion than angular momentum allows, which does not fall outward (`V r` at the widest innermost
 * ring is at least `V r` at the maximum).
 */
function insideOwnRings(radiiKm: ByThreshold<QuadrantKm>, maxWindKt: number, oneMinute: number, inferred: boolean): number {
  let most = Infinity;
  const open = [true, true, true, true];
  let innermost = true;
  for (const key of ['64', '50', '34'] as const) {
    const ring = radiiKm[key];
    ring.forEach((km, q) => {
      if (km === 0 || !open[q]) return;
      open[q] = false;
      most = Math.min(most, INSIDE_RING * km);
    });
    const widest = Math.max(...ring);
    if (widest > 0 && innermost && inferred) most = Math.min(most, (widest * Number(key) * oneMinute) / maxWindKt);
    innermost &&= widest === 0;
  }
  return most;
}

/** A ring that the point before or after has and this one has not draws in to this one's maximum: it must not grow on the way. */
function insideVanishingRings(rings: ByThreshold<QuadrantKm>[], i: number): number {
  let most = Infinity;
  for (const neighbour of [rings[i - 1], rings[i + 1]]) {
    if (!neighbour) continue;
    for (const key of THRESHOLD_KEYS) {
      neighbour[key].forEach((km, q) => {
        if (km > 0 && rings[i][key][q] === 0) most = Math.min(most, INSIDE_RING * km);
      });
    }
  }
  return most;
}
