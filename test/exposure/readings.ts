import { readLayer } from '../../lib/exposure';
import type { Asset, Cells, LayerOptions, RowError, Zone } from '../../lib/exposure';

/** What a good layer holds; a refused one fails the test with its errors. */
function good(text: string, options: LayerOptions) {
  const reading = readLayer(text, options);
  if (!reading.ok) throw new Error(JSON.stringify(reading.errors));
  return reading.data;
}

export function assetsIn(text: string, assetClass?: string): Asset[] {
  const data = good(text, { kind: 'assets', assetClass });
  if (data.kind !== 'assets') throw new Error(data.kind);
  return data.assets;
}

export function zonesIn(text: string): Zone[] {
  const data = good(text, { kind: 'zones' });
  if (data.kind !== 'zones') throw new Error(data.kind);
  return data.zones;
}

export function cellsIn(text: string): Cells {
  const data = good(text, { kind: 'population' });
  if (data.kind !== 'population') throw new Error(data.kind);
  return data.cells;
}

/** The errors of a layer that must be refused. */
export function errorsIn(text: string, kind: LayerOptions['kind'] = 'assets'): RowError[] {
  const reading = readLayer(text, { kind });
  if (reading.ok) throw new Error('This layer was accepted.');
  return reading.errors;
}

export const feature = (geometry: unknown, properties: unknown = {}, more: object = {}): object => ({ type: 'Feature', properties, geometry, ...more });
export const collection = (...features: unknown[]): string => JSON.stringify({ type: 'FeatureCollection', features });
export const point = (lon: unknown, lat: unknown): object => ({ type: 'Point', coordinates: [lon, lat] });
/** A square in degrees, from its south-western corner. */
export const square = (west: number, south: number, side = 1): GeoJSON.Polygon => ({
  type: 'Polygon',
  coordinates: [[[west, south], [west + side, south], [west + side, south + side], [west, south + side], [west, south]]],
});
