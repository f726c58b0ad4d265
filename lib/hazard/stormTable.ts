import { profileKt, quadrantProfiles } from '../wind';
import { stormAt } from '../track';
import type { Track } from '../track';

/**
 * Bins are even in the square root of the radius, and radius is counted in radii of maximum wind: the cusp of the profile falls
 * on a bin, whatever the storm's size. At 48 bins a root the outermost bin lies at 113 radii.
 */
export const BINS_PER_ROOT = 48;
export const BINS = 512;
export const QUADRANTS = 4;

/** Radius at a bin, in radii of maximum wind. */
export const binRadius = (bin: number): number => (bin / BINS_PER_ROOT) ** 2;

/**
 * The forecast storm at a row of times: 1-minute 10 m marine wind (kt) by quadrant (NE SE SW NW) and radius, laid out
 * `[node][quadrant][bin]` in `windKt`, and its greatest over the quadrants in `envelopeKt`, `[node][bin]`.
 */
export interface StormTable {
  leadHours: Float64Array;
  windKt: Float32Array;
  envelopeKt: Float32Array;
  maxWindKt: Float64Array;
  radiusMaxWindKm: Float64Array;
  lat: Float64Array;
  lon: Float64Array;
}

/** Node times from the track's first to its last moment, `stepHours` apart; the last step may be shorter. */
export function nodeLeads(track: Track, stepHours: number): Float64Array {
  const steps = Math.max(1, Math.ceil((track.endLeadHours - track.startLeadHours) / stepHours - 1e-9));
  return Float64Array.from({ length: steps + 1 }, (_, i) => Math.min(track.startLeadHours + i * stepHours, track.endLeadHours));
}

export function tabulateStorm(track: Track, leadHours: Float64Array): StormTable {
  const nodes = leadHours.length;
  const table: StormTable = {
    leadHours,
    windKt: new Float32Array(nodes * QUADRANTS * BINS),
    envelopeKt: new Float32Array(nodes * BINS),
    maxWindKt: new Float64Array(nodes),
    radiusMaxWindKm: new Float64Array(nodes),
    lat: new Float64Array(nodes),
    lon: new Float64Array(nodes),
  };
  for (let i = 0; i < nodes; i++) {
    const storm = stormAt(track, leadHours[i]);
    if (!storm) throw new RangeError(`No storm at lead ${leadHours[i]} h: the track runs from ${track.startLeadHours} to ${track.endLeadHours} h.`);
    table.maxWindKt[i] = storm.maxWindKt;
    table.radiusMaxWindKm[i] = storm.radiusMaxWindKm;
    table.lat[i] = storm.lat;
    table.lon[i] = storm.lon;
    const profiles = quadrantProfiles(storm);
    for (let q = 0; q < QUADRANTS; q++) {
      const row = (i * QUADRANTS + q) * BINS;
      // The two outermost bins stay zero, so that a lookup at the edge needs no test.
      for (let bin = 0; bin < BINS - 2; bin++) {
        const windKt = profileKt(profiles, q, binRadius(bin) * storm.radiusMaxWindKm);
        table.windKt[row + bin] = windKt;
        if (windKt > table.envelopeKt[i * BINS + bin]) table.envelopeKt[i * BINS + bin] = windKt;
      }
    }
  }
  return table;
}
