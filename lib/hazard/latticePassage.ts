import { THRESHOLDS_KT } from '../units';
import type { Places } from './blocks';
import type { Lattice } from './lattice';
import type { Passage } from './passage';

/**
 * One member over the corners of a lattice, read off at the places between them. Corners carry the peak over water and, for each
 * surface that stands on the block, first and last time of each threshold. A square says how many thresholds all its corners
 * reach, and how many some do: most places are then settled without reading a wind. A threshold that only some of a place's corners
 * reach takes its times from those.
 */
export class LatticePassage {
  /** Times (lead hours) of the thresholds that the last `at` found reached. */
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
  /** `[square * surfaces + surface]`: thresholds reached at every corner, and at any. */
  private readonly everywhere: Uint8Array;
  private readonly anywhere: Uint8Array;
  /** `[(square * surfaces + surface) * 3 + t]`: no place in the square is reached sooner, or left later. */
  private readonly soonest: Float32Array;
  private readonly latest: Float32Array;

  constructor(lattice: Lattice, passage: Passage, places: Places, from: number, to: number) {
    this.lattice = lattice;
    this.passage = passage;
    const factors = [...new Set(places.surfaceFactor.subarray(from, to))].sort((a, b) => b - a);
    const surfaces = factors.length;
    this.surfaces = surfaces;
    this.surfaceOf = Uint8Array.from(places.surfaceFactor.subarray(from, to), (factor) => factors.indexOf(factor));
    this.kt = Float64Array.from(factors.flatMap((factor) => THRESHOLDS_KT.map((kt) => kt / factor)));
    this.peak = new Float32Array(lattice.count);
    this.arrivals = new Float32Array(lattice.count * surfaces * 3);
    this.ends = new Float32Array(lattice.count * surfaces * 3);
    this.everywhere = new Uint8Array(lattice.squares * surfaces);
    this.anywhere = new Uint8Array(lattice.squares * surfaces);
    this.soonest = new Float32Array(lattice.squares * surfaces * 3);
    this.latest = new Float32Array(lattice.squares * surfaces * 3);
  }

  /** Member `member` over all corners, nodes `first` to `last`. False: it reaches no threshold at any corner. */
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
    if (any) this.settleSquares();
    return any;
  }

  private settleSquares(): void {
    const { lattice, surfaces, arrivals, ends } = this;
    for (let q = 0; q < lattice.squares; q++) {
      for (let s = 0; s < surfaces; s++) {
        let everywhere = 0;
        let anywhere = 0;
        for (let t = 0; t < 3; t++) {
          let reached = 0;
          let soonest = Infinity;
          let latest = -Infinity;
          for (let k = 0; k < 4; k++) {
            const at = (lattice.corner[q * 4 + k] * surfaces + s) * 3 + t;
            if (arrivals[at] !== arrivals[at]) continue;
            reached++;
            if (arrivals[at] < soonest) soonest = arrivals[at];
            if (ends[at] > latest) latest = ends[at];
          }
          if (reached === 4) everywhere = t + 1;
          if (reached > 0) anywhere = t + 1;
          this.soonest[(q * surfaces + s) * 3 + t] = soonest;
          this.latest[(q * surfaces + s) * 3 + t] = latest;
        }
        this.everywhere[q * surfaces + s] = everywhere;
        this.anywhere[q * surfaces + s] = anywhere;
      }
    }
  }

  /** How many thresholds the member reaches at place `i` of the block, 0 to 3. */
  reachedAt(i: number): number {
    const { lattice, peak, kt, surfaces } = this;
    const surface = this.surfaceOf[i];
    const q = lattice.square[i];
    const most = this.anywhere[q * surfaces + surface];
    let t = this.everywhere[q * surfaces + surface];
    if (t === most) return t;
    const { corner, weight } = lattice;
    const c = q * 4;
    const w = i * 4;
    const wind = weight[w] * peak[corner[c]] + weight[w + 1] * peak[corner[c + 1]] + weight[w + 2] * peak[corner[c + 2]] + weight[w + 3] * peak[corner[c + 3]];
    while (t < most && wind >= kt[surface * 3 + t]) t++;
    return t;
  }

  /** Whether times at place `i` could lie outside `arrival` to `end`: a quick look that spares most of `timesAt`. */
  mayWiden(i: number, t: number, arrival: number, end: number): boolean {
    const at = (this.lattice.square[i] * this.surfaces + this.surfaceOf[i]) * 3 + t;
    return this.soonest[at] < arrival || this.latest[at] > end;
  }

  /** Fills `arrival[t]` and `end[t]` for a threshold reached at place `i`. */
  timesAt(i: number, t: number): void {
    const { lattice, surfaces, arrivals, ends } = this;
    const surface = this.surfaceOf[i];
    const c = lattice.square[i] * 4;
    const w = i * 4;
    let sum = 0;
    let arrival = 0;
    let end = 0;
    for (let k = 0; k < 4; k++) {
      const at = (lattice.corner[c + k] * surfaces + surface) * 3 + t;
      const time = arrivals[at];
      if (time !== time) continue;
      const weight = lattice.weight[w + k];
      sum += weight;
      arrival += weight * time;
      end += weight * ends[at];
    }
    // Between a corner that is reached and three that are not, weights can vanish: then the square's own times stand in.
    const square = (lattice.square[i] * surfaces + surface) * 3 + t;
    this.arrival[t] = sum > 1e-6 ? arrival / sum : this.soonest[square];
    this.end[t] = sum > 1e-6 ? end / sum : this.latest[square];
  }
}
