import type { MemberChunk } from '../../lib/hazard';
import type { ExposureHandle } from './exposureHandle';
import type { Pool } from './pool';
import type { Sampled } from './tasks';

/** Blocks a task takes: small enough that a newer advisory waits little, and that progress is seen. */
const BLOCKS_PER_TASK = 2;
const TILES_PER_TASK = 12;

interface Parts {
  chunks: MemberChunk[];
  gridCounts: Uint16Array[];
}

/**
 * Shares the members' work out over the pool, a few tasks at a time. `check` throws to stop; `progress` counts tasks.
 * Answers come back in the order of the blocks, so the result does not depend on the number of threads.
 */
export async function runMembers(pool: Pool, sampled: Sampled, exposure: ExposureHandle, check: () => void, progress: (done: number, of: number) => void): Promise<Parts> {
  const ranges = rangesOf(exposure.targets.blocks.count, BLOCKS_PER_TASK);
  const gridRanges = rangesOf(sampled.grid?.blocks.count ?? 0, TILES_PER_TASK);
  const of = ranges.length + gridRanges.length;
  const parts: Parts = { chunks: new Array(ranges.length), gridCounts: new Array(gridRanges.length) };
  let next = 0;
  let done = 0;
  const work = async (): Promise<void> => {
    while (next < of) {
      check();
      const k = next++;
      if (k < ranges.length) parts.chunks[k] = await pool.chunk({ sampled, exposure, ...ranges[k] });
      else parts.gridCounts[k - ranges.length] = await pool.gridChunk({ sampled, ...gridRanges[k - ranges.length] });
      progress(++done, of);
    }
  };
  await Promise.all(Array.from({ length: pool.threads + 1 }, work));
  return parts;
}

function rangesOf(blocks: number, perTask: number): { firstBlock: number; lastBlock: number }[] {
  return Array.from({ length: Math.ceil(blocks / perTask) }, (_, k) => ({
    firstBlock: k * perTask,
    lastBlock: Math.min(blocks, (k + 1) * perTask),
  }));
}
