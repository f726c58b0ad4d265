import { CsvError, parse } from 'csv-parse/browser/esm/sync';
import { failed } from './draft';
import { MOST_POINTS } from './model';
import { readTable } from './table';
import type { Read } from './draft';
import type { Row } from './table';

/** Far above what a forecast has; a file with more holds something else. */
const MOST_COLUMNS = 1000;

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
    records = parse(text, { delimiter: delimiterOf(text), info: true, trim: true, skip_empty_lines: true, relax_column_count: true, to: MOST_POINTS + 2 }) as unknown as CsvRecord[];
  } catch (error) {
    if (!(error instanceof CsvError)) throw error;
    return failed({ ...(typeof error.lines === 'number' ? { line: error.lines } : {}), message: `this is not CSV: ${mendFor(error.code)}` });
  }
  const [header, ...body] = records;
  if (header === undefined) return failed({ line: 1, message: 'no header line was found: the first line names the columns' });
  const names = header.record;
  if (names.length > MOST_COLUMNS) return failed({ line: header.info.lines, message: `the header names ${names.length} columns, more than the ${MOST_COLUMNS} that any forecast needs` });
  const twice = names.find((name, index) => name !== '' && names.indexOf(name) !== index);
  if (twice !== undefined) return failed({ line: header.info.lines, message: `the header names "${twice}" twice: keep one` });
  if (body.length === 0) return failed({ line: header.info.lines, message: 'no point follows the header: add a row for each position' });

  const long = body.find(({ record }) => record.length > names.length);
  if (long !== undefined) return failed({ line: long.info.lines, message: `this row has ${long.record.length} fields but the header names ${names.length}: put text that holds the separator in double quotes` });
  const lines = text.split(/\r\n|\n|\r/);
  const placing = (info: CsvRecord['info']): Row['placeOf'] => placesOn(info.lines, lines[info.lines - 1] ?? '', names, delimiterOf(text));
  const rows = body.map(({ record, info }) => ({ cells: new Map(names.flatMap((name, index) => (name === '' ? [] : [[name, record[index]] as const]))), placeOf: placing(info) }));
  return readTable(rows, 'column', placing(header.info));
}

/** Where the fields of a line start. With quotes about, they cannot be counted by separators: the line alone is given. */
function placesOn(line: number, physical: string, names: readonly string[], delimiter: string): Row['placeOf'] {
  const starts = new Map<string, number>();
  let column = 1;
  physical.split(delimiter).forEach((field, index) => {
    starts.set(names[index] ?? '', column + (field.length - field.trimStart().length));
    column += field.length + delimiter.length;
  });
  return (name) => {
    const start = physical.includes('"') || name === '' ? undefined : starts.get(name);
    return start === undefined ? { line } : { line, column: start };
  };
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
