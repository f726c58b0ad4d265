import { setImmediate as nextTurn } from 'node:timers/promises';
import type { Store } from './model';
import type { Database } from './openStore';
import { impactOf } from './rows';
import { bufferOver, lockEvent } from './shared';

export function impactStore(database: Database): Store['impacts'] {
  const { db } = database;
  const chosen = (eventId: string) => db.selectFrom('impacts').select('body').where('event_id', '=', eventId);
  return {
    publish: ({ impact, bulk }) =>
      db.transaction().execute(async (trx) => {
        const event = await lockEvent(database, trx, impact.eventId);
        const published = { ...impact, revision: event.revision + 1 };
        const key = { event_id: impact.eventId, revision: published.revision };
        await trx
          .insertInto('impacts')
          .values({ ...key, advisory_id: impact.advisoryId, stage: impact.stage, body: JSON.stringify(published) })
          .execute();
        for (const [name, bytes] of Object.entries(bulk)) {
          await trx
            .insertInto('bulk')
            .values({ ...key, name: name as keyof typeof bulk, bytes: bufferOver(bytes) })
            .execute();
          // SQLite writes on this thread: megabytes go in one at a time, and others have their turn between.
          await nextTurn();
        }
        await trx.updateTable('events').set({ revision: published.revision, advisory_id: impact.advisoryId }).where('id', '=', impact.eventId).execute();
        return published;
      }),
    async get(eventId, revision) {
      const row = await chosen(eventId).where('revision', '=', revision).executeTakeFirst();
      return row ? impactOf(row) : null;
    },
    async current(eventId) {
      const row = await chosen(eventId).orderBy('revision', 'desc').limit(1).executeTakeFirst();
      return row ? impactOf(row) : null;
    },
    async since(eventId, revision, limit) {
      const rows = await chosen(eventId).where('revision', '>', revision).orderBy('revision', 'desc').limit(limit).execute();
      return rows.map(impactOf).reverse();
    },
    async ofAdvisory(advisoryId, stage) {
      const row = await db
        .selectFrom('impacts')
        .select('body')
        .where('advisory_id', '=', advisoryId)
        .where('stage', '=', stage)
        .orderBy('revision', 'desc')
        .limit(1)
        .executeTakeFirst();
      return row ? impactOf(row) : null;
    },
    async bulk(eventId, revision, name) {
      const row = await db
        .selectFrom('bulk')
        .select('bytes')
        .where('event_id', '=', eventId)
        .where('revision', '=', revision)
        .where('name', '=', name)
        .executeTakeFirst();
      return row ? row.bytes : null;
    },
  };
}
