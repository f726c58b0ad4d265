import type { Pool } from '../../../server/compute/pool';
import { assemble, chunk, compile, gridChunk, inspectLayer, sample, track } from '../../../server/compute/worker';

/** The compute tasks without threads. */
export const here: Pool = {
  threads: 1,
  inspectLayer: async (task) => inspectLayer(task),
  compile: async (task) => compile(task),
  track: async (task) => track(task),
  sample: async (task) => sample(task),
  chunk: async (task) => chunk(task),
  gridChunk: async (task) => gridChunk(task),
  assemble: async (task) => assemble(task),
  close: async () => {},
};
