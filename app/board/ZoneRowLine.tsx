'use client';
import { flexRender } from '@tanstack/react-table';
import type { Row } from '@tanstack/react-table';
import { formatChance, formatHours } from '../../lib/units';
import { useHold, useView } from '../live/EventContext';
import type { Formats } from '../prefs/format';
import { words } from '../words';
import { bandOf } from '../theme/bands';
import styles from './ZoneTable.module.css';
import type { ZoneView } from './zoneView';

/** One zone. Pointing at it or reaching it by keyboard lights it in the map and the strip; pressing its name keeps it lit. */
export function ZoneRowLine({ row, index, formats }: { row: Row<ZoneView>; index: number; formats: Formats }) {
  const { view } = useHold();
  const zone = row.original;
  const lit = useView((state) => state.hoverZone === zone.id || state.selectedZone === zone.id);
  const selected = useView((state) => state.selectedZone === zone.id);
  const light = (id: string | null): void => view.setState({ hoverZone: id, hoverMark: null });
  return (
    <tr
      aria-rowindex={index + 2}
      className={styles.row}
      data-lit={lit}
      data-odd={index % 2 === 0}
      data-done={!zone.reached}
      onPointerEnter={() => light(zone.id)}
      onPointerLeave={() => light(null)}
    >
      {row.getVisibleCells().map((cell) => {
        const wide = cell.column.columnDef.meta?.wide;
        if (cell.column.id !== 'name')
          return (
            <td key={cell.id} data-wide={wide} data-column={cell.column.id}>
              {flexRender(cell.column.columnDef.cell, cell.getContext())}
            </td>
          );
        return (
          <th key={cell.id} scope="row" data-column="name">
            <button type="button" aria-pressed={selected} onFocus={() => light(zone.id)} onBlur={() => light(null)} onClick={() => view.setState({ selectedZone: selected ? null : zone.id })}>
              {zone.name}
            </button>
            <span className={styles.under}>
              <i data-band={bandOf(zone.maxWindKt) ?? 'none'} aria-hidden="true" />
              <span className={styles.peak}>{words.zones.peak(formats.wind(zone.maxWindKt), formats.wind(zone.gustKt))}</span>
              <span className={styles.narrow}>{words.zones.small(formatChance(zone.chance34), formats.dayTime(zone.arrivesMs), formatHours(zone.clearanceHours))}</span>
            </span>
          </th>
        );
      })}
    </tr>
  );
}
