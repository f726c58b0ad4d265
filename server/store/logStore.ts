import { randomUUID } from 'node:crypto';
import type { Store } from './model';
import type { Database } from './openStore';
import { logOf } from './rows';
import { countOf, listed, lockEvent } from './shared';

export function logStore(database: Database): Store['log'] {
  const { db } = database;
  return {
    add: (entry) =>
      db.transaction().execute(async (trx) => {
        await lockEvent(database, trx, entry.eventId);
        const row = {
          id: randomUUID(),
          event_id: entry.eventId,
          sequence: (await countOf(trx, 'log', entry.eventId)) + 1,
          kind: entry.kind,
          text: entry.text,
          zone_id: entry.zoneId,
          made_by: entry.by,
          at: entry.at,
          recorded_at: entry.recordedAt,
        };
        await trx.insertInto('log').values(row).execute();
        return logOf(row);
      }),
    async list(eventId, page) {
      const rows = await db.selectFrom('log').selectAll().where('event_id', '=', eventId).orderBy('sequence', 'desc').offset(page.offset).limit(page.limit).execute();
      return listed(rows.map(logOf), await countOf(db, 'log', eventId), page);
    },
  };
}
