'use client';
import { formatChance } from '../../lib/units';
import { useHold, useView } from '../live/EventContext';
import type { Formats } from '../prefs/format';
import { words } from '../words';
import styles from './ArrivalStrip.module.css';
import type { StripBar, StripRow } from './stripView';
import { positionIn } from './timeScale';
import type { TimeSpan } from './timeScale';

/** The words a listener gets for the picture of one row. */
function spoken(row: StripRow, formats: Formats): string {
  const winds = row.bars.map((bar) => (bar.endMs === null ? words.strip.windOpen(bar.threshold, formats.dayTime(bar.startMs)) : words.strip.wind(bar.threshold, formats.dayTime(bar.startMs), formats.dayTime(bar.endMs))));
  const parts = winds.length > 0 ? winds : [words.strip.noWind];
  if (row.startByMs !== null) parts.push(words.strip.startBy(formats.dayTime(row.startByMs)));
  if (row.chance34 !== null) parts.push(words.strip.chance(formatChance(row.chance34)));
  return words.strip.row(row.name, parts.join('; '));
}

function Bar({ bar, span }: { bar: StripBar; span: TimeSpan }) {
  const at = (ms: number): number => Math.max(0, Math.min(1, positionIn(span, ms))) * 100;
  const box = (from: number, to: number) => ({ left: `${at(from)}%`, width: `${Math.max(0, at(to) - at(from))}%` });
  const end = bar.endMs ?? span.toMs;
  const outer = bar.threshold === '34';
  return (
    <>
      {outer && bar.earlyMs !== null && bar.earlyMs < bar.startMs && <i className={styles.early} style={box(bar.earlyMs, bar.startMs)} />}
      <i className={styles.bar} data-band={bar.threshold} data-hollow={bar.chance !== null && bar.chance < 0.5} data-open={bar.endMs === null} style={box(bar.startMs, end)} />
      {outer && bar.lateMs !== null && bar.lateMs > end && <i className={styles.late} style={box(end, bar.lateMs)} />}
      {outer && <i className={styles.median} style={{ left: `${at(bar.startMs)}%` }} />}
    </>
  );
}

export function StripLine({ row, span, nowMs, topPx, formats }: { row: StripRow; span: TimeSpan; nowMs: number; topPx: number; formats: Formats }) {
  const { view } = useHold();
  const lit = useView((state) => state.hoverZone === row.id || state.selectedZone === row.id);
  return (
    <li
      className={styles.line}
      data-lit={lit}
      data-none={row.bars.length === 0}
      style={{ transform: `translateY(${topPx}px)` }}
      onPointerEnter={() => view.setState({ hoverZone: row.id, hoverMark: null })}
      onPointerLeave={() => view.setState({ hoverZone: null })}
    >
      <span className="unseen">{spoken(row, formats)}</span>
      <span className={styles.name} aria-hidden="true">
        {row.name}
      </span>
      <span className={styles.lane} aria-hidden="true">
        {row.bars.map((bar) => (
          <Bar key={bar.threshold} bar={bar} span={span} />
        ))}
        {row.startByMs !== null && <i className={styles.deadline} data-overdue={row.startByMs < nowMs} data-before={row.startByMs < span.fromMs} style={{ left: `${Math.max(0, positionIn(span, row.startByMs)) * 100}%` }} />}
      </span>
    </li>
  );
}
