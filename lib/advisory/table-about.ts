import { isAbsent } from './table';
import { parseInstant, shown } from './instants';
import type { AboutField, Column } from './columns';
import type { InputError, Warning } from './model';
import type { Row } from './table';

interface About {
  advisory: Record<string, unknown>;
  errors: InputError[];
  warnings: Warning[];
}

const TIMES = new Set<AboutField>(['issuedAt', 'nextDueAt', 'dissipatesAt']);

/** Reads what the rows say of the whole advisory; what they do not say is assumed, with a warning. */
export function about(rows: readonly Row[], columns: ReadonlyMap<string, Column>, firstValidAt: string | undefined, headed: Row['placeOf']): About {
  const errors: InputError[] = [];
  const said = new Map<AboutField, string>();
  for (const [name, column] of columns) {
    if (column.kind !== 'about') continue;
    const found = agreed(rows, name, errors);
    if (found === null) continue;
    const time = TIMES.has(column.field) ? parseInstant(found.text) : null;
    if (time?.ok === false) errors.push({ path: column.field, ...found.row.placeOf(name), message: `${name}: ${time.message}` });
    else said.set(column.field, time?.ok === true ? time.instant : found.text);
  }

  const warnings: Warning[] = [];
  const assume = (field: AboutField, path: string, value: string, message: string): string => {
    const given = said.get(field);
    if (given !== undefined) return given;
    warnings.push({ code: `${field.toLowerCase()}-assumed`, path, ...headed(''), message });
    return value;
  };
  const issuedAt = assume('issuedAt', 'issuedAt', firstValidAt ?? '', 'no issue time is given: the first position\'s time was taken; add issuedAt');
  const number = assume('number', 'number', issuedAt.replace(/\D/g, '').slice(0, 10), 'no advisory number is given: the issue time was taken; add number');
  const id = said.get('stormId');
  const advisory: Record<string, unknown> = {
    storm: { ...(id === undefined ? {} : { id }), name: assume('stormName', 'storm.name', id ?? 'Unnamed', 'no storm name is given; add stormName') },
    number,
    centre: assume('centre', 'centre', 'not stated', 'no issuing centre is given; add centre'),
    issuedAt,
    averaging: assume('averaging', 'averaging', '1-min', 'nothing says over how long the winds are averaged: read as 1-minute winds; add averaging, 1-min or 10-min'),
  };
  for (const field of ['nextDueAt', 'dissipatesAt'] as const) if (said.has(field)) advisory[field] = said.get(field);
  return { advisory, errors, warnings };
}

/** The one value a column has in all rows that fill it. */
function agreed(rows: readonly Row[], name: string, errors: InputError[]): { text: string; row: Row } | null {
  let first: { text: string; row: Row } | null = null;
  for (const row of rows) {
    const cell = row.cells.get(name);
    if (isAbsent(cell)) continue;
    const text = (typeof cell === 'string' || typeof cell === 'number' ? String(cell) : (JSON.stringify(cell) ?? '')).trim();
    first ??= { text, row };
    if (text !== first.text) {
      errors.push({ ...row.placeOf(name), message: `${name} is "${shown(text)}" here and "${shown(first.text)}" before: one file holds one advisory of one storm` });
      return first;
    }
  }
  return first;
}
