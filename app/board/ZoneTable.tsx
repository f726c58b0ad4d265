'use client';
import { getCoreRowModel, useReactTable } from '@tanstack/react-table';
import { useVirtualizer } from '@tanstack/react-virtual';
import { useMemo, useState } from 'react';
import type { Impact } from '../../lib/impact';
import { EXPORTS, exportUrl } from '../http/api';
import { useFormats, useHold, useView } from '../live/EventContext';
import { words } from '../words';
import { useRowHeight } from './useRowHeight';
import { useRowScroll } from './useRowScroll';
import { zoneColumns } from './zoneColumns';
import { ZoneHead } from './ZoneHead';
import { ZoneRowLine } from './ZoneRowLine';
import styles from './ZoneTable.module.css';
import type { ZoneView } from './zoneView';

/** Zones by slack: who must act next, with a real table's semantics; only the rows in sight are made. */
export function ZoneTable({ zones, impact }: { zones: ZoneView[]; impact: Impact | null }) {
  const { view } = useHold();
  const formats = useFormats();
  const sort = useView((state) => state.sort);
  const [scroller, setScroller] = useState<HTMLDivElement | null>(null);
  const rowPx = useRowHeight();
  const stage = impact?.stage ?? 'track';
  const columns = useMemo(() => zoneColumns(formats, stage), [formats, stage]);
  // eslint-disable-next-line react-hooks/incompatible-library -- no compiler runs here; both libraries are safe without one
  const table = useReactTable({ data: zones, columns, getCoreRowModel: getCoreRowModel(), getRowId: (zone) => zone.id, manualSorting: true });
  const rows = table.getRowModel().rows;
  const virtual = useVirtualizer({ count: rows.length, getScrollElement: () => scroller, estimateSize: () => rowPx, overscan: 12 });
  useRowScroll(scroller, 'table', rowPx);
  const seen = virtual.getVirtualItems();
  const above = seen[0]?.start ?? 0;
  const below = virtual.getTotalSize() - (seen[seen.length - 1]?.end ?? 0);
  const noneReached = impact !== null && zones.length > 0 && zones.every((zone) => !zone.reached);

  return (
    <section className={styles.zones} aria-label={words.zones.title} id="zones">
      {impact !== null && impact.zones.length === 0 && <p className={styles.none}>{words.zones.none}</p>}
      {noneReached && <p className={styles.none}>{words.zones.noneReached}</p>}
      <div className={`${styles.scroller} scroll`} ref={setScroller} tabIndex={0} role="region" aria-label={words.zones.caption}>
        {zones.length > 0 && (
          <table className={styles.table} aria-rowcount={rows.length + 1} style={{ '--row': `${rowPx}px` } as React.CSSProperties}>
            <caption className="unseen">{words.zones.caption}</caption>
            <ZoneHead columns={table.getFlatHeaders()} sort={sort} onSort={(next) => view.setState({ sort: next, firstRow: 0 })} />
            <tbody>
              {above > 0 && <tr aria-hidden="true" style={{ height: above }} />}
              {seen.map(({ index }) => (
                <ZoneRowLine key={rows[index].id} row={rows[index]} index={index} formats={formats} />
              ))}
              {below > 0 && <tr aria-hidden="true" style={{ height: below }} />}
            </tbody>
          </table>
        )}
      </div>
      {impact && zones.length > 0 && (
        <p className={styles.foot}>
          {words.zones.foot(impact.evacuation.zonesReached['34'], zones.length)}{' '}
          {impact.evacuation.zonesWithoutClearance > 0 && `${words.zones.footUnknown(impact.evacuation.zonesWithoutClearance)} `}
          {words.zones.footSlack} {words.zones.files}:{' '}
          {EXPORTS.map((name) => (
            <a key={name} href={exportUrl(impact.eventId, name, impact.revision)} download>
              {name}
            </a>
          ))}
        </p>
      )}
    </section>
  );
}
