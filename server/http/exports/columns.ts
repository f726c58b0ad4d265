import type { AssetRow, ZoneRow } from '../../../lib/impact';
import { THRESHOLD_KEYS } from '../../../lib/units';
import type { Cell } from './csv';

/** A column of a table: its head, with the unit, and its value in a row. */
export type Column<Row> = readonly [head: string, value: (row: Row) => Cell];

const MOMENTS = ['track', 'early', 'median', 'late'] as const;
const SPREAD = ['track', 'mean', 'p10', 'p50', 'p90'] as const;

type Winded = Pick<ZoneRow, 'maxWindKt' | 'gustKt' | 'rainMm' | 'chance' | 'arrival' | 'end'>;

const wind: readonly Column<Winded>[] = [
  ['maxWindKt', (row) => row.maxWindKt],
  ['gustKt', (row) => row.gustKt],
  ['rainMm', (row) => row.rainMm],
  ...THRESHOLD_KEYS.map((kt): Column<Winded> => [`chance${kt}Kt`, (row) => row.chance[kt]]),
];
const times: readonly Column<Winded>[] = THRESHOLD_KEYS.flatMap((kt) =>
  (['arrival', 'end'] as const).flatMap((which) => MOMENTS.map((moment): Column<Winded> => [`${which}${kt}Kt_${moment}_utc`, (row) => row[which][kt][moment]])),
);

export const ZONE_COLUMNS: readonly Column<ZoneRow>[] = [
  ['id', (row) => row.id],
  ['name', (row) => row.name],
  ['people', (row) => row.people],
  ['clearanceHours', (row) => row.clearanceHours],
  ['startBy_utc', (row) => row.startBy],
  ...wind,
  ...THRESHOLD_KEYS.flatMap((kt) => SPREAD.map((value): Column<ZoneRow> => [`peopleAtOrAbove${kt}Kt_${value}`, (row) => row.peopleAtOrAbove[kt][value]])),
  ...times,
];

export const ASSET_COLUMNS: readonly Column<AssetRow>[] = [
  ['id', (row) => row.id],
  ['layer', (row) => row.layer],
  ['class', (row) => row.class],
  ['name', (row) => row.name],
  ['lon', (row) => row.lon],
  ['lat', (row) => row.lat],
  ['people', (row) => row.people],
  ...wind,
  ...times,
];
