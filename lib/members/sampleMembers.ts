import { destination } from '../geo';
import type { LandMask } from '../geo';
import { stormAt } from '../track';
import type { Track } from '../track';
import { nmiToKm } from '../units';
import { basinOf } from './basin';
import type { ErrorModel } from './errorModel';
import { applyLandDifference } from './landDifference';
import { sampleErrors } from './sampleErrors';
import type { ErrorSample } from './sampleErrors';

/** No tropical cyclone has been analysed stronger (Patricia 2015, 185 kt; US National Hurricane Center report EP202015). */
const GREATEST_WIND_KT = 185;
const LEAST_WIND_KT = 10;

/**
 * The forecast storm, moved, made stronger or weaker, larger or smaller: one row of nodes a member, `[member * nodes + node]`.
 * Latitude and longitude in degrees; ratios to the forecast's wind and to its radii at the same time.
 */
export interface Members {
  count: number;
  leadHours: Float64Array;
  lat: Float64Array;
  lon: Float64Array;
  intensityRatio: Float32Array;
  sizeRatio: Float32Array;
}

export interface MemberOptions {
  count: number;
  seed: number;
  model: ErrorModel;
  land: LandMask | null;
}

/** Samples members on the given nodes (lead hours, rising, within the track). */
export function sampleMembers(track: Track, leadHours: Float64Array, { count, seed, model, land }: MemberOptions): Members {
  const nodes = leadHours.length;
  const forecast = Array.from(leadHours, (lead) => stormAt(track, lead)!);
  const last = leadHours[nodes - 1];
  const errors = sampleErrors(model, basinOf(forecast[0].lat, forecast[0].lon), count, last, seed);
  const forecastKt = Float64Array.from(forecast, (storm) => storm.maxWindKt);
  const forecastOverLand = Uint8Array.from(forecast, (storm) => (land?.isLand(storm.lat, storm.lon) ? 1 : 0));
  const memberOverLand = new Uint8Array(nodes);
  const members: Members = {
    count,
    leadHours,
    lat: new Float64Array(count * nodes),
    lon: new Float64Array(count * nodes),
    intensityRatio: new Float32Array(count * nodes),
    sizeRatio: new Float32Array(count * nodes),
  };
  for (let member = 0; member < count; member++) {
    const row = member * nodes;
    for (let i = 0; i < nodes; i++) {
      const storm = forecast[i];
      const error = errorAt(errors, member, leadHours[i]);
      const open = openShare(leadHours[i]);
      const place = destination(
        storm.lat,
        storm.lon,
        storm.motionTowardDeg + (Math.atan2(error.crossNmi, error.alongNmi) * 180) / Math.PI,
        nmiToKm(open * Math.hypot(error.alongNmi, error.crossNmi)),
      );
      members.lat[row + i] = place.lat;
      members.lon[row + i] = place.lon;
      const windKt = Math.min(Math.max(storm.maxWindKt + open * error.intensityKt, LEAST_WIND_KT), GREATEST_WIND_KT);
      members.intensityRatio[row + i] = storm.maxWindKt > 0 ? windKt / storm.maxWindKt : 0;
      members.sizeRatio[row + i] = error.sizeRatio * model.averageToGreatestRadius;
      memberOverLand[i] = land?.isLand(place.lat, place.lon) ? 1 : 0;
    }
    if (land) applyLandDifference(members.intensityRatio, row, leadHours, forecastKt, forecastOverLand, memberOverLand);
  }
  return members;
}

/** Before issue the storm has been observed: errors fade to nothing over the six hours before. */
const openShare = (leadHours: number): number => Math.min(1, Math.max(0, 1 + leadHours / 6));

function errorAt(errors: ErrorSample, member: number, leadHours: number) {
  const knots = errors.leadHours.length;
  const row = member * knots;
  const position = Math.min(Math.max(leadHours / errors.leadHours[1], 0), knots - 1);
  const k = Math.min(Math.floor(position), knots - 2);
  const f = position - k;
  const between = (values: Float64Array) => values[row + k] + f * (values[row + k + 1] - values[row + k]);
  return {
    alongNmi: between(errors.alongNmi),
    crossNmi: between(errors.crossNmi),
    intensityKt: between(errors.intensityKt),
    sizeRatio: between(errors.sizeRatio),
  };
}
