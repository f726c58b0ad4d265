import { createColumnHelper } from '@tanstack/react-table';
import { formatChance, formatCount, formatHours, formatSpan } from '../../lib/units';
import type { Formats } from '../prefs/format';
import { words } from '../words';
import { ChanceCell } from './ChanceCell';
import { Slack } from './Slack';
import type { ZoneColumn, ZoneView } from './zoneView';

declare module '@tanstack/react-table' {
  // eslint-disable-next-line @typescript-eslint/no-unused-vars -- the library's own signature
  interface ColumnMeta<TData, TValue> {
    /** The whole meaning of the head, for the title and for screen readers. */
    long: string;
    /** Left out on narrow screens; the line under the name says it there. */
    wide?: boolean;
  }
}

const column = createColumnHelper<ZoneView>();

/** The columns of the zone table. The one called name is written by the row itself. */
export function zoneColumns(formats: Formats, stage: 'track' | 'members') {
  const early = stage === 'members';
  const meta = (long: string, wide = false) => ({ meta: { long, wide } });
  return [
    column.accessor('name', { header: words.zones.name, ...meta(words.zones.name) }),
    column.accessor('people', { header: words.zones.people, cell: (cell) => formatCount(cell.getValue()), ...meta(words.zones.people) }),
    column.accessor('chance34', { header: words.zones.chance('34 kt'), cell: (cell) => <ChanceCell chance={cell.getValue()} text={formatChance(cell.getValue())} />, ...meta(words.zones.chanceLong('34 kt'), true) }),
    column.accessor('chance64', { header: words.zones.chance('64 kt'), cell: (cell) => <ChanceCell chance={cell.getValue()} text={formatChance(cell.getValue())} />, ...meta(words.zones.chanceLong('64 kt'), true) }),
    column.accessor('arrivesMs', {
      header: early ? words.zones.early : words.zones.onTrack,
      cell: (cell) => formats.dayTime(cell.getValue()),
      ...meta(early ? words.zones.earlyLong : words.zones.onTrackLong, true),
    }),
    column.accessor('clearanceHours', { header: words.zones.clear, cell: (cell) => formatHours(cell.getValue()), ...meta(words.zones.clearLong, true) }),
    column.accessor('startByMs', { header: words.zones.startBy, cell: (cell) => formats.dayTime(cell.getValue()), ...meta(words.zones.startByLong) }),
    column.accessor('slackHours', { header: words.zones.slack, cell: (cell) => <Slack zone={cell.row.original} text={formatSpan(cell.getValue())} />, ...meta(words.zones.slackLong) }),
  ];
}

/** Columns whose first press sorts downward. */
export const DOWNWARD: ReadonlySet<ZoneColumn> = new Set(['people', 'chance34', 'chance64', 'clearanceHours']);
