import { readFileSync } from 'node:fs';
import { fileURLToPath } from 'node:url';
import type { FeatureCollection, LineString, MultiPolygon, Polygon } from 'geojson';
import { readLayer } from '../../lib/exposure';
import type { Asset, Cells, LayerKind, Zone } from '../../lib/exposure';

export const folder = fileURLToPath(new URL('../../public/demo/', import.meta.url));
export const textOf = (file: string): string => readFileSync(`${folder}${file}`, 'utf8');
export const coast = JSON.parse(textOf('coast.geojson')) as FeatureCollection<Polygon>;
export const zoneFeatures = JSON.parse(textOf('zones.geojson')) as FeatureCollection<Polygon | MultiPolygon, Record<string, string | number>>;
export const feederFeatures = JSON.parse(textOf('feeders.geojson')) as FeatureCollection<LineString, Record<string, string | number>>;

function dataOf(file: string, kind: LayerKind) {
  const reading = readLayer(textOf(file), { kind });
  if (!reading.ok) throw new Error(`${file}: ${JSON.stringify(reading.errors.slice(0, 3))}`);
  return reading.data;
}

export function assetsOf(file: string): Asset[] {
  const data = dataOf(file, 'assets');
  if (data.kind !== 'assets') throw new Error(`${file} holds ${data.kind}`);
  return data.assets;
}

export function zonesOf(): Zone[] {
  const data = dataOf('zones.geojson', 'zones');
  if (data.kind !== 'zones') throw new Error(`zones.geojson holds ${data.kind}`);
  return data.zones;
}

export function cellsOf(): Cells {
  const data = dataOf('population.csv', 'population');
  if (data.kind !== 'population') throw new Error(`population.csv holds ${data.kind}`);
  return data.cells;
}
