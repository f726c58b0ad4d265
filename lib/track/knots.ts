import type { Point, Stage } from '../advisory';
import { byThreshold, ktToMs, nmiToKm, THRESHOLD_KEYS, THRESHOLDS_KT } from '../units';
import type { ByThreshold } from '../units';
import type { QuadrantKm } from '../geo';
import { pressureFromWindHpa } from './atkinsonHolliday1977';
import { fading } from './fading';
import { allRadiiKm, galeRadiiKm, givenRadii } from './fillRadii';
import type { GivenRadii } from './fillRadii';
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

/** A storm's wind by quadrant: the peak, how far from the centre it stands, and the radii. */
interface KnotStructure {
  peaksKt: QuadrantKt;
  peakRadiiKm: QuadrantKm;
  radiiKm: ByThreshold<QuadrantKm>;
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
  structure: KnotStructure | null;
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
  const given = givenRadii(points, winds, oneMinute);
  const gale = given && galeRadiiKm(given, points, leadHours, motion, winds, oneMinute);
  const pressures = fading(points.map((point) => point.minPressureHpa ?? null), winds.map(pressureFromWindHpa), leadHours);
  const radiusMaxWindKm = radiiMaxWind(points, leadHours, winds, given, gale, oneMinute);
  const rings = given && gale && points.map((_, i) => allRadiiKm(given, gale[i], i, leadHours, winds[i], radiusMaxWindKm[i], oneMinute));
  return points.map((point, i) => ({
    leadHours: leadHours[i],
    lat: point.lat,
    lon: point.lon,
    maxWindKt: winds[i],
    minPressureHpa: pressures[i],
    radiusMaxWindKm: radiusMaxWindKm[i],
    structure: rings && {
      radiiKm: rings[i],
      peaksKt: quadrantPeaksKt(winds[i], radiusMaxWindKm[i], rings[i], oneMinute),
      peakRadiiKm: peakRadiiKm(radiusMaxWindKm[i], rings, i),
    },
    stage: point.stage ?? (point.maxWindKt < THRESHOLDS_KT[0] ? 'depression' : 'tropical'),
    inferred: {
      radiusMaxWind: point.radiusMaxWindNm === undefined,
      pressure: point.minPressureHpa === undefined,
      radii: byThreshold((t, kt) => winds[i] >= kt * oneMinute && !given?.[t][i]),
    },
  }));
}

/** Radii of maximum wind (km): given, or expected from the rings with this storm's own anomaly fading as a ratio; always inside the rings. */
function radiiMaxWind(points: Point[], leadHours: Float64Array, winds: number[], given: GivenRadii | null, gale: QuadrantKm[] | null, oneMinute: number): number[] {
  const expected = points.map((point, i) => Math.log(expectedRadiusMaxWindKm(winds[i], point.lat, gale?.[i] ?? null)));
  const logs = fading(points.map((point) => logOf(givenRadiusMaxWindKm(point))), expected, leadHours);
  return points.map((point, i) => {
    const strongest = [given?.[2][i], given?.[1][i], gale?.[i]].findIndex((ring) => ring?.some((km) => km > 0));
    if (strongest < 0) return Math.exp(logs[i]);
    const ring = [given?.[2][i], given?.[1][i], gale?.[i]][strongest]!;
    const ringKt = THRESHOLDS_KT[2 - strongest] * oneMinute;
    return Math.min(Math.exp(logs[i]), mostRadiusMaxWindKm(Math.max(...ring), ringKt, winds[i], point.radiusMaxWindNm === undefined));
  });
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
 * The most that the radius of maximum wind (km) can be beside the widest radius of the strongest threshold known: inside it; and
 * where it is inferred, no farther in proportion than angular momentum allows, which does not fall outward (`V r` at that ring is at
 * least `V r` at the maximum). The narrower quadrants do not bound it: in the Atlantic best tracks of 2021 and 2022 it lies outside the
 * narrowest 64 kt radius of half of all hurricanes up to 95 kt, and outside the widest of one in a hundred.
 */
function mostRadiusMaxWindKm(widestKm: number, ringKt: number, maxWindKt: number, inferred: boolean): number {
  return widestKm * Math.min(INSIDE_RING, inferred ? ringKt / maxWindKt : 1);
}

/**
 * Where each quadrant's peak stands (km): at the storm's radius of maximum wind, but inside the quadrant's innermost ring, and inside
 * the rings that the point before or after has there and this one has not, which draw in to it and must not grow on the way.
 */
function peakRadiiKm(radiusMaxWindKm: number, rings: ByThreshold<QuadrantKm>[], i: number): QuadrantKm {
  const within = (q: 0 | 1 | 2 | 3): number => {
    let km = radiusMaxWindKm;
    for (const key of THRESHOLD_KEYS) {
      const own = rings[i][key][q];
      for (const ring of own > 0 ? [own] : [rings[i - 1]?.[key][q] ?? 0, rings[i + 1]?.[key][q] ?? 0]) if (ring > 0) km = Math.min(km, INSIDE_RING * ring);
    }
    return km;
  };
  return [within(0), within(1), within(2), within(3)];
}
