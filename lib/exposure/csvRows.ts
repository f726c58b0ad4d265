import { CsvError, parse } from 'csv-parse/browser/esm/sync';
import type { Row } from './fields';
import type { RowError } from './model';

export type CsvRows = { ok: true; columns: string[]; rows: Row[] } | { ok: false; errors: RowError[] };

/**
 * Rows of a CSV (RFC 4180) whose first row names the columns, numbered as a spreadsheet numbers them. The separator is a comma,
 * a semicolon or a tab, told from the header; empty rows are passed over.
 */
export function csvRows(text: string): CsvRows {
  let columns: string[] | null = null;
  const rows: Row[] = [];
  const errors: RowError[] = [];
  const take = (row: number, cells: readonly string[]): void => {
    if (!columns) {
      // Spreadsheets leave separators behind where columns were emptied.
      columns = cells.slice(0, cells.reduce((last, name, i) => (name === '' ? last : i + 1), 0));
      errors.push(...namesFaults(columns).map((message) => ({ row, message })));
      return;
    }
    const width = columns.length;
    if (cells.length < width || cells.slice(width).some((cell) => cell !== '')) {
      errors.push({ row, message: `found ${cells.length} values, the header names ${width} columns: put values that hold the separator in quotes, and leave none out` });
    } else {
      rows.push({ row, values: Object.fromEntries(columns.map((name, i) => [name, cells[i]])) });
    }
  };
  const fault = eachRow(text, take);
  if (fault) errors.push(fault);
  if (errors.length > 0) return { ok: false, errors };
  if (!columns) return { ok: false, errors: [{ row: 1, message: 'the file is empty' }] };
  if (rows.length === 0) return { ok: false, errors: [{ row: 1, message: 'the file has one row: the first names the columns, and the rows below it hold the values' }] };
  return { ok: true, columns, rows };
}

/** Hands over each row that is not empty; the fault that ends the reading early, or null. */
function eachRow(text: string, take: (row: number, cells: string[]) => void): RowError | null {
  try {
    parse(text, {
      bom: true,
      delimiter: separatorOf(text),
      relax_column_count: true,
      skip_empty_lines: true,
      trim: true,
      on_record: (cells: string[], { records, empty_lines }) => {
        if (cells.some((cell) => cell !== '')) take(records + empty_lines, cells);
        return null;
      },
    });
    return null;
  } catch (error) {
    if (!(error instanceof CsvError)) throw error;
    const { records = 0, empty_lines = 0 } = error as { records?: number; empty_lines?: number };
    return { row: records + empty_lines + 1, message: `${error.message}. Put a value that holds quotes or line ends in quotes, and double the quotes in it (RFC 4180)` };
  }
}

/** The mark that splits the header into most columns. */
function separatorOf(text: string): string {
  const counts = new Map([[',', 0], [';', 0], ['\t', 0]]);
  let quoted = false;
  let named = false;
  for (const mark of text) {
    if (mark === '"') quoted = !quoted;
    else if (quoted) continue;
    else if (mark !== '\n' && mark !== '\r') named = true;
    else if (named) break;
    const count = counts.get(mark);
    if (count !== undefined) counts.set(mark, count + 1);
  }
  return [...counts].reduce((best, next) => (next[1] > best[1] ? next : best))[0];
}

function namesFaults(columns: readonly string[]): string[] {
  return columns.flatMap((name, i) => {
    if (name === '') return `column ${i + 1} has no name in the header`;
    return columns.indexOf(name) < i ? `two columns are named "${name.slice(0, 40)}": give each its own name` : [];
  });
}
