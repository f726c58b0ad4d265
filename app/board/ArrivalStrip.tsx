'use client';
import { useVirtualizer } from '@tanstack/react-virtual';
import { useMemo, useState } from 'react';
import type { Impact } from '../../lib/impact';
import { useFormats } from '../live/EventContext';
import { words } from '../words';
import styles from './ArrivalStrip.module.css';
import { StripHead } from './StripHead';
import { StripLine } from './StripLine';
import { stripRow } from './stripView';
import { positionIn, sixHourLines, stripSpan } from './timeScale';
import { useRowScroll } from './useRowScroll';
import type { ZoneView } from './zoneView';

const ROW_PX = 25;

/** Time from left to right, a row a zone in the order of the table: what comes next, at one look. */
export function ArrivalStrip({ zones, impact, nowMs }: { zones: readonly ZoneView[]; impact: Impact | null; nowMs: number | null }) {
  const formats = useFormats();
  const [scroller, setScroller] = useState<HTMLDivElement | null>(null);
  useRowScroll(scroller, 'strip', ROW_PX);
  const byId = useMemo(() => new Map(impact?.zones.map((row) => [row.id, stripRow(row, impact.stage)])), [impact]);
  const rows = zones.flatMap((zone) => byId.get(zone.id) ?? []);
  const minuteMs = nowMs ?? 0;
  const span = useMemo(() => {
    const all = [...byId.values()];
    return stripSpan(minuteMs, all.flatMap((row) => row.bars.map((bar) => bar.lateMs ?? bar.endMs)), all.map((row) => row.startByMs));
  }, [byId, minuteMs]);
  const lines = useMemo(() => sixHourLines(span, formats.timeZone), [span, formats.timeZone]);
  // eslint-disable-next-line react-hooks/incompatible-library -- no compiler runs here
  const virtual = useVirtualizer({ count: rows.length, getScrollElement: () => scroller, estimateSize: () => ROW_PX, overscan: 8 });
  if (nowMs === null || !impact || rows.length === 0) return <section className={styles.strip} aria-label={words.strip.label}><h2 className={styles.title}>{words.strip.title}</h2><p className={styles.empty}>{words.strip.empty}</p></section>;
  return (
    <section className={styles.strip} aria-label={words.strip.label}>
      <div className={`${styles.sideways} scroll`} tabIndex={0} role="region" aria-label={words.strip.label}>
        <div className={styles.inner}>
          <StripHead span={span} lines={lines} nowMs={nowMs} formats={formats} />
          <div className={`${styles.scroller} scroll`} tabIndex={0} role="group" aria-label={words.strip.title} ref={setScroller}>
            <div className={styles.body} style={{ height: virtual.getTotalSize() }}>
              <div className={styles.grid} aria-hidden="true">
                {lines.map((line) => (
                  <i key={line.atMs} data-midnight={line.midnight} style={{ left: `${positionIn(span, line.atMs) * 100}%` }} />
                ))}
                <i className={styles.now} style={{ left: `${positionIn(span, nowMs) * 100}%` }} />
              </div>
              <ul>
                {virtual.getVirtualItems().map(({ index, start }) => (
                  <StripLine key={rows[index].id} row={rows[index]} span={span} nowMs={nowMs} topPx={start} formats={formats} />
                ))}
              </ul>
            </div>
          </div>
        </div>
      </div>
    </section>
  );
}
