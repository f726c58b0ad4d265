import { Kysely, Migrator, sql } from 'kysely';
import type { Settings } from '../settings';
import { advisoryStore } from './advisoryStore';
import { openEngine } from './engine';
import type { Engine } from './engine';
import { eventStore } from './eventStore';
import { impactStore } from './impactStore';
import { layerStore } from './layerStore';
import { logStore } from './logStore';
import { migrations } from './migrations';
import type { Store } from './model';
import type { Tables } from './tables';

/** What the parts of the store share. */
export interface Database {
  db: Kysely<Tables>;
  engine: Engine;
}

/** The store's query layer, for a library that keeps tables of its own in the same database. */
export interface SharedDatabase {
  db: Kysely<never>;
  engine: Engine['name'];
}

export interface OpenedStore extends Store {
  shared: SharedDatabase;
}

/** Opens the database that the settings name, bringing its tables up to date. Throws with one line when it cannot. */
export async function openStore(settings: Pick<Settings, 'DATABASE_URL' | 'DATA_DIR'>): Promise<OpenedStore> {
  const engine = openEngine(settings);
  const db = new Kysely<Tables>({ dialect: engine.dialect });
  const { error } = await new Migrator({ db, provider: migrations(engine) }).migrateToLatest();
  if (error) {
    await db.destroy();
    throw error instanceof Error ? error : new Error(String(error));
  }
  const database: Database = { db, engine };
  return {
    shared: { db: db as unknown as Kysely<never>, engine: engine.name },
    events: eventStore(database),
    advisories: advisoryStore(database),
    layers: layerStore(database),
    impacts: impactStore(database),
    log: logStore(database),
    async ping() {
      await sql`select 1`.execute(db);
    },
    close: () => db.destroy(),
  };
}
