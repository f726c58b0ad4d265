import { csvRows } from './csvRows';
import { acceptedNames, FieldReader, hasColumn } from './fields';
import type { Field, Row } from './fields';
import { geojsonRows } from './geojsonRows';
import type { GeoJsonRow } from './geojsonRows';
import type { Asset, Cells, LayerData, LayerKind, LayerReading, RowError, Zone } from './model';

export interface LayerOptions {
  kind: LayerKind;
  /** Class of assets that name none: the layer's own, else `unclassed`. */
  assetClass?: string;
  fileName?: string;
  contentType?: string;
}

/** Errors listed at most; the last says how many more there are. */
const MOST_ERRORS = 1000;
const MOST_PEOPLE = 1e8;
const MOST_HOURS = 240;

/** Reads a layer from GeoJSON or CSV, told apart by the first character. All rows are good, or the layer is refused with every error. */
export function readLayer(text: string, options: LayerOptions): LayerReading {
  const start = text.replace(/^\uFEFF/, '').trimStart();
  if (start === '') return { ok: false, errors: [{ row: 1, message: 'the file is empty' }] };
  return start[0] === '{' || start[0] === '[' ? readGeoJson(start, options) : readCsv(text, options);
}

function readGeoJson(text: string, options: LayerOptions): LayerReading {
  const read = geojsonRows(text);
  if (!read.ok) return read;
  const fields = new FieldReader();
  const data = dataOf(read.rows, options, fields);
  return finish(data, [...read.errors, ...fields.errors]);
}

function readCsv(text: string, options: LayerOptions): LayerReading {
  if (options.kind === 'zones') return { ok: false, errors: [{ row: 1, message: 'zones are areas: bring them as GeoJSON polygons' }] };
  const read = csvRows(text);
  if (!read.ok) return read;
  const wanted: Field[] = options.kind === 'population' ? ['lat', 'lon', 'people'] : ['name', 'lat', 'lon'];
  const missing = wanted.filter((field) => !hasColumn(read.columns, field));
  if (missing.length > 0) {
    return { ok: false, errors: missing.map((field) => ({ row: 1, column: field, message: `the header has no column ${field} (accepted names: ${acceptedNames(field)}); it has: ${read.columns.join(', ').slice(0, 200)}` })) };
  }
  const fields = new FieldReader(read.decimalComma);
  const rows = read.rows.map((row): GeoJsonRow => {
    const lat = fields.needed(row, 'lat', -90, 90);
    const lon = fields.needed(row, 'lon', -180, 180);
    return { ...row, geometry: { type: 'Point', coordinates: [lon, lat] } };
  });
  return finish(dataOf(rows, options, fields), fields.errors);
}

function dataOf(rows: readonly GeoJsonRow[], options: LayerOptions, fields: FieldReader): LayerData {
  if (options.kind === 'population') return { kind: 'population', cells: cellsOf(rows, fields) };
  const idOf = uniqueIds(fields);
  if (options.kind === 'zones') return { kind: 'zones', zones: rows.flatMap((row) => zoneOf(row, fields, idOf) ?? []) };
  return { kind: 'assets', assets: rows.map((row) => assetOf(row, options, fields, idOf)) };
}

function assetOf(row: GeoJsonRow, { assetClass }: LayerOptions, fields: FieldReader, idOf: (row: Row) => string): Asset {
  const id = idOf(row);
  return {
    id,
    class: fields.text(row, 'class') ?? assetClass ?? 'unclassed',
    name: fields.text(row, 'name') ?? id,
    people: fields.number(row, 'people', 0, MOST_PEOPLE),
    surface: fields.surface(row),
    properties: row.values,
    geometry: row.geometry as Asset['geometry'],
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

function cellsOf(rows: readonly GeoJsonRow[], fields: FieldReader): Cells {
  const cells: Cells = { count: rows.length, lat: new Float64Array(rows.length), lon: new Float64Array(rows.length), people: new Float64Array(rows.length) };
  rows.forEach((row, i) => {
    if (row.geometry.type !== 'Point') return fields.fail(row, 'geometry', `found a ${row.geometry.type}, expected a Point with the people of its cell`);
    [cells.lon[i], cells.lat[i]] = row.geometry.coordinates;
    cells.people[i] = fields.needed(row, 'people', 0, MOST_PEOPLE);
  });
  return cells;
}

/** The row's own id, or its number; a repeated id is an error, since rows of two revisions are matched by it. */
function uniqueIds(fields: FieldReader): (row: Row) => string {
  const seen = new Map<string, number>();
  return (row) => {
    const id = fields.text(row, 'id') ?? String(row.row);
    const before = seen.get(id);
    if (before !== undefined) fields.fail(row, 'id', `the id "${id.slice(0, 40)}" is that of row ${before} already; give each row its own`);
    else seen.set(id, row.row);
    return id;
  };
}

function finish(data: LayerData, errors: RowError[]): LayerReading {
  if (errors.length > 0) {
    const listed = [...errors].sort((a, b) => a.row - b.row).slice(0, MOST_ERRORS);
    if (errors.length > MOST_ERRORS) listed.push({ row: errors[MOST_ERRORS].row, message: `${errors.length - MOST_ERRORS} more errors are not listed` });
    return { ok: false, errors: listed };
  }
  const accepted = data.kind === 'zones' ? data.zones.length : data.kind === 'assets' ? data.assets.length : data.cells.count;
  return { ok: true, data, accepted, rejected: [] };
}
