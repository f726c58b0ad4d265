import type { Exposure } from '../../lib/exposure';
import { placesAt, makeBlocks } from '../../lib/hazard';
import type { Targets } from '../../lib/hazard';
import { surfaceFactor } from '../../lib/wind';
import { milli, SURFACES } from '../../lib/exposure';
import { readJson, shareArrays, sharedBytes, sharedJson } from './shared';

/**
 * An exposure that threads pass around without copying: its numbers in shared memory, its words as JSON that only the thread
 * which needs them reads.
 */
export interface ExposureHandle {
  key: string;
  places: Exposure['places'];
  targets: Targets;
  words: Uint8Array;
}

type Words = Omit<Exposure, 'places' | 'assets'> & { assets: Exposure['assets'] };

const FACTORS = SURFACES.map((surface) => surfaceFactor(surface));

export function makeHandle(key: string, exposure: Exposure): ExposureHandle {
  const { places, assets, ...rest } = exposure;
  const shared = shareArrays(places);
  const factor = Float32Array.from(places.surface, (surface) => FACTORS[surface]);
  const targetPlaces = placesAt(places.lat, places.lon, factor, sharedBytes);
  const targets: Targets = {
    places: shareArrays(targetPlaces),
    blocks: shareArrays(makeBlocks(targetPlaces, places.asset)),
    milliPeople: Float64Array.from(places.people, milli),
    zone: shared.zone,
    asset: shared.asset,
    assetClass: Uint16Array.from(assets.classIndex),
    zoneCount: exposure.zones.length,
    classCount: exposure.classes.length,
  };
  return { key, places: shared, targets: shareArrays(targets), words: sharedJson({ ...rest, assets: plainArrays(assets) }) };
}

/** Typed arrays do not survive JSON as arrays. */
const plainArrays = (record: object): object =>
  Object.fromEntries(Object.entries(record).map(([key, value]) => [key, ArrayBuffer.isView(value) ? Array.from(value as unknown as ArrayLike<number>) : value]));

const KEPT = 2;
const opened = new Map<string, Exposure>();

/** The exposure behind a handle; its words are parsed once a thread. */
export function openHandle(handle: ExposureHandle): Exposure {
  const held = opened.get(handle.key);
  if (held) return held;
  const exposure: Exposure = { ...readJson<Words>(handle.words), places: handle.places };
  if (opened.size >= KEPT) opened.delete(opened.keys().next().value!);
  opened.set(handle.key, exposure);
  return exposure;
}
