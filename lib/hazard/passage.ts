import { EARTH_RADIUS_KM } from '../geo';
import { FRAME } from './paths';
import type { Paths } from './paths';
import { BINS, BINS_PER_ROOT, QUADRANTS } from './stormTable';
import type { StormTable } from './stormTable';

/** The core reaches to twice the radius of maximum wind; distances here are roots, in radii of maximum wind. */
const CORE_ROOT = Math.SQRT2;
const EDGE_STEPS = 2;

/** How closely a passage is looked at. */
export interface Care {
  /** Intervals that touch the core are cut this many times: across the eye the wind rises, falls and rises within the hour. */
  coreCuts: number;
  /** A crossing is found when the wind there is this close to the threshold (kt), or after so many steps. */
  closeKt: number;
  mostSteps: number;
}

/** For the forecast: every place, once. */
export const CLOSELY: Care = { coreCuts: 12, closeKt: 0.01, mostSteps: 8 };
/** For one of a thousand members. */
export const QUICKLY: Care = { coreCuts: 6, closeKt: 0.25, mostSteps: 3 };


const NE = 0;
const SE = 1;
const SW = 2;
const NW = 3;

/**
 * One storm path passing one place: the kernel. Fields hold the answer of the last call: winds in kt at 10 m over water,
 * times in lead hours, NaN for "never".
 *
 * The wind is evaluated at the nodes within reach, more often near the core, at the top of each rise, and once more beside each
 * crossing of a threshold, so that times hang little on how far apart the nodes are.
 */
export class Passage {
  peakKt = 0;
  peakLead = NaN;
  readonly arrival = new Float64Array(3);
  readonly end = new Float64Array(3);

  private readonly table: StormTable;
  private readonly paths: Paths;
  private readonly care: Care;
  private readonly times: Float64Array;
  private readonly winds: Float64Array;
  private samples = 0;
  private base = 0;
  private px = 0;
  private py = 0;
  private pz = 0;
  /** Root of the distance at the last look-up, in radii of maximum wind of the quadrant that weighs most. */
  private lastRoot = 0;
  private edgeKt = 0;

  constructor(table: StormTable, paths: Paths, care: Care) {
    this.table = table;
    this.paths = paths;
    this.care = care;
    // An interval asks for its end, its cuts and a crossing of the radius of maximum wind in each.
    const samples = paths.nodes * (2 * care.coreCuts + 1);
    this.times = new Float64Array(samples);
    this.winds = new Float64Array(samples);
  }

  /**
   * Path `path` past the place with unit vector (x, y, z), nodes `first` to `last`: sets the peak, and is ready to be asked for
   * crossings. Returns false when the wind stays under the paths' limit.
   */
  over(path: number, first: number, last: number, x: number, y: number, z: number): boolean {
    this.base = path * this.paths.nodes;
    this.px = x;
    this.py = y;
    this.pz = z;
    this.samples = this.sample(first, last);
    return this.peakKt >= this.paths.limitKt;
  }

  /** First and last time at or above three rising thresholds (kt over water) in the passage last looked at. */
  cross(kt34: number, kt50: number, kt64: number): void {
    this.crossOne(0, kt34);
    this.crossOne(1, kt50);
    this.crossOne(2, kt64);
  }

  /** Fills times (in nodes) and winds; returns how many. Sets the peak. */
  private sample(first: number, last: number): number {
    const { times, winds } = this;
    const { coreCuts } = this.care;
    let n = 0;
    let peak = 0;
    let peakAt = NaN;
    let before = 0;
    let here = this.windAtNode(first);
    let hereRoot = this.lastRoot;
    times[n] = first;
    winds[n++] = here;
    if (here > peak) {
      peak = here;
      peakAt = first;
    }
    for (let i = first; i < last; i++) {
      const next = this.windAtNode(i + 1);
      const nextRoot = this.lastRoot;
      if (hereRoot < CORE_ROOT || nextRoot < CORE_ROOT) {
        let root = hereRoot;
        for (let cut = 1; cut <= coreCuts; cut++) {
          const wind = cut < coreCuts ? this.windBetween(i, cut / coreCuts) : next;
          const cutRoot = cut < coreCuts ? this.lastRoot : nextRoot;
          if (root < 1 !== cutRoot < 1) {
            // The wind is greatest just as the place crosses the radius of maximum wind.
            const f = this.coreEdge(i, (cut - 1) / coreCuts, root, cut / coreCuts, cutRoot);
            times[n] = i + f;
            winds[n++] = this.edgeKt;
            if (this.edgeKt > peak) {
              peak = this.edgeKt;
              peakAt = i + f;
            }
          }
          root = cutRoot;
          if (cut === coreCuts) break;
          times[n] = i + cut / coreCuts;
          winds[n++] = wind;
          if (wind > peak) {
            peak = wind;
            peakAt = times[n - 1];
          }
        }
      } else if (i > first && here > before && here >= next) {
        // The top of a rise: the parabola through three nodes says where.
        const shift = (0.5 * (before - next)) / (before - 2 * here + next);
        if (shift > 0.02 || shift < -0.02) {
          const wind = shift > 0 ? this.windBetween(i, shift) : this.windBetween(i - 1, 1 + shift);
          if (wind > here && (shift > 0 || times[n - 2] < i + shift)) {
            if (shift > 0) {
              times[n] = i + shift;
              winds[n++] = wind;
            } else {
              times[n] = times[n - 1];
              winds[n] = winds[n - 1];
              times[n - 1] = i + shift;
              winds[n - 1] = wind;
              n++;
            }
            if (wind > peak) {
              peak = wind;
              peakAt = i + shift;
            }
          }
        }
      }
      times[n] = i + 1;
      winds[n++] = next;
      if (next > peak) {
        peak = next;
        peakAt = i + 1;
      }
      before = here;
      here = next;
      hereRoot = nextRoot;
    }
    this.peakKt = peak;
    this.peakLead = this.lead(peakAt);
    return n;
  }

  /** Where between two cuts the place crosses the radius of maximum wind, and the strongest wind met in finding it (`edgeKt`). */
  private coreEdge(node: number, f0: number, root0: number, f1: number, root1: number): number {
    this.edgeKt = 0;
    let best = f0;
    for (let step = 0; step < EDGE_STEPS; step++) {
      const f = f0 + ((1 - root0) / (root1 - root0)) * (f1 - f0);
      const wind = this.windBetween(node, f);
      const root = this.lastRoot;
      if (wind > this.edgeKt) {
        this.edgeKt = wind;
        best = f;
      }
      if (root < 1 === root0 < 1) {
        f0 = f;
        root0 = root;
      } else {
        f1 = f;
        root1 = root;
      }
      if (root1 === root0) break;
    }
    return best;
  }

  private crossOne(index: 0 | 1 | 2, kt: number): void {
    const { times, winds, samples } = this;
    if (this.peakKt < kt) {
      this.arrival[index] = NaN;
      this.end[index] = NaN;
      return;
    }
    let rise = 0;
    while (winds[rise] < kt) rise++;
    let fall = samples - 1;
    while (winds[fall] < kt) fall--;
    this.arrival[index] = this.lead(rise === 0 ? times[0] : this.crossing(times[rise - 1], winds[rise - 1], times[rise], winds[rise], kt));
    this.end[index] = this.lead(fall === samples - 1 ? times[fall] : this.crossing(times[fall], winds[fall], times[fall + 1], winds[fall + 1], kt));
  }

  /** Where the wind passes `kt` between two samples: false position in the Illinois form (Dowell and Jarratt, 1971, BIT 11, 168-174). */
  private crossing(t0: number, w0: number, t1: number, w1: number, kt: number): number {
    const node = Math.min(Math.floor(t0), this.paths.nodes - 2);
    let d0 = w0 - kt;
    let d1 = w1 - kt;
    let t = t0;
    const { closeKt, mostSteps } = this.care;
    for (let step = 0; step < mostSteps; step++) {
      t = t0 - (d0 * (t1 - t0)) / (d1 - d0);
      const d = this.windBetween(node, t - node) - kt;
      if (d < closeKt && d > -closeKt) return t;
      if (d > 0 === d1 > 0) {
        t1 = t;
        d1 = d;
        d0 *= 0.5;
      } else {
        t0 = t;
        d0 = d;
        d1 *= 0.5;
      }
    }
    return t;
  }

  /** Lead hours at a time counted in nodes. */
  private lead(nodeTime: number): number {
    const { leadHours } = this.table;
    const i = Math.min(Math.floor(nodeTime), leadHours.length - 2);
    return leadHours[i] + (nodeTime - i) * (leadHours[i + 1] - leadHours[i]);
  }

  private windAtNode(i: number): number {
    const { frame, ratio, perRootSize, reachSin2 } = this.paths;
    const at = this.base + i;
    const o = at * FRAME;
    const east = this.px * frame[o + 3] + this.py * frame[o + 4];
    const north = this.px * frame[o + 5] + this.py * frame[o + 6] + this.pz * frame[o + 7];
    // Beyond reach the wind is under the limit: how much under does not matter.
    if (east * east + north * north > reachSin2[at]) {
      this.lastRoot = Infinity;
      return 0;
    }
    return ratio[at] * this.lookUp(i, east, north, perRootSize[at]);
  }

  private windBetween(i: number, f: number): number {
    const { frame, ratio, perRootSize } = this.paths;
    const at = this.base + i;
    const o = at * FRAME;
    const p = o + FRAME;
    const east0 = this.px * frame[o + 3] + this.py * frame[o + 4];
    const east1 = this.px * frame[p + 3] + this.py * frame[p + 4];
    const north0 = this.px * frame[o + 5] + this.py * frame[o + 6] + this.pz * frame[o + 7];
    const north1 = this.px * frame[p + 5] + this.py * frame[p + 6] + this.pz * frame[p + 7];
    const east = east0 + f * (east1 - east0);
    const north = north0 + f * (north1 - north0);
    const perRoot = perRootSize[at] + f * (perRootSize[at + 1] - perRootSize[at]);
    const wind0 = this.lookUp(i, east, north, perRoot);
    const wind1 = this.lookUp(i + 1, east, north, perRoot);
    return (ratio[at] + f * (ratio[at + 1] - ratio[at])) * (wind0 + f * (wind1 - wind0));
  }

  /**
   * Wind of the tabulated storm at a place seen from its centre: `east` and `north` are the place's components in the centre's
   * frame, so that their length is the sine of the angular distance and their direction the azimuth. Neighbouring quadrants are
   * blended with squared-cosine weights, exact at NE, SE, SW and NW.
   */
  private lookUp(node: number, east: number, north: number, perRootSize: number): number {
    const { windKt, perRootKm } = this.table;
    const sin2 = east * east + north * north;
    const sin = Math.sqrt(sin2);
    const root = Math.sqrt(EARTH_RADIUS_KM * sin * (1 + sin2 * (1 / 6 + sin2 * 0.075))) * perRootSize;
    const k = sin2 > 0 ? (2 * east * north) / sin2 : 0;
    let first: number;
    let second: number;
    if (Math.abs(east) >= Math.abs(north)) {
      first = node * QUADRANTS + (east > 0 ? NE : SW);
      second = node * QUADRANTS + (east > 0 ? SE : NW);
    } else {
      first = node * QUADRANTS + (north > 0 ? NE : SW);
      second = node * QUADRANTS + (north > 0 ? NW : SE);
    }
    const weight = 0.5 * (1 + k);
    const atA = root * perRootKm[first];
    const atB = root * perRootKm[second];
    this.lastRoot = (weight >= 0.5 ? atA : atB) / BINS_PER_ROOT;
    let windA = 0;
    let windB = 0;
    if (atA < BINS - 2) {
      const bin = atA | 0;
      const a = first * BINS + bin;
      windA = windKt[a] + (atA - bin) * (windKt[a + 1] - windKt[a]);
    }
    if (atB < BINS - 2) {
      const bin = atB | 0;
      const b = second * BINS + bin;
      windB = windKt[b] + (atB - bin) * (windKt[b + 1] - windKt[b]);
    }
    return windB + weight * (windA - windB);
  }
}
