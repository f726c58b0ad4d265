import { THRESHOLDS_KT } from '../units';
import { activeWindow } from './blocks';
import type { Blocks, Places } from './blocks';
import { Passage, QUICKLY } from './passage';
import type { Paths } from './paths';
import type { StormTable } from './stormTable';

/** In how many members each threshold is reached over water at each place of a run of blocks: `[(place - start of first block) * 3 + t]`. */
export function chanceOnGrid(table: StormTable, paths: Paths, places: Places, blocks: Blocks, firstBlock: number, lastBlock: number): Uint16Array {
  const offset = blocks.start[firstBlock];
  const counts = new Uint16Array((blocks.start[lastBlock] - offset) * 3);
  const passage = new Passage(table, paths, QUICKLY);
  const window = { first: 0, last: 0 };
  const [kt34, kt50, kt64] = THRESHOLDS_KT;
  for (let block = firstBlock; block < lastBlock; block++) {
    for (let m = 0; m < paths.count; m++) {
      activeWindow(paths, m, blocks, block, window);
      if (window.first >= window.last) continue;
      for (let i = blocks.start[block]; i < blocks.start[block + 1]; i++) {
        const o = i * 3;
        if (!passage.over(m, window.first, window.last, places.xyz[o], places.xyz[o + 1], places.xyz[o + 2])) continue;
        const c = (i - offset) * 3;
        if (passage.peakKt >= kt34) counts[c]++;
        if (passage.peakKt >= kt50) counts[c + 1]++;
        if (passage.peakKt >= kt64) counts[c + 2]++;
      }
    }
  }
  return counts;
}
