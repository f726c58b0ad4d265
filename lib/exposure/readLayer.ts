import { csvRows } from './csvRows';
import { acceptedNames, FieldReader, MOST_ERRORS } from './fields';
import type { Row } from './fields';
import { geojsonRows } from './geojsonRows';
import type { GeoJsonRow } from './geojsonRows';
import { decimalMarkOf } from './decimalMark';
import type { Asset, Cells, LayerData, LayerKind, LayerReading, RowError, Zone } from './model';

export interface LayerOptions {
  kind: LayerKind;
  /** Class of assets that name none: the layer's own, else `unclassed`. */
  assetClass?: string;
}

const MOST_PEOPLE = 1e8;
const MOST_HOURS = 240;
/** Each class is a row of every impact: a column of names taken for classes would drown the rest. */
const MOST_CLASSES = 200;

/** Reads a layer from GeoJSON or CSV, told apart by the first character. All rows are good, or the layer is refused with every error. */
export function readLayer(text: string, options: LayerOptions): LayerReading {
  const start = text.replace(/^\uFEFF/, '').trimStart();
  if (start === '') return { ok: false, errors: [{ row: 1, message: 'the file is empty' }] };
  return start[0] === '{' || start[0] === '[' ? readGeoJson(start, options) : readCsv(text, options);
}

function readGeoJson(text: string, options: LayerOptions): LayerReading {
  const read = geojsonRows(text);
  if (!read.ok) return refused(read.errors);
  const fields = new FieldReader(read.columns);
  return finish(dataOf(read.rows, ({ geometry }) => geometry, options, fields), fields);
}

function readCsv(text: string, options: LayerOptions): LayerReading {
  if (options.kind === 'zones') return refused([{ row: 1, message: 'zones are areas: bring them as GeoJSON polygons' }]);
  const read = csvRows(text);
  if (!read.ok) return refused(read.errors);
  const { columns, rows } = read;
  const fields = new FieldReader(columns, decimalMarkOf(rows, columns));
  const missing = (options.kind === 'population' ? (['lat', 'lon', 'people'] as const) : (['name', 'lat', 'lon'] as const)).filter((field) => !fields.has(field) && !(field === 'name' && fields.has('id')));
  if (missing.length > 0) {
    return refused(missing.map((field) => ({ row: 1, column: field, message: `the header has no column ${field} (accepted names: ${acceptedNames(field)}); it has: ${columns.join(', ').slice(0, 200)}` })));
  }
  const located = (row: Row): Asset['geometry'] => {
    const lat = fields.needed(row, 'lat', -90, 90);
    const lon = fields.needed(row, 'lon', -180, 180);
    return { type: 'Point', coordinates: [lon, lat] };
  };
  return finish(dataOf(rows, located, options, fields), fields);
}

function dataOf<R extends Row>(rows: readonly R[], located: (row: R) => Asset['geometry'], options: LayerOptions, fields: FieldReader): LayerData {
  if (options.kind === 'population') return { kind: 'population', cells: cellsOf(rows, located, fields) };
  const idOf = uniqueIds(fields);
  if (options.kind === 'zones') return { kind: 'zones', zones: rows.flatMap((row) => zoneOf({ ...row, geometry: located(row) }, fields, idOf) ?? []) };
  const classOf = fewClasses(options, fields);
  return { kind: 'assets', assets: rows.map((row) => assetOf({ ...row, geometry: located(row) }, fields, idOf, classOf)) };
}

function assetOf(row: GeoJsonRow, fields: FieldReader, idOf: (row: Row) => string, classOf: (row: Row) => string): Asset {
  const id = idOf(row);
  return {
    id,
    class: classOf(row),
    name: fields.text(row, 'name') ?? id,
    people: fields.number(row, 'people', 0, MOST_PEOPLE),
    surface: fields.surface(row),
    properties: row.values,
    geometry: row.geometry,
  };
}

function zoneOf(row: GeoJsonRow, fields: FieldReader, idOf: (row: Row) => string): Zone | null {
  const { geometry } = row;
  if (geometry.type !== 'Polygon' && geometry.type !== 'MultiPolygon') {
    fields.fail(row, 'geometry', `found a ${geometry.type}, expected a Polygon or a MultiPolygon`);
    return null;
  }
  const id = idOf(row);
  return {
    id,
    name: fields.text(row, 'name') ?? id,
    people: fields.number(row, 'people', 0, MOST_PEOPLE),
    clearanceHours: fields.number(row, 'clearanceHours', 0, MOST_HOURS),
    properties: row.values,
    geometry,
  };
}

function cellsOf<R extends Row>(rows: readonly R[], located: (row: R) => Asset['geometry'], fields: FieldReader): Cells {
  const cells: Cells = { count: rows.length, lat: new Float64Array(rows.length), lon: new Float64Array(rows.length), people: new Float64Array(rows.length) };
  rows.forEach((row, i) => {
    const geometry = located(row);
    if (geometry.type !== 'Point') return fields.fail(row, 'geometry', `found a ${geometry.type}, expected a Point with the people of its cell`);
    [cells.lon[i], cells.lat[i]] = geometry.coordinates;
    cells.people[i] = fields.needed(row, 'people', 0, MOST_PEOPLE);
  });
  return cells;
}

/** The row's own id, or one from its number; a repeated id is an error, since rows of two revisions are matched by it. */
function uniqueIds(fields: FieldReader): (row: Row) => string {
  const seen = new Map<string, number>();
  return (row) => {
    const id = fields.text(row, 'id') ?? `row-${row.row}`;
    const before = seen.get(id);
    if (before !== undefined) fields.fail(row, 'id', `the id "${id.slice(0, 40)}" is that of row ${before} already; give each row its own`);
    else seen.set(id, row.row);
    return id;
  };
}

function fewClasses({ assetClass = 'unclassed' }: LayerOptions, fields: FieldReader): (row: Row) => string {
  const seen = new Set<string>();
  return (row) => {
    const name = fields.text(row, 'class') ?? assetClass;
    if (seen.has(name)) return name;
    seen.add(name);
    if (seen.size === MOST_CLASSES + 1) fields.fail(row, 'class', `this is class ${seen.size} of the layer, expected at most ${MOST_CLASSES}: name kinds of assets in this column, and the assets themselves in name`);
    return name;
  };
}

function finish(data: LayerData, { errors, errorCount }: FieldReader): LayerReading {
  if (errorCount > 0) return refused(errors, errorCount);
  const accepted = data.kind === 'zones' ? data.zones.length : data.kind === 'assets' ? data.assets.length : data.cells.count;
  return { ok: true, data, accepted, rejected: [] };
}

/** Refuses a layer with its first errors; the last of them says how many more there are. */
function refused(errors: readonly RowError[], count = errors.length): LayerReading {
  const listed = errors.slice(0, MOST_ERRORS);
  if (count > listed.length) listed.push({ row: listed[listed.length - 1].row, message: `and ${count - listed.length} errors more, from here on, are not listed` });
  return { ok: false, errors: listed };
}
