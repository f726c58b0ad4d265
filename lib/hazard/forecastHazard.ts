import { THRESHOLDS_KT } from '../units';
import { activeWindow } from './blocks';
import type { Blocks, Places } from './blocks';
import { CLOSELY, Passage } from './passage';
import { forecastPath } from './paths';
import type { StormTable } from './stormTable';

/** Winds over water below this (kt) are reported as zero. */
const LIMIT_KT = 15;

/**
 * The forecast track's wind at each place: greatest sustained wind at the place's own surface (kt), when it comes, and first and
 * last time at or above each threshold. Times are lead hours, NaN for never; `[place * 3 + threshold]`.
 */
export interface PlaceHazard {
  peakKt: Float32Array;
  peakLead: Float32Array;
  arrival: Float32Array;
  end: Float32Array;
}

export function forecastHazard(table: StormTable, places: Places, blocks: Blocks, care = CLOSELY, limitKt = LIMIT_KT): PlaceHazard {
  const paths = forecastPath(table, limitKt);
  const passage = new Passage(table, paths, care);
  const hazard: PlaceHazard = {
    peakKt: new Float32Array(places.count),
    peakLead: new Float32Array(places.count).fill(NaN),
    arrival: new Float32Array(places.count * 3).fill(NaN),
    end: new Float32Array(places.count * 3).fill(NaN),
  };
  const window = { first: 0, last: 0 };
  const [kt34, kt50, kt64] = THRESHOLDS_KT;
  for (let block = 0; block < blocks.count; block++) {
    activeWindow(paths, 0, blocks, block, window);
    if (window.first >= window.last) continue;
    for (let i = blocks.start[block]; i < blocks.start[block + 1]; i++) {
      const factor = places.surfaceFactor[i];
      const o = i * 3;
      const { xyz } = places;
      if (!passage.over(0, window.first, window.last, xyz[o], xyz[o + 1], xyz[o + 2])) continue;
      passage.cross(kt34 / factor, kt50 / factor, kt64 / factor);
      hazard.peakKt[i] = passage.peakKt * factor;
      hazard.peakLead[i] = passage.peakLead;
      hazard.arrival.set(passage.arrival, o);
      hazard.end.set(passage.end, o);
    }
  }
  return hazard;
}
