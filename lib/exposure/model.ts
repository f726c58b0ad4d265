import { SURFACES } from '../units';
import type { Surface } from '../units';

export const LAYER_KINDS = ['zones', 'assets', 'population'] as const;
export type LayerKind = (typeof LAYER_KINDS)[number];

export { SURFACES };
export type { Surface };

/** An evacuation zone: a polygon, the people it holds when no population layer says so, and the hours it takes to clear. */
export interface Zone {
  id: string;
  name: string;
  /** null: counted from the population cells inside. */
  people: number | null;
  clearanceHours: number | null;
  properties: Record<string, unknown>;
  geometry: GeoJSON.Polygon | GeoJSON.MultiPolygon;
}

/** A thing that wind can hit: a point, a line (a feeder) or a polygon (a campus). */
export interface Asset {
  id: string;
  class: string;
  name: string;
  /** People or customers who depend on it, null when not said. */
  people: number | null;
  surface: Surface | null;
  properties: Record<string, unknown>;
  geometry: GeoJSON.Point | GeoJSON.LineString | GeoJSON.MultiLineString | GeoJSON.Polygon | GeoJSON.MultiPolygon;
}

/** Population cells, structure of arrays; `people` may be fractional. */
export interface Cells {
  count: number;
  lat: Float64Array;
  lon: Float64Array;
  people: Float64Array;
}

export type LayerData =
  | { kind: 'zones'; zones: Zone[] }
  | { kind: 'assets'; assets: Asset[] }
  | { kind: 'population'; cells: Cells };

export interface RowError {
  /** 1-based row of a CSV (the header is row 1), or feature index from 1. */
  row: number;
  column?: string;
  message: string;
}

export type LayerReading = { ok: true; data: LayerData; accepted: number; rejected: RowError[] } | { ok: false; errors: RowError[] };
