import { Readable } from 'node:stream';
import { setImmediate as nextTurn } from 'node:timers/promises';
import type { AssetRows } from '../../compute/bulk';
import { csvComment, csvLine } from './csv';
import { ASSET_COLUMNS, ZONE_COLUMNS } from './columns';
import type { Column } from './columns';
import { headingOf } from './heading';
import type { Exported } from './heading';

const ROWS_A_TURN = 250;

/** Heading, column heads, rows; made a few hundred rows at a time, so that others have their turn. */
async function* table<Row>(exported: Exported, columns: readonly Column<Row>[], count: number, rowAt: (index: number) => Row): AsyncGenerator<string> {
  yield headingOf(exported).map(csvComment).join('') + csvLine(columns.map(([head]) => head));
  for (let first = 0; first < count; first += ROWS_A_TURN) {
    let lines = '';
    for (let i = first; i < Math.min(count, first + ROWS_A_TURN); i++) {
      const row = rowAt(i);
      lines += csvLine(columns.map(([, value]) => value(row)));
    }
    yield lines;
    await nextTurn();
  }
}

export const zonesCsv = (exported: Exported): Readable => Readable.from(table(exported, ZONE_COLUMNS, exported.impact.zones.length, (i) => exported.impact.zones[i]), { objectMode: false });

export const assetsCsv = (exported: Exported, rows: AssetRows): Readable => Readable.from(table(exported, ASSET_COLUMNS, rows.count, rows.row), { objectMode: false });

/** The swath with its heading as a foreign member (RFC 7946, section 6.1). */
export function swathGeoJson(exported: Exported, peak: Uint8Array): Buffer {
  const { features } = JSON.parse(new TextDecoder().decode(peak)) as { features: unknown[] };
  const { event, impact, advisory } = exported;
  const about = { exercise: event.exercise, eventId: event.id, advisoryId: advisory.id, advisoryNumber: advisory.number, issuedAt: advisory.issuedAt, revision: impact.revision, note: headingOf(exported) };
  return Buffer.from(JSON.stringify({ type: 'FeatureCollection', about, features }));
}
