import { THRESHOLDS_KT } from '../units';
import type { Places } from './blocks';
import type { Lattice } from './lattice';
import type { Passage } from './passage';

/**
 * One member over the corners of a lattice, read off at the places between them. Corners carry the peak over water and, for each
 * surface that stands on the block, first and last time of each threshold; a threshold that only some of a place's corners reach
 * takes its times from those.
 */
export class LatticePassage {
  /** The answer of the last `at`: thresholds reached (0 to 3), and times (lead hours) of those. */
  readonly arrival = new Float64Array(3);
  readonly end = new Float64Array(3);

  private readonly lattice: Lattice;
  private readonly passage: Passage;
  /** Thresholds over water for each surface: `[surface * 3 + t]`. */
  private readonly kt: Float64Array;
  private readonly surfaces: number;
  private readonly surfaceOf: Uint8Array;
  private readonly peak: Float32Array;
  /** `[(corner * surfaces + surface) * 3 + t]`, NaN for never. */
  private readonly arrivals: Float32Array;
  private readonly ends: Float32Array;

  constructor(lattice: Lattice, passage: Passage, places: Places, from: number, to: number) {
    this.lattice = lattice;
    this.passage = passage;
    const factors = [...new Set(places.surfaceFactor.subarray(from, to))].sort((a, b) => b - a);
    this.surfaces = factors.length;
    this.surfaceOf = Uint8Array.from(places.surfaceFactor.subarray(from, to), (factor) => factors.indexOf(factor));
    this.kt = Float64Array.from(factors.flatMap((factor) => THRESHOLDS_KT.map((kt) => kt / factor)));
    this.peak = new Float32Array(lattice.count);
    this.arrivals = new Float32Array(lattice.count * factors.length * 3);
    this.ends = new Float32Array(lattice.count * factors.length * 3);
  }

  /** Member `member` over all corners, nodes `first` to `last`. False: no corner reaches the paths' limit. */
  over(member: number, first: number, last: number): boolean {
    const { lattice, passage, surfaces, kt } = this;
    let any = false;
    for (let c = 0; c < lattice.count; c++) {
      const o = c * 3;
      const reaches = passage.over(member, first, last, lattice.xyz[o], lattice.xyz[o + 1], lattice.xyz[o + 2]);
      this.peak[c] = passage.peakKt;
      any ||= reaches;
      for (let s = 0; s < surfaces; s++) {
        const to = (c * surfaces + s) * 3;
        passage.cross(kt[s * 3], kt[s * 3 + 1], kt[s * 3 + 2]);
        for (let t = 0; t < 3; t++) {
          this.arrivals[to + t] = passage.arrival[t];
          this.ends[to + t] = passage.end[t];
        }
      }
    }
    return any;
  }

  /** How many thresholds the member reaches at place `i` of the block (0 to 3); fills their times. */
  at(i: number): number {
    const { lattice, peak, kt, surfaces } = this;
    const { corner, weight } = lattice;
    const o = i * 4;
    const wind = weight[o] * peak[corner[o]] + weight[o + 1] * peak[corner[o + 1]] + weight[o + 2] * peak[corner[o + 2]] + weight[o + 3] * peak[corner[o + 3]];
    const surface = this.surfaceOf[i];
    let t = 0;
    for (; t < 3 && wind >= kt[surface * 3 + t]; t++) {
      let sum = 0;
      let arrival = 0;
      let end = 0;
      for (let k = 0; k < 4; k++) {
        const at = (corner[o + k] * surfaces + surface) * 3 + t;
        const time = this.arrivals[at];
        if (time !== time) continue;
        const w = weight[o + k];
        sum += w;
        arrival += w * time;
        end += w * this.ends[at];
      }
      if (sum === 0) break;
      this.arrival[t] = arrival / sum;
      this.end[t] = end / sum;
    }
    return t;
  }
}
