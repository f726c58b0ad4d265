import { decayExponent, QUADRANT_AZIMUTHS_DEG } from '../track';
import type { Ring, StormState } from '../track';
import { ktToMs } from '../units';
import { schwerdtAsymmetryKt } from './asymmetry';
import { modifiedRankine } from './modifiedRankine';
import { willoughbyInnerExponent, willoughbyShape, willoughbyShareOfMax } from './willoughby2006';
import type { WilloughbyShape } from './willoughby2006';

/** One quadrant: rises by a power law to `windKt[0]` at `radiusKm[0]`, then falls from anchor to anchor. */
interface QuadrantProfile {
  radiusKm: number[];
  windKt: number[];
  /** Power-law exponent outward of each anchor. */
  exponent: number[];
}

/** Wind against radius in the quadrants NE, SE, SW, NW: 1-minute at 10 m over water. */
export interface QuadrantProfiles {
  innerExponent: number;
  quadrants: QuadrantProfile[];
  /** Where the advisory has no radii, the shape outside the maximum; null where power laws through the rings give it. */
  parametric: WilloughbyShape | null;
}

/** Surface wind over the wind at flight level near the maximum: Powell, Uhlhorn and Kepert (2009), Wea. Forecasting 24, 868-883. */
const SURFACE_OVER_FLIGHT = 0.9;
/** Beyond the outermost ring the last decay goes on, within what observed outer winds decay by (Hughes, 1952: 0.4 to 0.6) and constant angular momentum (1). */
const OUTER_EXPONENTS = [0.5, 1] as const;
/** Rings closer than this in proportion are drawn apart: a step in the wind would otherwise be infinitely steep. */
const LEAST_STEP = 1.0005;

/**
 * The wind against radius that honours an advisory's radii: in each quadrant from the peak at the radius of maximum wind through
 * every ring, by a modified Rankine vortex in each stretch between. Motion asymmetry is not added: maximum and rings contain it.
 *
 * Without radii the shape is that of Willoughby, Darling and Rahn (2006), with Schwerdt's motion asymmetry such that the strongest
 * quadrant attains the maximum.
 */
export function quadrantProfiles(state: StormState): QuadrantProfiles {
  const { maxWindKt, radiusMaxWindKm, lat, structure } = state;
  const flightMs = ktToMs(maxWindKt) / SURFACE_OVER_FLIGHT;
  const peaks = structure ? structure.peaksKt : motionPeaksKt(state);
  return {
    innerExponent: willoughbyInnerExponent(flightMs, lat),
    quadrants: peaks.map((peakKt, q) => throughRings(structure?.peakRadiiKm[q] ?? radiusMaxWindKm, peakKt, structure?.rings ?? [], q)),
    parametric: structure ? null : willoughbyShape(flightMs, lat),
  };
}

/** Peaks by quadrant: the maximum less what motion takes from it, none of it on the strongest quadrant. */
function motionPeaksKt({ maxWindKt, motionKt, motionTowardDeg, lat }: StormState): number[] {
  const asymmetry = QUADRANT_AZIMUTHS_DEG.map((azimuth) => schwerdtAsymmetryKt(azimuth, motionKt, motionTowardDeg, lat));
  const strongest = Math.max(...asymmetry);
  return asymmetry.map((addedKt) => Math.max(maxWindKt / 2, maxWindKt - strongest + addedKt));
}

function throughRings(peakRadiusKm: number, peakKt: number, rings: readonly Ring[], quadrant: number): QuadrantProfile {
  const radiusKm = [peakRadiusKm];
  const windKt = [peakKt];
  for (const ring of rings) {
    const radius = ring.radiiKm[quadrant];
    const last = radiusKm.length - 1;
    if (radius === 0) continue;
    radiusKm.push(Math.max(radius, radiusKm[last] * LEAST_STEP));
    windKt.push(Math.min(ring.windKt, windKt[last]));
  }
  const exponent = windKt.slice(1).map((wind, i) => decayExponent(radiusKm[i], windKt[i], radiusKm[i + 1], wind));
  const outer = exponent.at(-1) ?? OUTER_EXPONENTS[0];
  exponent.push(Math.min(Math.max(outer, OUTER_EXPONENTS[0]), OUTER_EXPONENTS[1]));
  return { radiusKm, windKt, exponent };
}

/** Wind (kt, 1-minute at 10 m over water) at a radius along the governing azimuth of quadrant 0 NE, 1 SE, 2 SW, 3 NW. */
export function profileKt(profiles: QuadrantProfiles, quadrant: number, radiusKm: number): number {
  const { innerExponent, parametric } = profiles;
  const { radiusKm: anchorKm, windKt, exponent } = profiles.quadrants[quadrant];
  if (radiusKm <= 0) return 0;
  if (parametric) return windKt[0] * willoughbyShareOfMax(radiusKm, anchorKm[0], parametric);
  let i = anchorKm.length - 1;
  while (i > 0 && radiusKm < anchorKm[i]) i--;
  return modifiedRankine(radiusKm, windKt[i], anchorKm[i], exponent[i], innerExponent);
}
