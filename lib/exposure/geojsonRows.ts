import * as z from 'zod';
import type { Row } from './fields';
import { shown } from './fields';
import { areaFault } from './areaFault';
import type { Asset, RowError } from './model';

const degrees = (name: string, most: number) => {
  const error = ({ input }: { input?: unknown }): string => `found ${shown(input)}, expected a ${name} from ${-most} to ${most} (positions are [longitude, latitude] in degrees)`;
  return z.number({ error }).min(-most, { error }).max(most, { error });
};
const list = (what: string) => ({ error: ({ input }: { input?: unknown }): string => `found ${shown(input)}, expected ${what}` });
const position = z.tuple([degrees('longitude', 180), degrees('latitude', 90)], list('a position, [longitude, latitude]')).rest(z.number(list('a height in metres')));
const line = z.array(position, list('a line: positions')).min(2, list('a line of two positions or more'));
const ring = z
  .array(position, list('a ring: positions'))
  .min(4, list('a ring of four positions or more'))
  .refine((corners) => corners[0][0] === corners[corners.length - 1][0] && corners[0][1] === corners[corners.length - 1][1], 'this ring does not end where it starts: repeat its first position at its end');
const rings = z.array(ring, list('rings')).min(1, list('at least one ring'));

const geometry = z.discriminatedUnion(
  'type',
  [
    z.object({ type: z.literal('Point'), coordinates: position }),
    z.object({ type: z.literal('LineString'), coordinates: line }),
    z.object({ type: z.literal('MultiLineString'), coordinates: z.array(line, list('lines')).min(1, list('at least one line')) }),
    z.object({ type: z.literal('Polygon'), coordinates: rings }),
    z.object({ type: z.literal('MultiPolygon'), coordinates: z.array(rings, list('polygons')).min(1, list('at least one polygon')) }),
  ],
  { error: ({ input }) => (input == null ? 'this feature has no geometry' : `found a ${shown((input as { type?: unknown }).type)}, expected a Point, LineString, MultiLineString, Polygon or MultiPolygon: give each part its own feature`) },
);
const feature = z.object({
  type: z.literal('Feature', list('"Feature"')),
  id: z.union([z.string(), z.number()], list('words or a number')).optional(),
  properties: z.record(z.string(), z.unknown(), list('an object of properties, or null')).nullish(),
  geometry,
}, list('a GeoJSON Feature'));

export interface GeoJsonRow extends Row {
  geometry: Asset['geometry'];
}

export type GeoJsonRows = { ok: true; columns: string[]; rows: GeoJsonRow[] } | { ok: false; errors: RowError[] };

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
  const columns = new Set<string>();
  features.forEach((candidate, i) => {
    const { row, error } = rowOf(candidate, i + 1);
    if (error) return errors.push(error);
    for (const name of Object.keys(row.values)) columns.add(name);
    rows.push(row);
  });
  return errors.length > 0 ? { ok: false, errors } : { ok: true, columns: [...columns], rows };
}

function rowOf(candidate: unknown, number: number): { row: GeoJsonRow; error?: undefined } | { row?: undefined; error: RowError } {
  const parsed = feature.safeParse(candidate);
  if (!parsed.success) {
    const [{ path, message }] = parsed.error.issues;
    return { error: { row: number, ...(path.length > 0 ? { column: path.join('.') } : {}), message } };
  }
  const { id, properties, geometry: shape } = parsed.data;
  const fault = areaFault(shape);
  if (fault) return { error: { row: number, column: 'geometry', message: fault } };
  return { row: { row: number, values: { ...(id === undefined ? {} : { id }), ...properties }, geometry: shape } };
}

function featuresOf(body: unknown): unknown[] | null {
  const shape = body as { type?: unknown; features?: unknown } | null;
  if (shape?.type === 'FeatureCollection' && Array.isArray(shape.features)) return shape.features;
  return shape?.type === 'Feature' ? [body] : null;
}
