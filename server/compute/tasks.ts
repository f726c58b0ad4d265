import type { Advisory } from '../../lib/advisory';
import type { LayerKind, RowError } from '../../lib/exposure';
import type { Blocks, Grid, MemberChunk, Paths, PlaceHazard, Places, StormTable } from '../../lib/hazard';
import type { Earlier, Impact, RunParticulars } from '../../lib/impact';
import type { BulkName } from '../store/model';
import type { ExposureHandle } from './exposureHandle';

/** What crosses to the workers and back. Large arrays are in shared memory, or handed over. */
export interface LayerInput {
  id: string;
  kind: LayerKind;
  name: string;
  bytes: Uint8Array;
  contentType: string;
  fileName: string | null;
}

/** A layer not yet stored: is it good, and what is in it? */
export interface InspectTask {
  kind: LayerKind;
  assetClass: string;
  bytes: Uint8Array;
}

export type Inspection = { ok: true; rows: number; classes: { class: string; count: number }[]; rejected: RowError[] } | { ok: false; errors: RowError[] };

export interface CompileTask {
  key: string;
  layers: LayerInput[];
  coastFile: string | null;
}

export interface TrackTask {
  advisory: Advisory;
  exposure: ExposureHandle;
  run: RunParticulars;
  earlier: Earlier | null;
}

export interface TrackAnswer {
  impact: Omit<Impact, 'revision'>;
  bulk: Partial<Record<BulkName, Uint8Array>>;
  hazard: PlaceHazard;
}

export interface SampleTask {
  advisory: Advisory;
  members: number;
  seed: number;
  exposure: ExposureHandle;
  coastFile: string | null;
}

/** The storm and its members, and a grid to draw chances on; shared by the chunks of a run. */
export interface Sampled {
  table: StormTable;
  paths: Paths;
  grid: { grid: Grid; places: Places; blocks: Blocks; gridIndex: Uint32Array } | null;
}

export interface ChunkTask {
  sampled: Sampled;
  exposure: ExposureHandle;
  firstBlock: number;
  lastBlock: number;
}

export interface GridTask {
  sampled: Sampled;
  firstBlock: number;
  lastBlock: number;
}

export interface AssembleTask {
  exposure: ExposureHandle;
  run: RunParticulars;
  earlier: Earlier | null;
  hazard: PlaceHazard;
  chunks: MemberChunk[];
  sampled: Sampled;
  gridCounts: Uint16Array[];
}

export interface AssembleAnswer {
  impact: Omit<Impact, 'revision'>;
  bulk: Partial<Record<BulkName, Uint8Array>>;
}
