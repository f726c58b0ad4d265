// Node 20 does not hand a loader given on the command line to its workers: this file registers it inside one.
import { tsImport } from 'tsx/esm/api';

export const { inspectLayer, compile, track, sample, chunk, gridChunk, assemble } = await tsImport('./worker.ts', import.meta.url);
