import { SURFACES } from './model';
import type { RowError, Surface } from './model';

/** One row of a layer before it is understood: its values by column name, and its number for errors. */
export interface Row {
  row: number;
  values: Record<string, unknown>;
}

/** Names a column may go by, the first being ours. Case, spaces, hyphens and underscores do not matter. */
const NAMES = {
  name: ['name', 'title', 'label'],
  id: ['id', 'identifier', 'code'],
  lat: ['lat', 'latitude', 'y'],
  lon: ['lon', 'lng', 'long', 'longitude', 'x'],
  class: ['class', 'type', 'category'],
  people: ['people', 'population', 'persons', 'customers'],
  surface: ['surface', 'exposure', 'terrain'],
  clearanceHours: ['clearancehours', 'clearance', 'clearancetimehours'],
} as const;
export type Field = keyof typeof NAMES;

const plain = (name: string): string => name.toLowerCase().replace(/[\s_-]/g, '');

/** The value of a field under any of its names, undefined when the row has none or an empty one. */
export function fieldOf({ values }: Row, field: Field): unknown {
  for (const [name, value] of Object.entries(values)) {
    if ((NAMES[field] as readonly string[]).includes(plain(name)) && value !== '' && value !== null) return value;
  }
  return undefined;
}

export const hasColumn = (columns: readonly string[], field: Field): boolean => columns.some((name) => (NAMES[field] as readonly string[]).includes(plain(name)));

export const acceptedNames = (field: Field): string => NAMES[field].join(', ');

/** Reads numbers and words from rows, and keeps what is wrong with them. */
export class FieldReader {
  readonly errors: RowError[] = [];
  private readonly decimalComma: boolean;

  constructor(decimalComma = false) {
    this.decimalComma = decimalComma;
  }

  fail(row: Row, column: string, message: string): void {
    this.errors.push({ row: row.row, column, message });
  }

  text(row: Row, field: Field): string | null {
    const value = fieldOf(row, field);
    return value === undefined ? null : String(value).trim();
  }

  /** A number within bounds; null when absent, and an error when it is there but wrong. */
  number(row: Row, field: Field, least: number, most: number): number | null {
    const value = fieldOf(row, field);
    if (value === undefined) return null;
    const text = typeof value === 'number' ? value : this.decimalComma ? String(value).replace(',', '.') : String(value);
    const number = typeof text === 'number' ? text : text.trim() === '' ? NaN : Number(text);
    if (!Number.isFinite(number)) this.fail(row, field, `found "${String(value).slice(0, 40)}", expected a number`);
    else if (number < least || number > most) this.fail(row, field, `found ${number}, expected a number from ${least} to ${most}`);
    else return number;
    return null;
  }

  /** A number that must be there. */
  needed(row: Row, field: Field, least: number, most: number): number {
    const before = this.errors.length;
    const number = this.number(row, field, least, most);
    if (number === null && this.errors.length === before) this.fail(row, field, `no value: give ${field} (accepted names: ${acceptedNames(field)})`);
    return number ?? NaN;
  }

  surface(row: Row): Surface | null {
    const text = this.text(row, 'surface');
    if (text === null) return null;
    const surface = SURFACES.find((name) => name === text.toLowerCase());
    if (!surface) this.fail(row, 'surface', `found "${text.slice(0, 40)}", expected one of ${SURFACES.join(', ')}`);
    return surface ?? null;
  }
}
