import { SURFACES } from './model';
import type { RowError, Surface } from './model';

/** One row of a layer before it is understood: its values by column name, and its number for errors. */
export interface Row {
  row: number;
  values: Record<string, unknown>;
}

/** Names a column may go by, ours first; where a file has several, the first named here counts. Case, spaces, hyphens and underscores do not matter. */
const NAMES = {
  name: ['name', 'title', 'label'],
  id: ['id', 'identifier'],
  lat: ['lat', 'latitude', 'y'],
  lon: ['lon', 'lng', 'long', 'longitude', 'x'],
  class: ['class', 'type', 'category'],
  people: ['people', 'population', 'persons', 'residents', 'customers'],
  surface: ['surface'],
  clearanceHours: ['clearancehours', 'clearancetimehours', 'clearancetime', 'clearance'],
} as const;
export type Field = keyof typeof NAMES;

/** Errors kept at most; the rest are counted. */
export const MOST_ERRORS = 1000;
const NUMBER = /^[+-]?(\d+\.?\d*|\.\d+)(e[+-]?\d+)?$/i;

const plain = (name: string): string => name.toLowerCase().replace(/[\s_-]/g, '');

export const acceptedNames = (field: Field): string => NAMES[field].join(', ');

export const isPositionColumn = (column: string): boolean => [...NAMES.lat, ...NAMES.lon].some((name) => name === plain(column));

/** How a value is shown in an error. */
export const shown = (value: unknown): string => {
  const text = typeof value === 'string' ? `"${value}"` : JSON.stringify(value) ?? 'nothing';
  return text.length > 44 ? `${text.slice(0, 40)}…` : text;
};

/** Reads numbers and words from the rows of one file, and keeps what is wrong with them. */
export class FieldReader {
  readonly errors: RowError[] = [];
  errorCount = 0;
  private readonly columns: Record<Field, string[]>;
  private readonly decimalMark: '.' | ',';

  /** `columns`: every name in the file; `decimalMark`: a comma where the file's own positions are written with one. */
  constructor(columns: readonly string[], decimalMark: '.' | ',' = '.') {
    this.columns = Object.fromEntries(
      Object.entries(NAMES).map(([field, names]) => [field, names.flatMap((name) => columns.filter((column) => plain(column) === name))]),
    ) as Record<Field, string[]>;
    this.decimalMark = decimalMark;
  }

  fail({ row }: Row, column: string, message: string): void {
    this.errorCount++;
    if (this.errors.length < MOST_ERRORS) this.errors.push({ row, column, message });
  }

  has(field: Field): boolean {
    return this.columns[field].length > 0;
  }

  /** The words of a field; null when absent. */
  text(row: Row, field: Field): string | null {
    const found = this.find(row, field);
    if (!found) return null;
    if (typeof found.value === 'object') this.fail(row, found.column, `found ${shown(found.value)}, expected words`);
    return String(found.value).trim();
  }

  /** A number within bounds; null when absent, and an error when it is there but wrong. */
  number(row: Row, field: Field, least: number, most: number): number | null {
    const found = this.find(row, field);
    if (!found) return null;
    const { value, column } = found;
    const number = typeof value === 'number' ? value : typeof value === 'string' ? this.parsed(value.trim()) : NaN;
    if (!Number.isFinite(number)) this.fail(row, column, `found ${shown(value)}, expected a number${this.hint(value)}`);
    else if (number < least || number > most) this.fail(row, column, `found ${number}, expected a number from ${least} to ${most}${boundsHint(field, number)}`);
    else return number;
    return null;
  }

  /** A number that must be there; NaN, and an error, where it is not. */
  needed(row: Row, field: Field, least: number, most: number): number {
    const before = this.errorCount;
    const number = this.number(row, field, least, most);
    if (number === null && this.errorCount === before) this.fail(row, this.columns[field][0] ?? field, `no value: give ${field} (accepted names: ${acceptedNames(field)})`);
    return number ?? NaN;
  }

  surface(row: Row): Surface | null {
    const text = this.text(row, 'surface');
    if (text === null) return null;
    const surface = SURFACES.find((name) => name === text.toLowerCase());
    if (!surface) this.fail(row, this.columns.surface[0], `found ${shown(text)}, expected one of ${SURFACES.join(', ')}, or nothing: it is then told from the coast`);
    return surface ?? null;
  }

  private find({ values }: Row, field: Field): { value: unknown; column: string } | null {
    for (const column of this.columns[field]) {
      const value = values[column];
      if (value !== undefined && value !== null && value !== '') return { value, column };
    }
    return null;
  }

  private parsed(text: string): number {
    // A mark that groups thousands would read as a wrong number: only the file's own decimal mark is taken.
    const number = this.decimalMark === '.' ? text : text.includes('.') ? '' : text.replace(',', '.');
    return NUMBER.test(number) ? Number(number) : NaN;
  }

  private hint(value: unknown): string {
    if (typeof value !== 'string') return '';
    if (/^[\d.,\s]+$/.test(value)) return `: this file's decimal mark is "${this.decimalMark}", and thousands are not grouped`;
    return /^[\d.,]+\s*°?\s*[NSEW]$/i.test(value.trim()) ? ': degrees south and west are negative' : '';
  }
}

function boundsHint(field: Field, number: number): string {
  if (field === 'lon' && number > 180 && number <= 360) return `: that is ${Math.round((number - 360) * 1e6) / 1e6}`;
  return field === 'lat' && Math.abs(number) <= 180 ? ': are latitude and longitude the wrong way round?' : '';
}
