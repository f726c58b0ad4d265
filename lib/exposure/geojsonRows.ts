import * as z from 'zod';
import type { Geometry } from 'geojson';
import type { Row } from './fields';
import type { RowError } from './model';

const position = z.tuple([z.number().min(-180).max(180), z.number().min(-90).max(90)]).rest(z.number());
const line = z.array(position).min(2);
const ring = z.array(position).min(4).refine((corners) => corners[0].every((value, i) => value === corners[corners.length - 1][i]), 'a ring must end where it starts');
const geometry = z.discriminatedUnion('type', [
  z.object({ type: z.literal('Point'), coordinates: position }),
  z.object({ type: z.literal('LineString'), coordinates: line }),
  z.object({ type: z.literal('MultiLineString'), coordinates: z.array(line).min(1) }),
  z.object({ type: z.literal('Polygon'), coordinates: z.array(ring).min(1) }),
  z.object({ type: z.literal('MultiPolygon'), coordinates: z.array(z.array(ring).min(1)).min(1) }),
]);
const feature = z.object({
  type: z.literal('Feature'),
  id: z.union([z.string(), z.number()]).optional(),
  properties: z.record(z.string(), z.unknown()).nullable(),
  geometry,
});

export interface GeoJsonRow extends Row {
  geometry: Exclude<Geometry, { type: 'GeometryCollection' } | { type: 'MultiPoint' }>;
}

export type GeoJsonRows = { ok: true; rows: GeoJsonRow[]; errors: RowError[] } | { ok: false; errors: RowError[] };

/** Features of a GeoJSON file (RFC 7946), each checked by itself; rows count features from 1. */
export function geojsonRows(text: string): GeoJsonRows {
  let body: unknown;
  try {
    body = JSON.parse(text);
  } catch (error) {
    return { ok: false, errors: [{ row: 1, message: `this is not JSON: ${(error as Error).message}` }] };
  }
  const features = featuresOf(body);
  if (!features) return { ok: false, errors: [{ row: 1, message: 'expected a GeoJSON FeatureCollection or Feature (RFC 7946)' }] };
  if (features.length === 0) return { ok: false, errors: [{ row: 1, message: 'the collection holds no features' }] };
  const rows: GeoJsonRow[] = [];
  const errors: RowError[] = [];
  features.forEach((candidate, i) => {
    const parsed = feature.safeParse(candidate);
    if (!parsed.success) {
      const [issue] = parsed.error.issues;
      errors.push({ row: i + 1, column: issue.path.join('.'), message: `${issue.message}${issue.path.includes('coordinates') ? ' (coordinates are longitude, latitude in degrees)' : ''}` });
      return;
    }
    const { id, properties } = parsed.data;
    rows.push({ row: i + 1, values: { ...(id === undefined ? {} : { id }), ...properties }, geometry: parsed.data.geometry as GeoJsonRow['geometry'] });
  });
  return { ok: true, rows, errors };
}

function featuresOf(body: unknown): unknown[] | null {
  const shape = body as { type?: unknown; features?: unknown } | null;
  if (shape?.type === 'FeatureCollection' && Array.isArray(shape.features)) return shape.features;
  return shape?.type === 'Feature' ? [body] : null;
}
