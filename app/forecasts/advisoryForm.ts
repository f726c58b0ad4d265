import type { Advisory, InputError } from '../../lib/advisory';

/** One row of the form as typed. */
export interface PointRow {
  key: number;
  validAt: string;
  lat: string;
  lon: string;
  maxWindKt: string;
  gustKt: string;
  minPressureHpa: string;
  r34: string;
  r50: string;
  r64: string;
}
export const POINT_FIELDS = ['validAt', 'lat', 'lon', 'maxWindKt', 'gustKt', 'minPressureHpa', 'r34', 'r50', 'r64'] as const;
export type PointField = (typeof POINT_FIELDS)[number];

export interface AdvisoryForm {
  stormName: string;
  stormId: string;
  number: string;
  centre: string;
  issuedAt: string;
  nextDueAt: string;
  averaging: Advisory['averaging'];
  rows: PointRow[];
}

export const emptyRow = (key: number): PointRow => ({ key, validAt: '', lat: '', lon: '', maxWindKt: '', gustKt: '', minPressureHpa: '', r34: '', r50: '', r64: '' });
export const emptyForm = (): AdvisoryForm => ({ stormName: '', stormId: '', number: '', centre: '', issuedAt: '', nextDueAt: '', averaging: '1-min', rows: [emptyRow(0), emptyRow(1), emptyRow(2)] });

/** `2031-09-19 09:00`, with or without T, seconds and Z, as ISO in UTC; other text goes through for the server to name. */
export function toInstant(typed: string): string {
  const match = /^(\d{4})-(\d{2})-(\d{2})[ T](\d{2}):?(\d{2})(?::(\d{2}))?\s*(?:Z|UTC)?$/i.exec(typed.trim());
  return match ? `${match[1]}-${match[2]}-${match[3]}T${match[4]}:${match[5]}:${match[6] ?? '00'}Z` : typed.trim();
}

/** A number, or the text itself: the server says what is wrong with it and where. */
const toNumber = (typed: string): number | string => (typed.trim() !== '' && Number.isFinite(Number(typed)) ? Number(typed) : typed.trim());

function toRadii(typed: string): unknown {
  const parts = typed.trim().split(/[\s,;/]+/);
  if (parts.length !== 4) return typed.trim();
  const [ne, se, sw, nw] = parts.map(toNumber);
  return { ne, se, sw, nw };
}

const blank = (row: PointRow): boolean => POINT_FIELDS.every((field) => row[field].trim() === '');

/** The form as the body of a request: rows left blank are left out, blank fields are not given. */
export function toBody(form: AdvisoryForm): unknown {
  const points = form.rows.filter((row) => !blank(row)).map((row) => {
    const radii = (['34', '50', '64'] as const).flatMap((key) => (row[`r${key}`].trim() === '' ? [] : [[key, toRadii(row[`r${key}`])] as const]));
    return {
      validAt: toInstant(row.validAt),
      lat: toNumber(row.lat),
      lon: toNumber(row.lon),
      maxWindKt: toNumber(row.maxWindKt),
      ...(row.gustKt.trim() === '' ? {} : { gustKt: toNumber(row.gustKt) }),
      ...(row.minPressureHpa.trim() === '' ? {} : { minPressureHpa: toNumber(row.minPressureHpa) }),
      ...(radii.length === 0 ? {} : { radiiNm: Object.fromEntries(radii) }),
    };
  });
  return {
    storm: { name: form.stormName.trim(), ...(form.stormId.trim() === '' ? {} : { id: form.stormId.trim() }) },
    number: form.number.trim(),
    centre: form.centre.trim(),
    issuedAt: toInstant(form.issuedAt),
    ...(form.nextDueAt.trim() === '' ? {} : { nextDueAt: toInstant(form.nextDueAt) }),
    averaging: form.averaging,
    points,
  };
}

/** Which field of which row an error stands in: `points.2.radiiNm.34.ne` is r34 of the third row that is not blank. */
export function errorsByCell(errors: readonly InputError[], form: AdvisoryForm): { cells: Map<string, string>; fields: Map<string, string>; rest: InputError[] } {
  const cells = new Map<string, string>();
  const fields = new Map<string, string>();
  const rest: InputError[] = [];
  const rows = form.rows.filter((row) => !blank(row));
  for (const error of errors) {
    const parts = (error.path ?? '').split(/[.[\]]+/).filter(Boolean);
    const row = parts[0] === 'points' ? rows[Number(parts[1])] : undefined;
    const field = parts[2] === 'radiiNm' ? `r${parts[3]}` : parts[2];
    if (row && POINT_FIELDS.includes(field as PointField)) cells.set(`${row.key}.${field}`, error.message);
    else if (['storm', 'number', 'centre', 'issuedAt', 'nextDueAt', 'averaging'].includes(parts[0])) fields.set(parts[0] === 'storm' && parts[1] === 'id' ? 'stormId' : parts[0] === 'storm' ? 'stormName' : parts[0], error.message);
    else rest.push(error);
  }
  return { cells, fields, rest };
}

/** Rows of a spreadsheet pasted into a cell: laid over the table from there, adding rows as needed. */
export function pasted(rows: readonly PointRow[], atRow: number, atField: PointField, clipboard: string): PointRow[] {
  const first = POINT_FIELDS.indexOf(atField);
  const next = [...rows];
  const lines = clipboard.replace(/\r/g, '').split('\n').filter((line, i, all) => line !== '' || i < all.length - 1);
  lines.forEach((line, i) => {
    const key = atRow + i < next.length ? next[atRow + i].key : Math.max(-1, ...next.map((row) => row.key)) + 1;
    const row = { ...(next[atRow + i] ?? emptyRow(key)) };
    line.split('\t').forEach((cell, j) => {
      const field = POINT_FIELDS[first + j];
      if (field) row[field] = cell.trim();
    });
    next[atRow + i] = row;
  });
  return next;
}
