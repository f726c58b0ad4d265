import { CsvError, parse } from 'csv-parse/browser/esm/sync';
import type { Row } from './fields';
import type { RowError } from './model';

export type CsvRows = { ok: true; columns: string[]; rows: Row[]; decimalComma: boolean } | { ok: false; errors: RowError[] };

/** Rows of a CSV (RFC 4180) with a header; the separator is a comma, a semicolon or a tab, told from the header. */
export function csvRows(text: string): CsvRows {
  const header = text.slice(0, (text.indexOf('\n') + 1 || text.length + 1) - 1);
  const delimiter = [';', '\t', ','].find((mark) => header.includes(mark)) ?? ',';
  try {
    const records = parse(text, { bom: true, columns: true, delimiter, skip_empty_lines: true, trim: true, info: false }) as Record<string, string>[];
    if (records.length === 0) return { ok: false, errors: [{ row: 1, message: 'the file has a header but no rows below it' }] };
    return {
      ok: true,
      columns: Object.keys(records[0]),
      rows: records.map((values, i) => ({ row: i + 2, values })),
      decimalComma: delimiter === ';',
    };
  } catch (error) {
    if (!(error instanceof CsvError)) throw error;
    const lines = 'lines' in error && typeof error.lines === 'number' ? error.lines : 1;
    return { ok: false, errors: [{ row: lines, message: `this is not a well-formed CSV: ${error.message}` }] };
  }
}
