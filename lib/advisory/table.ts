import { failed } from './draft';
import { about } from './table-about';
import { tableColumns } from './table-columns';
import { parseInstant, shown } from './instants';
import { MOST_POINTS } from './model';
import type { Column } from './columns';
import type { Draft, Place, Read } from './draft';
import type { InputError, Point, QuadrantRadii } from './model';

/** A row of a table of points: what each column holds, and where. */
export interface Row {
  cells: ReadonlyMap<string, unknown>;
  placeOf: (name: string) => Place;
}

type QuantityField = Extract<Column, { kind: 'quantity' }>['field'];
type Radii = Partial<Record<string, Partial<QuadrantRadii>>>;

/**
 * Turns a table of points (CSV rows, GeoJSON properties) into an advisory. Names are those of
 * `columns.ts`, with their units. `word` is what the format calls a name: column or property;
 * `headed` is where names stand, or where the table starts.
 */
export function readTable(rows: readonly Row[], word: 'column' | 'property', headed: Row['placeOf']): Read {
  const extra = rows[MOST_POINTS];
  if (extra !== undefined) return failed({ ...extra.placeOf(''), message: `more than ${MOST_POINTS} positions are given: give one forecast of one storm` });
  const named = tableColumns(rows, word, headed);
  if (!named.ok) return { ok: false, errors: named.errors };
  const errors: InputError[] = [];
  const points = rows.map((row, index) => pointOf(row, index, named.columns, errors));
  const said = about(rows, named.columns, points[0]?.validAt, headed);
  if (errors.length + said.errors.length > 0) return failed([...errors, ...said.errors]);

  const placeOf: Draft['placeOf'] = (path) => {
    const [, index, field] = path.split('.');
    const row = path.startsWith('points.') ? rows[Number(index)] : rows[0];
    if (row === undefined) return {};
    return row.placeOf([...named.columns].find(([, column]) => matches(column, field))?.[0] ?? '');
  };
  return { ok: true, draft: { advisory: { ...said.advisory, points }, placeOf, warnings: [...named.warnings, ...said.warnings] } };
}

const matches = (column: Column, field: string | undefined): boolean => ('field' in column ? column.field : column.kind === 'time' ? 'validAt' : column.kind) === field;

/** One row as a point. A value that is not there stays out; one that cannot be read is an error at its place. */
function pointOf({ cells, placeOf }: Row, index: number, columns: ReadonlyMap<string, Column>, errors: InputError[]): Partial<Point> {
  const point: Partial<Record<QuantityField | 'lat' | 'lon', number>> & { validAt?: string; stage?: string } = {};
  const radii: Radii = {};
  for (const [name, column] of columns) {
    const cell = cells.get(name);
    const fail = (message: string): number => errors.push({ path: `points[${index}]`, ...placeOf(name), message: `${name}: ${message}` });
    if (isAbsent(cell)) {
      if (column.kind === 'time' || column.kind === 'lat' || column.kind === 'lon' || (column.kind === 'quantity' && column.field === 'maxWindKt')) fail('no value is given, and no point can do without');
    } else if (column.kind === 'time') {
      const time = parseInstant(String(cell));
      if (time.ok) point.validAt = time.instant;
      else fail(time.message);
    } else if (column.kind === 'stage') {
      point.stage = String(cell).trim().toLowerCase();
    } else if (column.kind === 'lat' || column.kind === 'lon' || column.kind === 'quantity' || column.kind === 'radius') {
      const value = numberOf(cell);
      if (typeof value === 'string') fail(value);
      else if (column.kind === 'quantity') point[column.field] = tidy(column.toModel(value));
      else if (column.kind === 'radius') (radii[column.threshold] ??= {})[column.quadrant] = tidy(column.toModel(value));
      else point[column.kind] = value;
    }
  }
  for (const [threshold, ring] of Object.entries(radii)) {
    const missing = (['ne', 'se', 'sw', 'nw'] as const).filter((quadrant) => ring![quadrant] === undefined);
    if (missing.length > 0) errors.push({ path: `points[${index}].radiiNm`, ...placeOf(''), message: `the ${threshold} kt radius is missing for ${missing.join(', ').toUpperCase()}: give all four, 0 where that wind does not reach` });
  }
  return { ...point, ...(Object.keys(radii).length === 0 ? {} : { radiiNm: radii }) } as Partial<Point>;
}

export const isAbsent = (cell: unknown): boolean => cell === undefined || cell === null || (typeof cell === 'string' && cell.trim() === '');

/** A number, or what is wrong with it. */
function numberOf(cell: unknown): number | string {
  if (typeof cell === 'number' && Number.isFinite(cell)) return cell;
  const text = typeof cell === 'string' ? cell.trim() : (JSON.stringify(cell) ?? 'this');
  if (typeof cell === 'string' && /^[+-]?(?:\d+\.?\d*|\.\d+)(?:e[+-]?\d{1,3})?$/i.test(text)) return Number(text);
  if (/^[+-]?\d+,\d+$/.test(text)) return `"${text}" has a decimal comma: write ${text.replace(',', '.')}`;
  if (/^\d+(?:\.\d+)?\s*[NSEW]$/i.test(text)) return `"${text}" has a letter: write south and west as negative numbers, north and east without a letter`;
  return `"${shown(text)}" is not a number: leave it empty where the value is not known`;
}

/** Takes off what a change of units leaves behind the sixth decimal. */
const tidy = (value: number): number => Math.round(value * 1e6) / 1e6;
