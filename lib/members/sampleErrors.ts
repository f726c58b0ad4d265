import type { Basin } from './basin';
import { deviationsAt } from './errorModel';
import type { ErrorModel } from './errorModel';
import { normals } from './normals';

/** Errors of `count` members at each knot lead, row by row: `[member * leads.length + knot]`. */
export interface ErrorSample {
  count: number;
  leadHours: Float64Array;
  alongNmi: Float64Array;
  crossNmi: Float64Array;
  intensityKt: Float64Array;
  /** Factor on the radius at which a wind is found; median 1. */
  sizeRatio: Float64Array;
}

const KNOT_HOURS = 6;

/**
 * Draws forecast errors that grow with lead as the model says and are correlated in time as a first-order autoregression
 * (DeMaria et al., 2009, Wea. Forecasting 24, 1573-1591). Members come in antithetic pairs: the second has the errors of the
 * first with the other sign, so that the sample has no bias of its own. Same arguments, same bytes.
 */
export function sampleErrors(model: ErrorModel, basin: Basin, count: number, lastLeadHours: number, seed: number): ErrorSample {
  const knots = Math.max(2, Math.ceil(Math.max(0, lastLeadHours) / KNOT_HOURS) + 1);
  const leadHours = Float64Array.from({ length: knots }, (_, k) => k * KNOT_HOURS);
  const deviations = Array.from(leadHours, (lead) => deviationsAt(model, basin, lead));
  const sample: ErrorSample = {
    count,
    leadHours,
    alongNmi: new Float64Array(count * knots),
    crossNmi: new Float64Array(count * knots),
    intensityKt: new Float64Array(count * knots),
    sizeRatio: new Float64Array(count * knots),
  };
  const keep = Math.pow(model.correlationOver12h, KNOT_HOURS / 12);
  const fresh = Math.sqrt(1 - keep * keep);
  const normal = normals(seed);
  const state = new Float64Array(4);
  for (let member = 0; member < count; member += 2) {
    for (let k = 0; k < knots; k++) {
      for (let c = 0; c < 4; c++) state[c] = k === 0 ? normal() : keep * state[c] + fresh * normal();
      const { trackNmi, intensityKt, sizeLog } = deviations[k];
      for (let twin = 0; twin < 2 && member + twin < count; twin++) {
        const sign = twin === 0 ? 1 : -1;
        const at = (member + twin) * knots + k;
        sample.alongNmi[at] = sign * state[0] * trackNmi;
        sample.crossNmi[at] = sign * state[1] * trackNmi;
        sample.intensityKt[at] = sign * state[2] * intensityKt;
        sample.sizeRatio[at] = Math.exp(sign * state[3] * sizeLog);
      }
    }
  }
  return sample;
}
