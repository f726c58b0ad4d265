import type { MemberChunk } from '../hazard';
import { MOMENTS } from '../hazard';

/** All members over all places: the chunks of a run put together. Layouts as in MemberChunk, assets by their own number. */
export interface MemberSummary {
  members: number;
  reached: Uint16Array;
  moments: Float32Array;
  zoneArrival: Float32Array;
  zoneEnd: Float32Array;
  zoneMilliPeople: Float64Array;
  milliPeople: Float64Array;
  classReached: Uint32Array;
}

export interface SummarySize {
  members: number;
  assets: number;
  zones: number;
  classes: number;
}

/** Sums, first arrivals and last ends do not depend on how the places were cut into chunks. */
export function mergeChunks(chunks: readonly MemberChunk[], { members, assets, zones, classes }: SummarySize): MemberSummary {
  const summary: MemberSummary = {
    members,
    reached: new Uint16Array(assets * 3),
    moments: new Float32Array(assets * 3 * MOMENTS).fill(NaN),
    zoneArrival: new Float32Array(zones * 3 * members).fill(Infinity),
    zoneEnd: new Float32Array(zones * 3 * members).fill(-Infinity),
    zoneMilliPeople: new Float64Array(zones * 3 * members),
    milliPeople: new Float64Array(3 * members),
    classReached: new Uint32Array(classes * 3 * members),
  };
  for (const chunk of chunks) {
    chunk.assets.forEach((asset, k) => {
      summary.reached.set(chunk.reached.subarray(k * 3, k * 3 + 3), asset * 3);
      summary.moments.set(chunk.moments.subarray(k * 3 * MOMENTS, (k + 1) * 3 * MOMENTS), asset * 3 * MOMENTS);
    });
    add(summary.milliPeople, chunk.milliPeople);
    add(summary.classReached, chunk.classReached);
    const row = 3 * members;
    chunk.zones.forEach((zone, k) => {
      for (let i = 0; i < row; i++) {
        const into = zone * row + i;
        const from = k * row + i;
        summary.zoneMilliPeople[into] += chunk.zoneMilliPeople[from];
        if (chunk.zoneArrival[from] < summary.zoneArrival[into]) summary.zoneArrival[into] = chunk.zoneArrival[from];
        if (chunk.zoneEnd[from] > summary.zoneEnd[into]) summary.zoneEnd[into] = chunk.zoneEnd[from];
      }
    });
  }
  return summary;
}

function add(into: Float64Array | Uint32Array, values: Float64Array | Uint32Array): void {
  for (let i = 0; i < values.length; i++) into[i] += values[i];
}
