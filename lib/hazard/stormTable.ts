import { profileKt, quadrantProfiles } from '../wind';
import { stormAt } from '../track';
import type { Track } from '../track';

/**
 * Bins are even in the square root of the radius, and radius is counted in the quadrant's own radius of maximum wind: the cusp of
 * the profile falls on a bin, whatever the storm's size. At 48 bins a root the outermost bin lies at 113 radii.
 */
export const BINS_PER_ROOT = 48;
export const BINS = 512;
export const QUADRANTS = 4;

/** Radius at a bin, in the quadrant's radius of maximum wind. */
export const binRadius = (bin: number): number => (bin / BINS_PER_ROOT) ** 2;

/**
 * The forecast storm at a row of times: 1-minute 10 m marine wind (kt) by quadrant (NE SE SW NW) and radius, laid out
 * `[node][quadrant][bin]` in `windKt`. `perRootKm` (`[node][quadrant]`) times the root of a radius in km is its bin.
 */
export interface StormTable {
  leadHours: Float64Array;
  windKt: Float32Array;
  perRootKm: Float64Array;
  maxWindKt: Float64Array;
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
    perRootKm: new Float64Array(nodes * QUADRANTS),
    maxWindKt: new Float64Array(nodes),
    lat: new Float64Array(nodes),
    lon: new Float64Array(nodes),
  };
  for (let i = 0; i < nodes; i++) {
    const storm = stormAt(track, leadHours[i]);
    if (!storm) throw new RangeError(`No storm at lead ${leadHours[i]} h: the track runs from ${track.startLeadHours} to ${track.endLeadHours} h.`);
    table.maxWindKt[i] = storm.maxWindKt;
    table.lat[i] = storm.lat;
    table.lon[i] = storm.lon;
    const profiles = quadrantProfiles(storm);
    for (let q = 0; q < QUADRANTS; q++) {
      const peakRadiusKm = profiles.quadrants[q].radiusKm[0];
      const row = (i * QUADRANTS + q) * BINS;
      table.perRootKm[i * QUADRANTS + q] = BINS_PER_ROOT / Math.sqrt(peakRadiusKm);
      // The two outermost bins stay zero, so that a lookup at the edge needs no test.
      for (let bin = 0; bin < BINS - 2; bin++) table.windKt[row + bin] = profileKt(profiles, q, binRadius(bin) * peakRadiusKm);
    }
  }
  return table;
}

/** Greatest radius (km) at which the storm of a node still has `limitKt` in some quadrant; 0 when it nowhere does. */
export function reachKm({ windKt, perRootKm }: StormTable, node: number, limitKt: number): number {
  let reach = 0;
  for (let q = node * QUADRANTS; q < (node + 1) * QUADRANTS; q++) {
    let bin = BINS - 3;
    while (bin >= 0 && windKt[q * BINS + bin] < limitKt) bin--;
    if (bin >= 0) reach = Math.max(reach, ((bin + 1) / perRootKm[q]) ** 2);
  }
  return reach;
}
