import { columnOf, REQUIRED } from './columns';
import { shown } from './instants';
import type { Column } from './columns';
import type { InputError, Warning } from './model';
import type { Row } from './table';

export type TableColumns = { ok: true; columns: Map<string, Column>; warnings: Warning[] } | { ok: false; errors: InputError[] };

const WANTED = { time: 'the time of each position', lat: 'the latitude', lon: 'the longitude', maxWindKt: 'the maximum sustained wind' } as const;

/** Tells what the names of a table mean, once for all rows; a point's four needs must be among them. */
export function tableColumns(rows: readonly Row[], word: 'column' | 'property', headed: Row['placeOf']): TableColumns {
  const columns = new Map<string, Column>();
  const errors: InputError[] = [];
  const warnings: Warning[] = [];
  const seen = new Set<string>();
  const nameOf = new Map<string, string>();
  const learn = (name: string, place: ReturnType<Row['placeOf']>): void => {
    const column = columnOf(name);
    if (column === null) {
      warnings.push({ code: 'column-unknown', ...place, message: `the ${word} "${shown(name)}" is not one that is read and was left out` });
      return;
    }
    const other = nameOf.get(meaning(column));
    if (column.kind === 'unit-missing') errors.push({ ...place, message: `the ${word} "${shown(name)}" does not say its unit: name it ${column.hint}` });
    else if (other !== undefined) errors.push({ ...place, message: `"${shown(name)}" and "${shown(other)}" say the same thing: keep one of them` });
    nameOf.set(meaning(column), name);
    columns.set(name, column);
  };
  for (const row of rows) {
    for (const name of row.cells.keys()) {
      if (seen.has(name)) continue;
      seen.add(name);
      learn(name, (word === 'column' ? headed : row.placeOf)(name));
    }
  }
  for (const need of ['time', 'lat', 'lon', 'maxWindKt'] as const) {
    if (!nameOf.has(need)) errors.push({ ...headed(''), message: `no ${word} gives ${WANTED[need]}: name one ${REQUIRED[need]}` });
  }
  return errors.length > 0 ? { ok: false, errors } : { ok: true, columns, warnings };
}

const meaning = (column: Column): string => (column.kind === 'radius' ? `${column.threshold}${column.quadrant}` : 'field' in column ? column.field : column.kind);
