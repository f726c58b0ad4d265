import { setImmediate as nextTurn } from 'node:timers/promises';
import { promisify } from 'node:util';
import { gunzip, gzipSync } from 'node:zlib';
import type { Exposure } from '../../lib/exposure';
import { assetRow } from '../../lib/impact';
import type { AssetRow, AssetTable } from '../../lib/impact';

/**
 * Asset rows of one revision as bytes: gzip of a magic word, the length of a JSON head, the head, and the columns it lists.
 * The head holds what words there are and where each column starts; columns are little-endian and start at multiples of eight.
 */
const MAGIC = 'LBA1';
const TYPES = { f32: Float32Array, u16: Uint16Array, f64: Float64Array } as const;
type TypeName = keyof typeof TYPES;

interface Head {
  issuedAtMs: number;
  members: number;
  ids: string[];
  names: string[];
  layers: string[];
  layerIndex: number[];
  classes: string[];
  classIndex: number[];
  people: (number | null)[];
  columns: { name: string; type: TypeName; start: number; length: number }[];
}

const align = (bytes: number): number => Math.ceil(bytes / 8) * 8;

/** What the map draws: one entry an asset, in step. Winds rounded to whole knots. */
export interface Marks {
  id: string[];
  lon: number[];
  lat: number[];
  classes: string[];
  classIndex: number[];
  maxWindKt: number[];
}

export function writeAssets(exposure: Exposure, table: AssetTable): { assets: Uint8Array; marks: Uint8Array } {
  const { assets, classes } = exposure;
  const layers = [...new Set(assets.layer)];
  const layerNumber = new Map(layers.map((layer, i) => [layer, i]));
  const columns: [string, TypeName, Float32Array | Uint16Array | Float64Array][] = [
    ['lon', 'f64', Float64Array.from(assets.lon)],
    ['lat', 'f64', Float64Array.from(assets.lat)],
    ['peakKt', 'f32', table.peakKt],
    ['gustKt', 'f32', table.gustKt],
    ['arrival', 'f32', table.arrival],
    ['end', 'f32', table.end],
    ['reached', 'u16', table.reached],
    ['moments', 'f32', table.moments],
  ];
  let start = 0;
  const head: Head = {
    issuedAtMs: table.issuedAtMs,
    members: table.members,
    ids: assets.id,
    names: assets.name,
    layers,
    layerIndex: assets.layer.map((layer) => layerNumber.get(layer)!),
    classes,
    classIndex: Array.from(assets.classIndex),
    people: assets.people,
    columns: columns.map(([name, type, values]) => {
      const column = { name, type, start, length: values.length };
      start += align(values.byteLength);
      return column;
    }),
  };
  const words = new TextEncoder().encode(JSON.stringify(head));
  const body = align(8 + words.length);
  const bytes = new Uint8Array(body + start);
  bytes.set(new TextEncoder().encode(MAGIC));
  new DataView(bytes.buffer).setUint32(4, words.length, true);
  bytes.set(words, 8);
  columns.forEach(([, , values], i) => bytes.set(new Uint8Array(values.buffer, values.byteOffset, values.byteLength), body + head.columns[i].start));
  const marks: Marks = {
    id: assets.id,
    lon: Array.from(assets.lon),
    lat: Array.from(assets.lat),
    classes,
    classIndex: head.classIndex,
    maxWindKt: Array.from(table.peakKt, Math.round),
  };
  return { assets: gzipSync(bytes, { level: 1 }), marks: gzipSync(JSON.stringify(marks), { level: 1 }) };
}

/** Asset rows behind their bytes; a row is made when it is asked for. */
export interface AssetRows {
  count: number;
  table: AssetTable;
  layerOf(asset: number): string;
  classOf(asset: number): string;
  row(asset: number): AssetRow;
  /** Every asset in an order, which is found once. */
  inOrder(sort: AssetSort): Uint32Array;
}

const unpack = promisify(gunzip);

/** Takes its turns: unpacked beside the event loop, read in a turn of its own (some 15 ms for 50,000 assets). */
export async function openAssets(bytes: Uint8Array): Promise<AssetRows> {
  const raw = await unpack(bytes);
  const data = raw.buffer.slice(raw.byteOffset, raw.byteOffset + raw.byteLength) as ArrayBuffer;
  const magic = new TextDecoder().decode(new Uint8Array(data, 0, 4));
  if (magic !== MAGIC) throw new Error(`Asset rows start with "${magic}", expected "${MAGIC}".`);
  const length = new DataView(data).getUint32(4, true);
  const head = JSON.parse(new TextDecoder().decode(new Uint8Array(data, 8, length))) as Head;
  const body = align(8 + length);
  const column = <T>(name: string): T => {
    const found = head.columns.find((entry) => entry.name === name);
    if (!found) throw new Error(`Asset rows have no column "${name}".`);
    return new TYPES[found.type](data, body + found.start, found.length) as T;
  };
  const table: AssetTable = {
    issuedAtMs: head.issuedAtMs,
    members: head.members,
    peakKt: column('peakKt'),
    gustKt: column('gustKt'),
    arrival: column('arrival'),
    end: column('end'),
    reached: column('reached'),
    moments: column('moments'),
  };
  const lon = column<Float64Array>('lon');
  const lat = column<Float64Array>('lat');
  const layerOf = (asset: number): string => head.layers[head.layerIndex[asset]];
  const classOf = (asset: number): string => head.classes[head.classIndex[asset]];
  const orders = new Map<AssetSort, Uint32Array>();
  return {
    count: head.ids.length,
    table,
    layerOf,
    classOf,
    inOrder(sort) {
      const held = orders.get(sort) ?? assetOrder(sort, table, head);
      orders.set(sort, held);
      return held;
    },
    row: (asset) =>
      assetRow(table, asset, {
        id: head.ids[asset],
        layer: layerOf(asset),
        class: classOf(asset),
        name: head.names[asset],
        lon: lon[asset],
        lat: lat[asset],
        people: head.people[asset],
      }),
  };
}

export const ASSET_SORTS = ['name', 'class', 'maxWindKt', 'arrival'] as const;
export type AssetSort = (typeof ASSET_SORTS)[number];

/** Strongest wind first, by first arrival of 34 kt, by name or by class; equals stay as they were brought in. */
function assetOrder(sort: AssetSort, { peakKt, arrival }: AssetTable, { names, classes, classIndex }: Pick<Head, 'names' | 'classes' | 'classIndex'>): Uint32Array {
  const when = (i: number): number => (Number.isNaN(arrival[i * 3]) ? Infinity : arrival[i * 3]);
  // Far quicker than a collator made once, with the same results (Node 20).
  const inAlphabet = (a: string, b: string): number => a.localeCompare(b, 'en');
  const compare: Record<AssetSort, (a: number, b: number) => number> = {
    name: (a, b) => inAlphabet(names[a], names[b]),
    class: (a, b) => inAlphabet(classes[classIndex[a]], classes[classIndex[b]]),
    maxWindKt: (a, b) => peakKt[b] - peakKt[a],
    arrival: (a, b) => (when(a) === when(b) ? 0 : when(a) - when(b)),
  };
  const order = compare[sort];
  return Uint32Array.from(names, (_, i) => i).sort((a, b) => order(a, b) || a - b);
}

const ROWS_A_TURN = 250;

/** A page of rows in an order (strongest wind first unless said), of one layer and class where they are named. Others have their turns meanwhile. */
export async function pageOfAssets(rows: AssetRows, query: { layer?: string; class?: string; sort?: AssetSort; offset: number; limit: number }): Promise<{ items: AssetRow[]; total: number; offset: number }> {
  const order = rows.inOrder(query.sort ?? 'maxWindKt');
  await nextTurn();
  const chosen = order.filter((i) => (query.layer === undefined || rows.layerOf(i) === query.layer) && (query.class === undefined || rows.classOf(i) === query.class));
  const shown = chosen.subarray(query.offset, query.offset + query.limit);
  const items: AssetRow[] = [];
  for (const asset of shown) {
    items.push(rows.row(asset));
    if (items.length % ROWS_A_TURN === 0) await nextTurn();
  }
  return { items, total: chosen.length, offset: query.offset };
}
