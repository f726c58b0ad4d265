import { CsvError, parse } from 'csv-parse/browser/esm/sync';
import { failed } from './draft';
import { readTable } from './table';
import type { Place, Read } from './draft';
import type { Row } from './table';

/** A record as csv-parse gives it with `info`: its fields, and the line it ends on. */
interface CsvRecord {
  record: string[];
  info: { lines: number };
}

/**
 * Reads a table of points in CSV (RFC 4180, or with semicolons or tabs): a header with units in its
 * names, then a row a point, in order of time.
 */
export function readCsv(text: string): Read {
  let records: CsvRecord[];
  try {
    records = parse(text, { delimiter: delimiterOf(text), info: true, trim: true, skip_empty_lines: true, relax_column_count: true }) as unknown as CsvRecord[];
  } catch (error) {
    if (!(error instanceof CsvError)) throw error;
    return failed({ ...(typeof error.lines === 'number' ? { line: error.lines } : {}), message: `this is not CSV: ${mendFor(error.code)}` });
  }
  const [header, ...body] = records;
  if (header === undefined) return failed({ line: 1, message: 'no header line was found: the first line names the columns' });
  const names = header.record;
  const twice = names.find((name, index) => name !== '' && names.indexOf(name) !== index);
  if (twice !== undefined) return failed({ line: header.info.lines, message: `the header names "${twice}" twice: keep one` });
  if (body.length === 0) return failed({ line: header.info.lines, message: 'no point follows the header: add a row for each position' });

  const long = body.find(({ record }) => record.length > names.length);
  if (long !== undefined) return failed({ line: long.info.lines, message: `this row has ${long.record.length} fields but the header names ${names.length}: put text that holds the separator in double quotes` });
  const lines = text.split(/\r\n|\n|\r/);
  return readTable(body.map((record) => rowOf(record, names, lines[record.info.lines - 1] ?? '', delimiterOf(text))), 'column');
}

function rowOf({ record, info }: CsvRecord, names: readonly string[], physical: string, delimiter: string): Row {
  // With quotes about, fields cannot be counted by separators: the line alone is given.
  const starts = physical.includes('"') ? null : fieldStarts(physical, delimiter);
  const placeOf = (name: string): Place => {
    const column = starts?.[names.indexOf(name)];
    return column === undefined ? { line: info.lines } : { line: info.lines, column };
  };
  return { cells: new Map(names.flatMap((name, index) => (name === '' ? [] : [[name, record[index]] as const]))), placeOf };
}

function fieldStarts(line: string, delimiter: string): number[] {
  let column = 1;
  return line.split(delimiter).map((field) => {
    const start = column + (field.length - field.trimStart().length);
    column += field.length + 1;
    return start;
  });
}

/** The separator that the header line holds most of. */
function delimiterOf(text: string): string {
  const header = text.trimStart().split(/[\r\n]/, 1)[0]!;
  return [',', ';', '\t'].reduce((best, candidate) => (header.split(candidate).length > header.split(best).length ? candidate : best));
}

function mendFor(code: string): string {
  switch (code) {
    case 'CSV_QUOTE_NOT_CLOSED':
      return 'a double quote is opened and never closed';
    case 'CSV_INVALID_CLOSING_QUOTE':
    case 'INVALID_OPENING_QUOTE':
      return 'a double quote stands inside a field: double it, and put the whole field in double quotes';
    default:
      return `it breaks off here (${code})`;
  }
}
