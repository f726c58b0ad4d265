import { randomUUID } from 'node:crypto';
import { promisify } from 'node:util';
import { gunzip, gzip } from 'node:zlib';
import type { Store } from './model';
import type { Database } from './openStore';
import { LAYER_COLUMNS, layerOf } from './rows';
import { countOf, listed, lockEvent } from './shared';

/** Layers are large and written on this thread: packed (on another thread) they take a fifth of the time and room. */
const pack = promisify(gzip);
const unpack = promisify(gunzip);
const FAST = { level: 1 };

export function layerStore(database: Database): Store['layers'] {
  const { db } = database;
  const chosen = (eventId: string) => db.selectFrom('layers').select(LAYER_COLUMNS).where('event_id', '=', eventId);
  return {
    async add(input) {
      const packed = await pack(input.source.bytes, FAST);
      return db.transaction().execute(async (trx) => {
        await lockEvent(database, trx, input.eventId);
        const before = await trx
          .selectFrom('layers')
          .select('version')
          .where('event_id', '=', input.eventId)
          .where('kind', '=', input.kind)
          .where('name', '=', input.name)
          .orderBy('version', 'desc')
          .limit(1)
          .executeTakeFirst();
        const row = {
          id: randomUUID(),
          event_id: input.eventId,
          kind: input.kind,
          name: input.name,
          version: (before?.version ?? 0) + 1,
          rows: input.rows,
          classes: JSON.stringify(input.classes),
          received_at: input.receivedAt,
          received_by: input.receivedBy,
          source: packed,
          content_type: input.source.contentType,
          file_name: input.source.fileName,
        };
        await trx.insertInto('layers').values(row).execute();
        return layerOf(row);
      });
    },
    async current(eventId) {
      const rows = await chosen(eventId).orderBy('kind').orderBy('name').orderBy('version', 'desc').execute();
      return rows.map(layerOf).filter((layer, i, all) => i === 0 || layer.kind !== all[i - 1].kind || layer.name !== all[i - 1].name);
    },
    async list(eventId, page) {
      const rows = await chosen(eventId).orderBy('received_at', 'desc').orderBy('id').offset(page.offset).limit(page.limit).execute();
      return listed(rows.map(layerOf), await countOf(db, 'layers', eventId), page);
    },
    async source(eventId, id) {
      const row = await db.selectFrom('layers').select(['source', 'content_type', 'file_name']).where('event_id', '=', eventId).where('id', '=', id).executeTakeFirst();
      return row ? { bytes: await unpack(row.source), contentType: row.content_type, fileName: row.file_name } : null;
    },
  };
}
