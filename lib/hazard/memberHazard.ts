import { activeWindow } from './blocks';
import type { Blocks, Places } from './blocks';
import { makeLattice } from './lattice';
import { LatticePassage } from './latticePassage';
import { Passage, QUICKLY } from './passage';
import type { Paths } from './paths';
import { histogramQuantile, LEAST_CHANCE_FOR_TIMES, QUANTILES, TIME_BIN_HOURS } from './quantiles';
import type { StormTable } from './stormTable';

/** Places, and what stands on them. */
export interface Targets {
  places: Places;
  blocks: Blocks;
  /** Thousandths of a person at each place, whole numbers: their sums are exact in any order. */
  milliPeople: Float64Array;
  /** Zone of each place, -1 for none. */
  zone: Int32Array;
  /** Asset of each place, -1 for none; an asset's places are neighbours. */
  asset: Int32Array;
  /** Class of each asset. */
  assetClass: Uint16Array;
  zoneCount: number;
  classCount: number;
}

/** Spacing of the lattice on which a member's wind is computed; places between its corners take it from there. */
const LATTICE_KM = 5;

/** Early, median and late arrival, then early, median and late end. */
export const MOMENTS = 6;

/**
 * Members over a run of blocks. `t` is the threshold (34, 50, 64 kt), `m` the member; times are lead hours.
 * Joint values are per member, so that totals keep what happens together.
 */
export interface MemberChunk {
  members: number;
  /** Assets of these blocks, and for each `[k * 3 + t]` in how many members it is reached. */
  assets: Uint32Array;
  reached: Uint16Array;
  /** `[(k * 3 + t) * MOMENTS]`, NaN where too few members reach it. */
  moments: Float32Array;
  /** Zones with places in these blocks, and `[(k * 3 + t) * members + m]`: first arrival anywhere in zone k (+Infinity: never), last end (-Infinity), people reached. */
  zones: Uint32Array;
  zoneArrival: Float32Array;
  zoneEnd: Float32Array;
  zoneMilliPeople: Float64Array;
  /** `[t * members + m]`, all people, in zones or not. */
  milliPeople: Float64Array;
  /** `[(class * 3 + t) * members + m]`, assets reached. */
  classReached: Uint32Array;
}

export function memberHazard(table: StormTable, paths: Paths, targets: Targets, firstBlock: number, lastBlock: number): MemberChunk {
  const { places, blocks, milliPeople, zone, asset, assetClass, classCount } = targets;
  const members = paths.count;
  const startLead = table.leadHours[0];
  const bins = Math.ceil((table.leadHours[table.leadHours.length - 1] - startLead) / TIME_BIN_HOURS) + 1;
  const assetsHere = assetsOf(targets, firstBlock, lastBlock);
  const { zonesHere, slotOf } = zonesOf(targets, firstBlock, lastBlock);
  const chunk: MemberChunk = {
    members,
    assets: assetsHere,
    reached: new Uint16Array(assetsHere.length * 3),
    moments: new Float32Array(assetsHere.length * 3 * MOMENTS).fill(NaN),
    zones: zonesHere,
    zoneArrival: new Float32Array(zonesHere.length * 3 * members).fill(Infinity),
    zoneEnd: new Float32Array(zonesHere.length * 3 * members).fill(-Infinity),
    zoneMilliPeople: new Float64Array(zonesHere.length * 3 * members),
    milliPeople: new Float64Array(3 * members),
    classReached: new Uint32Array(classCount * 3 * members),
  };
  const passage = new Passage(table, paths, QUICKLY);
  const window = { first: 0, last: 0 };
  const assetArrival = new Float64Array(3);
  const assetEnd = new Float64Array(3);
  let arrivalBins = new Uint16Array(0);
  let endBins = new Uint16Array(0);
  let firstAsset = 0;

  for (let block = firstBlock; block < lastBlock; block++) {
    const from = blocks.start[block];
    const to = blocks.start[block + 1];
    const owned = countAssets(asset, from, to);
    const lattice = new LatticePassage(makeLattice(places, blocks, block, LATTICE_KM), passage, places, from, to);
    if (arrivalBins.length < owned * 3 * bins) {
      arrivalBins = new Uint16Array(owned * 3 * bins);
      endBins = new Uint16Array(owned * 3 * bins);
    } else {
      arrivalBins.fill(0);
      endBins.fill(0);
    }
    for (let m = 0; m < members; m++) {
      activeWindow(paths, m, blocks, block, window);
      if (window.first >= window.last || !lattice.over(m, window.first, window.last)) continue;
      let k = -1;
      for (let i = from; i < to; i++) {
        const owner = asset[i];
        const opens = owner >= 0 && (i === from || asset[i - 1] !== owner);
        const closes = owner >= 0 && (i + 1 === to || asset[i + 1] !== owner);
        if (opens) {
          k++;
          assetArrival.fill(Infinity);
          assetEnd.fill(-Infinity);
        }
        const reached = lattice.reachedAt(i - from);
        for (let t = 0; t < reached; t++) {
          if (owner >= 0) {
            if (!lattice.mayWiden(i - from, t, assetArrival[t], assetEnd[t])) continue;
            lattice.timesAt(i - from, t);
            if (lattice.arrival[t] < assetArrival[t]) assetArrival[t] = lattice.arrival[t];
            if (lattice.end[t] > assetEnd[t]) assetEnd[t] = lattice.end[t];
            continue;
          }
          chunk.milliPeople[t * members + m] += milliPeople[i];
          if (zone[i] < 0) continue;
          const z = (slotOf[zone[i]] * 3 + t) * members + m;
          chunk.zoneMilliPeople[z] += milliPeople[i];
          if (!lattice.mayWiden(i - from, t, chunk.zoneArrival[z], chunk.zoneEnd[z])) continue;
          lattice.timesAt(i - from, t);
          if (lattice.arrival[t] < chunk.zoneArrival[z]) chunk.zoneArrival[z] = lattice.arrival[t];
          if (lattice.end[t] > chunk.zoneEnd[z]) chunk.zoneEnd[z] = lattice.end[t];
        }
        if (closes) {
          for (let t = 0; t < 3 && assetArrival[t] < Infinity; t++) {
            chunk.reached[(firstAsset + k) * 3 + t]++;
            chunk.classReached[(assetClass[owner] * 3 + t) * members + m]++;
            const row = (k * 3 + t) * bins;
            arrivalBins[row + (((assetArrival[t] - startLead) / TIME_BIN_HOURS) | 0)]++;
            endBins[row + (((assetEnd[t] - startLead) / TIME_BIN_HOURS) | 0)]++;
          }
        }
      }
    }
    for (let k = 0; k < owned; k++) {
      for (let t = 0; t < 3; t++) {
        const at = (firstAsset + k) * 3 + t;
        const reached = chunk.reached[at];
        if (reached < LEAST_CHANCE_FOR_TIMES * members || reached === 0) continue;
        for (let q = 0; q < 3; q++) {
          chunk.moments[at * MOMENTS + q] = startLead + histogramQuantile(arrivalBins, (k * 3 + t) * bins, bins, reached, QUANTILES[q]);
          chunk.moments[at * MOMENTS + 3 + q] = startLead + histogramQuantile(endBins, (k * 3 + t) * bins, bins, reached, QUANTILES[q]);
        }
      }
    }
    firstAsset += owned;
  }
  return chunk;
}

function countAssets(asset: Int32Array, from: number, to: number): number {
  let count = 0;
  for (let i = from; i < to; i++) if (asset[i] >= 0 && (i === from || asset[i - 1] !== asset[i])) count++;
  return count;
}

/** The zones of a run of blocks, rising, and each zone's place among them. */
function zonesOf({ zone, blocks, zoneCount }: Targets, firstBlock: number, lastBlock: number): { zonesHere: Uint32Array; slotOf: Int32Array } {
  const slotOf = new Int32Array(zoneCount).fill(-1);
  for (let i = blocks.start[firstBlock]; i < blocks.start[lastBlock]; i++) if (zone[i] >= 0) slotOf[zone[i]] = 0;
  const zonesHere = Uint32Array.from(slotOf.keys()).filter((z) => slotOf[z] === 0);
  zonesHere.forEach((z, slot) => (slotOf[z] = slot));
  return { zonesHere, slotOf };
}

function assetsOf({ asset, blocks }: Targets, firstBlock: number, lastBlock: number): Uint32Array {
  const found: number[] = [];
  for (let i = blocks.start[firstBlock]; i < blocks.start[lastBlock]; i++) if (asset[i] >= 0 && (i === 0 || asset[i - 1] !== asset[i])) found.push(asset[i]);
  return Uint32Array.from(found);
}
