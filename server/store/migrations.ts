import type { Kysely, Migration, MigrationProvider } from 'kysely';
import type { Engine } from './engine';

/** One set of migrations for both engines, in the order of their names. A migration that has shipped is never edited. */
export function migrations(engine: Engine): MigrationProvider {
  const all: Record<string, Migration> = { '001-first': first(engine) };
  return { getMigrations: () => Promise.resolve(all) };
}

const first = ({ bytes }: Engine): Migration => ({
  async up(db: Kysely<unknown>) {
    await db.schema
      .createTable('events')
      .addColumn('id', 'text', (c) => c.primaryKey())
      .addColumn('name', 'text', (c) => c.notNull())
      .addColumn('time_zone', 'text', (c) => c.notNull())
      .addColumn('exercise', 'integer', (c) => c.notNull())
      .addColumn('demo', 'integer', (c) => c.notNull())
      .addColumn('clock', 'text')
      .addColumn('created_at', 'text', (c) => c.notNull())
      .addColumn('revision', 'integer', (c) => c.notNull())
      .addColumn('advisory_id', 'text')
      .execute();
    await db.schema
      .createTable('advisories')
      .addColumn('id', 'text', (c) => c.primaryKey())
      .addColumn('event_id', 'text', (c) => c.notNull().references('events.id'))
      .addColumn('sequence', 'integer', (c) => c.notNull())
      .addColumn('storm', 'text', (c) => c.notNull())
      .addColumn('number', 'text', (c) => c.notNull())
      .addColumn('issued_at', 'text', (c) => c.notNull())
      .addColumn('body', 'text', (c) => c.notNull())
      .addColumn('format', 'text', (c) => c.notNull())
      .addColumn('warnings', 'text', (c) => c.notNull())
      .addColumn('received_at', 'text', (c) => c.notNull())
      .addColumn('received_by', 'text', (c) => c.notNull())
      .addColumn('supersedes', 'text')
      .addColumn('idempotency_key', 'text')
      .addColumn('source', bytes, (c) => c.notNull())
      .addColumn('content_type', 'text', (c) => c.notNull())
      .addColumn('file_name', 'text')
      .addUniqueConstraint('advisories_sequence', ['event_id', 'sequence'])
      .addUniqueConstraint('advisories_idempotency', ['event_id', 'idempotency_key'])
      .execute();
    await db.schema
      .createTable('layers')
      .addColumn('id', 'text', (c) => c.primaryKey())
      .addColumn('event_id', 'text', (c) => c.notNull().references('events.id'))
      .addColumn('kind', 'text', (c) => c.notNull())
      .addColumn('name', 'text', (c) => c.notNull())
      .addColumn('version', 'integer', (c) => c.notNull())
      .addColumn('rows', 'integer', (c) => c.notNull())
      .addColumn('classes', 'text', (c) => c.notNull())
      .addColumn('received_at', 'text', (c) => c.notNull())
      .addColumn('received_by', 'text', (c) => c.notNull())
      .addColumn('source', bytes, (c) => c.notNull())
      .addColumn('content_type', 'text', (c) => c.notNull())
      .addColumn('file_name', 'text')
      .addUniqueConstraint('layers_version', ['event_id', 'kind', 'name', 'version'])
      .execute();
    await db.schema
      .createTable('impacts')
      .addColumn('event_id', 'text', (c) => c.notNull().references('events.id'))
      .addColumn('revision', 'integer', (c) => c.notNull())
      .addColumn('advisory_id', 'text', (c) => c.notNull().references('advisories.id'))
      .addColumn('stage', 'text', (c) => c.notNull())
      .addColumn('body', 'text', (c) => c.notNull())
      .addPrimaryKeyConstraint('impacts_key', ['event_id', 'revision'])
      .execute();
    await db.schema.createIndex('impacts_advisory').on('impacts').columns(['advisory_id', 'stage', 'revision']).execute();
    await db.schema
      .createTable('bulk')
      .addColumn('event_id', 'text', (c) => c.notNull())
      .addColumn('revision', 'integer', (c) => c.notNull())
      .addColumn('name', 'text', (c) => c.notNull())
      .addColumn('bytes', bytes, (c) => c.notNull())
      .addPrimaryKeyConstraint('bulk_key', ['event_id', 'revision', 'name'])
      .execute();
    await db.schema
      .createTable('log')
      .addColumn('id', 'text', (c) => c.primaryKey())
      .addColumn('event_id', 'text', (c) => c.notNull().references('events.id'))
      .addColumn('sequence', 'integer', (c) => c.notNull())
      .addColumn('kind', 'text', (c) => c.notNull())
      .addColumn('text', 'text', (c) => c.notNull())
      .addColumn('zone_id', 'text')
      .addColumn('made_by', 'text', (c) => c.notNull())
      .addColumn('at', 'text', (c) => c.notNull())
      .addColumn('recorded_at', 'text', (c) => c.notNull())
      .addColumn('idempotency_key', 'text')
      .addUniqueConstraint('log_sequence', ['event_id', 'sequence'])
      .addUniqueConstraint('log_idempotency', ['event_id', 'idempotency_key'])
      .execute();
  },
});
