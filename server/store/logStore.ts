import { randomUUID } from 'node:crypto';
import type { Store } from './model';
import type { Database } from './openStore';
import { logOf } from './rows';
import { countOf, listed, lockEvent } from './shared';

export function logStore(database: Database): Store['log'] {
  const { db } = database;
  return {
    add: (entry, idempotencyKey) =>
      db.transaction().execute(async (trx) => {
        await lockEvent(database, trx, entry.eventId);
        if (idempotencyKey !== null) {
          const repeated = await trx.selectFrom('log').selectAll().where('event_id', '=', entry.eventId).where('idempotency_key', '=', idempotencyKey).executeTakeFirst();
          if (repeated) return { entry: logOf(repeated), repeated: true };
        }
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
          idempotency_key: idempotencyKey,
        };
        await trx.insertInto('log').values(row).execute();
        return { entry: logOf(row), repeated: false };
      }),
    async list(eventId, page) {
      const rows = await db.selectFrom('log').selectAll().where('event_id', '=', eventId).orderBy('sequence', 'desc').offset(page.offset).limit(page.limit).execute();
      return listed(rows.map(logOf), await countOf(db, 'log', eventId), page);
    },
  };
}
