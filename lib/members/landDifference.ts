import { decayedOverLandKt } from '../wind';

const LEAST_FACTOR = 0.25;
const GREATEST_FACTOR = 2;

/**
 * What land takes from a member beyond what the forecast already took. A forecast contains the land along its own track, so a
 * member over land while the forecast is at sea decays, one at sea while the forecast is over land is given that decay back,
 * and nothing happens while both are on the same side.
 *
 * Rewrites `ratio` (member wind over forecast wind, one value a node) in place.
 */
export function applyLandDifference(
  ratio: Float32Array,
  offset: number,
  leadHours: Float64Array,
  forecastKt: Float64Array,
  forecastOverLand: Uint8Array,
  memberOverLand: Uint8Array,
): void {
  let factor = 1;
  for (let i = 1; i < leadHours.length; i++) {
    const hours = leadHours[i] - leadHours[i - 1];
    const memberKt = ratio[offset + i] * forecastKt[i] * factor;
    if (memberOverLand[i] && !forecastOverLand[i]) factor *= memberKt > 0 ? decayedOverLandKt(memberKt, hours) / memberKt : 1;
    else if (forecastOverLand[i] && !memberOverLand[i] && forecastKt[i] > 0) factor *= forecastKt[i] / decayedOverLandKt(forecastKt[i], hours);
    factor = Math.min(Math.max(factor, LEAST_FACTOR), GREATEST_FACTOR);
    ratio[offset + i] *= factor;
  }
}
