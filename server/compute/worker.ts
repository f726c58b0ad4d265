/** The compute thread's tasks. Plain functions: tests call them without a thread. */
import { compileExposure, cornersOf, readLayer } from '../../lib/exposure';
import { boundsOf } from '../../lib/geo';
import { chanceOnGrid, forecastHazard, forecastPath, gridOver, gridPlaces, makeBlocks, memberHazard, memberPaths, nodeLeads, QUICKLY, reachBox, tabulateStorm, TILE_PLACES } from '../../lib/hazard';
import type { MemberChunk, StormTable } from '../../lib/hazard';
import { mergeChunks, tabulate } from '../../lib/impact';
import { PUBLISHED_ERRORS, sampleMembers } from '../../lib/members';
import { makeTrack } from '../../lib/track';
import { decodeText } from '../../lib/advisory';
import type { Advisory } from '../../lib/advisory';
import { surfaceOf } from '../../lib/wind';
import { writeAssets } from './bulk';
import { makeHandle, openHandle } from './exposureHandle';
import type { ExposureHandle } from './exposureHandle';
import { landMask } from './land';
import { arrivalSwath, chanceSwath, peakSwath } from './swath';
import { shareArrays, sharedBytes } from './shared';
import type { AssembleAnswer, AssembleTask, ChunkTask, CompileTask, GridTask, InspectTask, Inspection, Sampled, SampleTask, TrackAnswer, TrackTask } from './tasks';

const TRACK_STEP_HOURS = 1;
const MEMBER_STEP_HOURS = 2;
/** A little under the lowest threshold, so that winds between two lattice corners are known on both sides of it. */
const MEMBER_LIMIT_KT = 28;
const LAND_CELL_KM = 1;
const SEA_CELL_KM = 4;
const GRID_PLACES = 6_000;
const GRID_FINEST_KM = 8;

/** Reads a layer to say whether it may be stored: large files are parsed here, away from the event loop. */
export function inspectLayer({ kind, assetClass, bytes }: InspectTask): Inspection {
  const decoded = decodeText(bytes);
  if (!decoded.ok) return { ok: false, errors: [{ row: 1, message: decoded.message }] };
  const reading = readLayer(decoded.text, { kind, assetClass });
  if (!reading.ok) return reading;
  const counts = new Map<string, number>();
  if (reading.data.kind === 'assets') for (const asset of reading.data.assets) counts.set(asset.class, (counts.get(asset.class) ?? 0) + 1);
  return { ok: true, rows: reading.accepted, classes: Array.from(counts, ([name, count]) => ({ class: name, count })), rejected: reading.rejected };
}

/** Layers as stored, read again and put into typed arrays. Stored layers were read before, so one that fails is a fault. */
export function compile({ key, layers, coastFile }: CompileTask): ExposureHandle {
  const read = layers.map((layer) => {
    const decoded = decodeText(layer.bytes);
    const reading = decoded.ok ? readLayer(decoded.text, { kind: layer.kind, assetClass: layer.name }) : null;
    if (!reading?.ok) throw new Error(`Layer ${layer.name} (${layer.id}) was stored but cannot be read: ${reading?.errors[0]?.message ?? 'not text'}`);
    return { layerId: layer.id, data: reading.data };
  });
  const corners = read.flatMap(({ data }) => cornersOf(data));
  const bounds = boundsOf(corners.map(([, lat]) => lat), corners.map(([lon]) => lon), 1);
  if (!bounds) return makeHandle(key, compileExposure(read, () => 'open'));
  const mask = landMask(coastFile, bounds, LAND_CELL_KM);
  return makeHandle(key, compileExposure(read, (lat, lon) => surfaceOf(mask.coastDistanceKm(lat, lon))));
}

/** The forecast track: impact, asset rows and swath, without members. */
export function track({ advisory, exposure: handle, run, earlier }: TrackTask): TrackAnswer {
  const table = stormTable(advisory, TRACK_STEP_HOURS);
  const exposure = openHandle(handle);
  const hazard = forecastHazard(table, handle.targets.places, handle.targets.blocks);
  const { impact, assets } = tabulate(run, exposure, hazard, null, earlier);
  return { impact, hazard: shareArrays(hazard), bulk: { ...writeAssets(exposure, assets), ...swaths(table, run.issuedAtMs) } };
}

const SWATH_PLACES = 40_000;
const SWATH_FINEST_KM = 3;
/** The swath's grid must hold where 34 kt reaches, and a little beyond. */
const SWATH_LIMIT_KT = 30;

function swaths(table: StormTable, issuedAtMs: number): Pick<TrackAnswer['bulk'], 'peak' | 'arrival'> {
  const box = reachBox(forecastPath(table, SWATH_LIMIT_KT));
  const grid = box ? gridOver(box, SWATH_PLACES, SWATH_FINEST_KM) : gridOver({ west: 0, east: 1, south: 0, north: 1 }, 4, 100);
  const { places, gridIndex } = gridPlaces(grid);
  const hazard = forecastHazard(table, places, makeBlocks(places, null, TILE_PLACES), QUICKLY, SWATH_LIMIT_KT);
  const lastLead = table.leadHours[table.leadHours.length - 1];
  return { peak: peakSwath(grid, gridIndex, hazard), arrival: arrivalSwath(grid, gridIndex, hazard, issuedAtMs, lastLead) };
}

function stormTable(advisory: Advisory, stepHours: number): StormTable {
  const storm = makeTrack(advisory);
  return tabulateStorm(storm, nodeLeads(storm, stepHours));
}

/** Draws the members, in shared memory for the chunks that follow. */
export function sample({ advisory, members: count, seed, exposure, coastFile }: SampleTask): Sampled {
  const storm = makeTrack(advisory);
  const leads = nodeLeads(storm, MEMBER_STEP_HOURS);
  const table = shareArrays(tabulateStorm(storm, leads));
  const bounds = boundsOf(exposure.places.lat, exposure.places.lon, 6);
  const land = bounds && landMask(coastFile, bounds, SEA_CELL_KM);
  const paths = memberPaths(table, sampleMembers(storm, leads, { count, seed, model: PUBLISHED_ERRORS, land }), MEMBER_LIMIT_KT, sharedBytes);
  return { table, paths, grid: chanceGrid(paths) };
}

function chanceGrid(paths: Sampled['paths']): Sampled['grid'] {
  const box = reachBox(paths);
  if (!box) return null;
  const grid = gridOver(box, GRID_PLACES, GRID_FINEST_KM);
  const { places, gridIndex } = gridPlaces(grid);
  return { grid, places: shareArrays(places), blocks: shareArrays(makeBlocks(places, null, TILE_PLACES)), gridIndex };
}

export function chunk({ sampled, exposure, firstBlock, lastBlock }: ChunkTask): MemberChunk {
  return memberHazard(sampled.table, sampled.paths, exposure.targets, firstBlock, lastBlock);
}

export function gridChunk({ sampled, firstBlock, lastBlock }: GridTask): Uint16Array {
  return chanceOnGrid(sampled.table, sampled.paths, sampled.grid!.places, sampled.grid!.blocks, firstBlock, lastBlock);
}

/** Puts the chunks together: the impact over all members, asset rows and chance areas. */
export function assemble({ exposure: handle, run, earlier, hazard, chunks, sampled, gridCounts }: AssembleTask): AssembleAnswer {
  const exposure = openHandle(handle);
  const members = mergeChunks(chunks, { members: sampled.paths.count, assets: exposure.assets.count, zones: exposure.zones.length, classes: exposure.classes.length });
  const { impact, assets } = tabulate(run, exposure, hazard, members, earlier);
  const bulk: AssembleAnswer['bulk'] = writeAssets(exposure, assets);
  if (sampled.grid) {
    const counts = new Uint16Array(sampled.grid.places.count * 3);
    let offset = 0;
    for (const part of gridCounts) {
      counts.set(part, offset);
      offset += part.length;
    }
    const { grid, gridIndex } = sampled.grid;
    bulk.chance34 = chanceSwath(grid, gridIndex, counts, 0, sampled.paths.count);
    bulk.chance50 = chanceSwath(grid, gridIndex, counts, 1, sampled.paths.count);
    bulk.chance64 = chanceSwath(grid, gridIndex, counts, 2, sampled.paths.count);
  }
  return { impact, bulk };
}
