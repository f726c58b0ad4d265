import { flexRender } from '@tanstack/react-table';
import type { Header } from '@tanstack/react-table';
import { DEFAULT_SORT } from './zoneView';
import type { ZoneColumn, ZoneSort, ZoneView } from './zoneView';
import { DOWNWARD } from './zoneColumns';

/** Column heads that sort: first press the useful way, second the other, third back to slack. */
export function ZoneHead({ columns, sort, onSort }: { columns: Header<ZoneView, unknown>[]; sort: ZoneSort; onSort: (sort: ZoneSort) => void }) {
  const press = (column: ZoneColumn): void => {
    const first = DOWNWARD.has(column);
    if (sort.column !== column) onSort({ column, descending: first });
    else onSort(sort.descending === first ? { column, descending: !first } : DEFAULT_SORT);
  };
  return (
    <thead>
      <tr aria-rowindex={1}>
        {columns.map((header) => {
          const sorted = sort.column === header.id;
          const meta = header.column.columnDef.meta;
          return (
            <th key={header.id} scope="col" data-column={header.id} data-wide={meta?.wide} aria-sort={sorted ? (sort.descending ? 'descending' : 'ascending') : undefined}>
              <button type="button" title={meta?.long} onClick={() => press(header.id as ZoneColumn)} data-sorted={sorted}>
                {flexRender(header.column.columnDef.header, header.getContext())}
                {sorted && <span aria-hidden="true">{sort.descending ? ' ↓' : ' ↑'}</span>}
              </button>
            </th>
          );
        })}
      </tr>
    </thead>
  );
}
