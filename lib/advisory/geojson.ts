import * as z from 'zod';
import { columnOf } from './columns';
import { failed } from './draft';
import { parseJson } from './json-places';
import { pathText } from './finish';
import { readTable } from './table';
import type { Draft, Read } from './draft';
import type { Row } from './table';

const position = z.array(z.number()).min(2, 'a position is [longitude, latitude]');
const geometry = z.discriminatedUnion('type', [
  z.object({ type: z.literal('Point'), coordinates: position }),
  z.object({ type: z.literal('LineString'), coordinates: z.array(position).min(2, 'a line has at least two positions') }),
], { error: 'expected a Point or a LineString' });
const properties = z.record(z.string(), z.unknown()).nullish().transform((given) => given ?? {});
const feature = z.object({ type: z.literal('Feature'), geometry, properties });
const collection = z.looseObject({ type: z.literal('FeatureCollection'), features: z.array(feature).min(1, 'no feature is given: add a Point for each position'), properties });
type Feature = z.infer<typeof feature>;

const OWN_MEMBERS = new Set(['type', 'features', 'properties', 'bbox']);

/**
 * Reads a track in GeoJSON (RFC 7946): a FeatureCollection of Points whose properties carry the names of
 * `columns.ts`, or one LineString whose properties are lists, with `times` among them. What is said of
 * the whole advisory stands in the properties of the collection or of any feature.
 */
export function readGeoJson(text: string): Read {
  const json = parseJson(text);
  if (!json.ok) return json;
  const whole = asCollection(json.value);
  if (whole === null) return failed({ line: 1, message: 'this GeoJSON holds no features: give a FeatureCollection of Points, or a LineString Feature, with times and winds in the properties' });
  const parsed = collection.safeParse(whole.value);
  if (!parsed.success) {
    return failed(parsed.error.issues.map(({ path, message }) => {
      const own = path.slice(whole.prefix);
      return { path: pathText(own), ...json.placeOf(own.join('.')), message: `${message.replace(/^Invalid input: /, '')}: a track is given as Points or as one LineString with its own properties` };
    }));
  }
  const { features } = parsed.data;
  const path = (index: number): string => (whole.prefix === 0 ? `features.${index}` : '');
  const shared = { ...advisoryMembers(parsed.data), ...parsed.data.properties };
  const lines = features.filter((each) => each.geometry.type === 'LineString');
  if (lines.length === 0) return readTable(features.map((each, index) => pointRow(each, shared, path(index), json.placeOf)), 'property', () => json.placeOf(whole.prefix === 0 ? 'features' : ''));
  if (features.length > 1) return failed({ ...json.placeOf('features'), message: `a track is either Points or one LineString: found ${lines.length} lines among ${features.length} features` });
  return lineRows(features[0]!, shared, path(0), json.placeOf);
}

/** A lone Feature counts as a collection of one; `prefix` is how much of a path that adds. */
function asCollection(value: unknown): { value: unknown; prefix: number } | null {
  if (typeof value !== 'object' || value === null || !('type' in value)) return null;
  if (value.type === 'FeatureCollection') return { value, prefix: 0 };
  return value.type === 'Feature' ? { value: { type: 'FeatureCollection', features: [value] }, prefix: 2 } : null;
}

/** Members beside `features` (RFC 7946 section 6.1) that say something of the advisory, `storm: {id, name}` among them. */
function advisoryMembers(members: Record<string, unknown>): Record<string, unknown> {
  const { storm, ...rest } = members;
  const others = Object.fromEntries(Object.entries(rest).filter(([name]) => !OWN_MEMBERS.has(name)));
  if (typeof storm !== 'object' || storm === null) return storm === undefined ? others : { ...others, storm };
  const { id, name } = storm as Record<string, unknown>;
  return { ...others, ...(id === undefined ? {} : { stormId: id }), ...(name === undefined ? {} : { stormName: name }) };
}

function pointRow({ geometry, properties }: Feature, shared: Record<string, unknown>, path: string, placeOf: Draft['placeOf']): Row {
  const [lon, lat] = geometry.coordinates as [number, number];
  return row({ ...shared, ...flat(properties) }, lon, lat, path, placeOf);
}

/** A line's lists, one value a position, as rows. */
function lineRows({ geometry, properties }: Feature, shared: Record<string, unknown>, path: string, placeOf: Draft['placeOf']): Read {
  const coordinates = geometry.coordinates as [number, number][];
  const { times, ...others } = properties;
  const lists = Object.entries({ ...others, ...(times === undefined ? {} : { time: times }) });
  const wrong = lists.find(([, value]) => Array.isArray(value) && value.length !== coordinates.length);
  if (wrong !== undefined) {
    return failed({ ...placeOf(join(path, `properties.${wrong[0] === 'time' ? 'times' : wrong[0]}`)), message: `${wrong[0] === 'time' ? 'times' : wrong[0]} has ${(wrong[1] as unknown[]).length} values for ${coordinates.length} positions: give one for each` });
  }
  if (!lists.some(([, value]) => Array.isArray(value))) {
    return failed({ ...placeOf(path), message: `a line needs lists in its properties with one value for each of its ${coordinates.length} positions: times, maxWindKt and what else is known` });
  }
  return readTable(
    coordinates.map(([lon, lat], index) => row({ ...shared, ...flat(Object.fromEntries(lists.map(([name, value]) => [name, Array.isArray(value) ? value[index] : value]))) }, lon, lat, path, placeOf)),
    'property',
    () => placeOf(path),
  );
}

function row(cells: Record<string, unknown>, lon: number, lat: number, path: string, placeOf: Draft['placeOf']): Row {
  return {
    // The geometry is the position; properties that repeat it are not read.
    cells: new Map<string, unknown>([...Object.entries(cells).filter(([name]) => !['lat', 'lon'].includes(columnOf(name)?.kind ?? '')), ['lon', lon], ['lat', lat]]),
    placeOf: (name) => placeOf(join(path, name === 'lat' || name === 'lon' ? 'geometry' : `properties.${name}`)),
  };
}

/** `radiiNm: {"34": {ne, ...}}`, as an advisory has it, spread into `r34NeNm` and its like. */
function flat(properties: Record<string, unknown>): Record<string, unknown> {
  return Object.fromEntries(
    Object.entries(properties).flatMap(([name, value]) => {
      const unit = /^radii(nm|nmi|km|mi)$/i.exec(name)?.[1];
      if (unit === undefined || typeof value !== 'object' || value === null) return [[name, value]];
      return Object.entries(value).flatMap(([threshold, ring]) => (typeof ring === 'object' && ring !== null ? Object.entries(ring).map(([quadrant, radius]) => [`r${threshold}${quadrant}${unit}`, radius]) : [[`${name}.${threshold}`, ring]]));
    }),
  );
}

const join = (path: string, rest: string): string => (path === '' ? rest : `${path}.${rest}`);
