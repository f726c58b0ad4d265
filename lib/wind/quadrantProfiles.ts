import { QUADRANT_AZIMUTHS_DEG } from '../track';
import type { Ring, StormState } from '../track';
import { ktToMs } from '../units';
import { schwerdtAsymmetryKt } from './asymmetry';
import { decayExponent } from './modifiedRankine';
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
  radiusMaxWindKm: number;
  innerExponent: number;
  quadrants: QuadrantProfile[];
  /** Where the advisory has no radii, the shape outside the maximum; null where power laws through the rings give it. */
  parametric: WilloughbyShape | null;
}

/** "Does not reach": the peak of such a quadrant stays this far under the threshold. */
const UNDER_THRESHOLD_KT = 0.1;
/** Surface wind over the wind at flight level near the maximum: Powell, Uhlhorn and Kepert (2009), Wea. Forecasting 24, 868-883. */
const SURFACE_OVER_FLIGHT = 0.9;
/** Beyond the outermost ring the last decay goes on, within what observed outer winds decay by (Hughes, 1952: 0.4 to 0.6) and constant angular momentum (1). */
const OUTER_EXPONENTS = [0.5, 1] as const;
/** Rings closer than this in proportion are drawn apart: a step in the wind would otherwise be infinitely steep. */
const LEAST_STEP = 1.0005;

/**
 * The wind against radius that honours an advisory's radii: in each quadrant through the peak at the radius of maximum wind and
 * through every ring, by a modified Rankine vortex in each stretch between. The maximum is attained in the quadrant whose
 * innermost ring is widest; the others peak where the same decay, followed inward from their own ring, puts them; a quadrant that a
 * threshold does not reach peaks under it. Motion asymmetry is not added: the maximum and the rings contain it.
 *
 * Without radii the shape is that of Willoughby, Darling and Rahn (2006), with Schwerdt's motion asymmetry such that the strongest
 * quadrant attains the maximum.
 */
export function quadrantProfiles(state: StormState): QuadrantProfiles {
  const { maxWindKt, radiusMaxWindKm, lat } = state;
  const flightMs = ktToMs(maxWindKt) / SURFACE_OVER_FLIGHT;
  const { rings } = state;
  const peaks = rings ? ringPeaksKt(state, rings) : motionPeaksKt(state);
  return {
    radiusMaxWindKm,
    innerExponent: willoughbyInnerExponent(flightMs, lat),
    quadrants: peaks.map((peakKt, q) => throughRings(radiusMaxWindKm, peakKt, rings ?? [], q)),
    parametric: rings ? null : willoughbyShape(flightMs, lat),
  };
}

/** Peaks by quadrant: the maximum less what motion takes from it, none of it on the strongest quadrant. */
function motionPeaksKt({ maxWindKt, motionKt, motionTowardDeg, lat }: StormState): number[] {
  const asymmetry = QUADRANT_AZIMUTHS_DEG.map((azimuth) => schwerdtAsymmetryKt(azimuth, motionKt, motionTowardDeg, lat));
  const strongest = Math.max(...asymmetry);
  return asymmetry.map((addedKt) => Math.max(maxWindKt / 2, maxWindKt - strongest + addedKt));
}

/** Peaks by quadrant from rings, weakest first in effect: each stronger ring sets the peak anew where it reaches and caps it where it does not. */
function ringPeaksKt({ maxWindKt, radiusMaxWindKm }: StormState, rings: readonly Ring[]): number[] {
  if (rings.length === 0) return [maxWindKt, maxWindKt, maxWindKt, maxWindKt];
  const peaks = [0, 0, 0, 0];
  for (let i = rings.length - 1; i >= 0; i--) {
    const { windKt, radiiKm } = rings[i];
    const widest = Math.max(...radiiKm);
    const capKt = Math.min(windKt, maxWindKt) - UNDER_THRESHOLD_KT;
    const exponent = widest > radiusMaxWindKm ? decayExponent(radiusMaxWindKm, Math.max(maxWindKt, windKt), widest, windKt) : 0;
    for (let q = 0; q < 4; q++) {
      const share = radiiKm[q] / radiusMaxWindKm;
      if (share >= 1) peaks[q] = Math.min(maxWindKt, windKt * share ** exponent);
      else {
        const under = peaks[q] === 0 ? capKt : Math.min(peaks[q], capKt);
        // A ring that grows out of nothing lifts the peak as it comes up to the radius of maximum wind.
        peaks[q] = under + share * (capKt - under);
      }
    }
  }
  const strongest = peaks.indexOf(Math.max(...peaks));
  peaks[strongest] = maxWindKt;
  return peaks;
}

function throughRings(radiusMaxWindKm: number, peakKt: number, rings: readonly Ring[], quadrant: number): QuadrantProfile {
  const radiusKm = [radiusMaxWindKm];
  const windKt = [peakKt];
  for (const ring of rings) {
    const radius = ring.radiiKm[quadrant];
    const last = radiusKm.length - 1;
    if (radius < radiusMaxWindKm) continue;
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
  const { radiusMaxWindKm, innerExponent, parametric } = profiles;
  const profile = profiles.quadrants[quadrant];
  if (radiusKm <= 0) return 0;
  if (radiusKm <= radiusMaxWindKm) return profile.windKt[0] * (radiusKm / radiusMaxWindKm) ** innerExponent;
  if (parametric) return profile.windKt[0] * willoughbyShareOfMax(radiusKm, radiusMaxWindKm, parametric);
  let i = profile.radiusKm.length - 1;
  while (i > 0 && radiusKm < profile.radiusKm[i]) i--;
  return profile.windKt[i] * (profile.radiusKm[i] / radiusKm) ** profile.exponent[i];
}
