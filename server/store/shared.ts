import type { Kysely, Transaction } from 'kysely';
import type { Database } from './openStore';
import type { Listed, Page } from './model';
import type { Tables } from './tables';

type Db = Kysely<Tables> | Transaction<Tables>;

/** Holds the event's row until the transaction ends, so that sequences and revisions are given out one at a time. */
export async function lockEvent({ engine }: Database, trx: Transaction<Tables>, eventId: string): Promise<Tables['events']> {
  let query = trx.selectFrom('events').selectAll().where('id', '=', eventId);
  if (engine.locksRows) query = query.forUpdate();
  const row = await query.executeTakeFirst();
  if (!row) throw new Error(`There is no event ${eventId}.`);
  return row;
}

/** Rows of one event in a table. */
export async function countOf(db: Db, table: 'advisories' | 'layers' | 'log', eventId: string): Promise<number> {
  const { total } = await db
    .selectFrom(table)
    .select((e) => e.fn.countAll<number | string>().as('total'))
    .where('event_id', '=', eventId)
    .executeTakeFirstOrThrow();
  return Number(total);
}

export const listed = <T>(items: T[], total: number, { offset }: Page): Listed<T> => ({ items, total, offset });

/** The same bytes as both drivers want them, not copied. */
export const bufferOver = (bytes: Uint8Array): Buffer => Buffer.from(bytes.buffer, bytes.byteOffset, bytes.byteLength);
