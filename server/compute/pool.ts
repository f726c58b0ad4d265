import { availableParallelism } from 'node:os';
import { existsSync } from 'node:fs';
import { fileURLToPath } from 'node:url';
import { Piscina } from 'piscina';
import type { MemberChunk } from '../../lib/hazard';
import type { ExposureHandle } from './exposureHandle';
import type { AssembleAnswer, AssembleTask, ChunkTask, CompileTask, GridTask, InspectTask, Inspection, Sampled, SampleTask, TrackAnswer, TrackTask } from './tasks';

/** The compute threads, as functions. */
export interface Pool {
  readonly threads: number;
  inspectLayer(task: InspectTask): Promise<Inspection>;
  compile(task: CompileTask): Promise<ExposureHandle>;
  track(task: TrackTask): Promise<TrackAnswer>;
  sample(task: SampleTask): Promise<Sampled>;
  chunk(task: ChunkTask): Promise<MemberChunk>;
  gridChunk(task: GridTask): Promise<Uint16Array>;
  assemble(task: AssembleTask): Promise<AssembleAnswer>;
  close(): Promise<void>;
}

/** The bundled worker beside the bundled server, else (development and tests) the source through a boot file. */
function workerFile(): string {
  const bundled = fileURLToPath(new URL('./worker.js', import.meta.url));
  return existsSync(bundled) ? bundled : fileURLToPath(new URL('./boot.mjs', import.meta.url));
}

export function openPool(threads = Math.max(1, availableParallelism())): Pool {
  // Loaders given to this process are not for the threads: bundled ones need none, the boot file brings its own.
  const piscina = new Piscina({ filename: workerFile(), execArgv: [], minThreads: threads, maxThreads: threads, idleTimeout: Infinity });
  const task =
    <T, R>(name: string) =>
    (input: T): Promise<R> =>
      piscina.run(input, { name }) as Promise<R>;
  return {
    threads,
    inspectLayer: task('inspectLayer'),
    compile: task('compile'),
    track: task('track'),
    sample: task('sample'),
    chunk: task('chunk'),
    gridChunk: task('gridChunk'),
    assemble: task('assemble'),
    close: () => piscina.destroy(),
  };
}
