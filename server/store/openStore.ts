import { Kysely, Migrator, sql } from 'kysely';
import { advisoryStore } from './advisoryStore';
import { openEngine } from './engine';
import type { Engine, EngineSettings } from './engine';
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

const CONNECTIONS = 8;

/** Opens the database that the settings name, bringing its tables up to date. Throws one line when it cannot. */
export async function openStore(settings: EngineSettings, { connections = CONNECTIONS } = {}): Promise<OpenedStore> {
  const { engine, db } = await openDatabase(settings, connections).catch((error: unknown) => {
    throw new Error(cannotOpen(settings, error), { cause: error });
  });
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

async function openDatabase(settings: EngineSettings, connections: number): Promise<Database> {
  const engine = openEngine(settings, connections);
  const db = new Kysely<Tables>({ dialect: engine.dialect });
  const { error } = await new Migrator({ db, provider: migrations(engine) }).migrateToLatest();
  if (error === undefined) return { db, engine };
  await db.destroy();
  throw error;
}

/** Says which setting to look at, and never the password in it. */
function cannotOpen({ DATABASE_URL, DATA_DIR }: EngineSettings, error: unknown): string {
  const reason = reasonOf(error);
  if (!DATABASE_URL) return `LEEBOARD_DATA_DIR: the database in ${DATA_DIR} cannot be opened: ${reason}`;
  const { hostname, port, pathname } = new URL(DATABASE_URL);
  return `LEEBOARD_DATABASE_URL: PostgreSQL at ${hostname}${port ? `:${port}` : ''}${pathname} cannot be used: ${reason}`;
}

/** Several addresses that all failed come as one error without words of its own. */
const reasonOf = (error: unknown): string => (error instanceof AggregateError ? error.errors.map(reasonOf).join('; ') : error instanceof Error ? error.message : String(error));
