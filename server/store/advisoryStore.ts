import { randomUUID } from 'node:crypto';
import { advisorySchema } from '../../lib/advisory';
import type { Advisory } from '../../lib/advisory';
import type { NewAdvisory, Store } from './model';
import type { Database } from './openStore';
import { ADVISORY_COLUMNS, advisoryOf } from './rows';
import { bufferOver, countOf, listed, lockEvent } from './shared';

/** Advisories of one storm carry its identifier, or its name where they have none. */
const stormKey = ({ storm }: Advisory): string => storm.id ?? storm.name;

export function advisoryStore(database: Database): Store['advisories'] {
  const { db } = database;
  const chosen = (eventId: string) => db.selectFrom('advisories').select(ADVISORY_COLUMNS).where('event_id', '=', eventId);

  return {
    add: (input) =>
      db.transaction().execute(async (trx) => {
        await lockEvent(database, trx, input.eventId);
        if (input.idempotencyKey !== null) {
          const repeated = await trx
            .selectFrom('advisories')
            .select(ADVISORY_COLUMNS)
            .where('event_id', '=', input.eventId)
            .where('idempotency_key', '=', input.idempotencyKey)
            .executeTakeFirst();
          if (repeated) return { advisory: advisoryOf(repeated), repeated: true };
        }
        const before = await trx
          .selectFrom('advisories')
          .select(['id', 'sequence', 'storm', 'number'])
          .where('event_id', '=', input.eventId)
          .orderBy('sequence', 'desc')
          .execute();
        const superseded = before.find(({ storm, number }) => storm === stormKey(input.advisory) && number === input.advisory.number);
        const row = rowOf(input, (before[0]?.sequence ?? 0) + 1, superseded?.id ?? null);
        await trx.insertInto('advisories').values(row).execute();
        return { advisory: advisoryOf(row), repeated: false };
      }),
    async get(eventId, id) {
      const row = await chosen(eventId).where('id', '=', id).executeTakeFirst();
      return row ? advisoryOf(row) : null;
    },
    async ofKey(eventId, idempotencyKey) {
      const row = await chosen(eventId).where('idempotency_key', '=', idempotencyKey).executeTakeFirst();
      return row ? advisoryOf(row) : null;
    },
    async latest(eventId) {
      // An advisory that comes late does not push a newer forecast aside.
      const row = await chosen(eventId).orderBy('issued_at', 'desc').orderBy('sequence', 'desc').limit(1).executeTakeFirst();
      return row ? advisoryOf(row) : null;
    },
    async before(advisory) {
      const row = await chosen(advisory.eventId)
        .where('issued_at', '<', new Date(advisory.issuedAt).toISOString())
        .orderBy('issued_at', 'desc')
        .orderBy('sequence', 'desc')
        .limit(1)
        .executeTakeFirst();
      return row ? advisoryOf(row) : null;
    },
    async list(eventId, page) {
      const rows = await chosen(eventId).orderBy('sequence', 'desc').offset(page.offset).limit(page.limit).execute();
      return listed(rows.map(advisoryOf), await countOf(db, 'advisories', eventId), page);
    },
    async source(eventId, id) {
      const row = await db.selectFrom('advisories').select(['source', 'content_type', 'file_name']).where('event_id', '=', eventId).where('id', '=', id).executeTakeFirst();
      return row ? { bytes: row.source, contentType: row.content_type, fileName: row.file_name } : null;
    },
  };
}

function rowOf(input: NewAdvisory, sequence: number, supersedes: string | null) {
  const advisory = advisorySchema.parse(input.advisory);
  return {
    id: randomUUID(),
    event_id: input.eventId,
    sequence,
    storm: stormKey(advisory),
    number: advisory.number,
    // To the millisecond, so that text sorts as time.
    issued_at: new Date(advisory.issuedAt).toISOString(),
    body: JSON.stringify(advisory),
    format: input.format,
    warnings: JSON.stringify(input.warnings),
    received_at: input.receivedAt,
    received_by: input.receivedBy,
    supersedes,
    idempotency_key: input.idempotencyKey,
    source: bufferOver(input.source.bytes),
    content_type: input.source.contentType,
    file_name: input.source.fileName,
  };
}
