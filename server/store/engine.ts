import { mkdirSync } from 'node:fs';
import { join } from 'node:path';
import SQLite from 'better-sqlite3';
import { PostgresDialect, sql, SqliteDialect } from 'kysely';
import type { Dialect, RawBuilder } from 'kysely';
import pg from 'pg';
import type { Settings } from '../settings';

/** What differs between the two engines: everything else is one code. */
export interface Engine {
  name: 'sqlite' | 'postgres';
  dialect: Dialect;
  /** The column type of bytes. */
  bytes: RawBuilder<unknown>;
  /** Row locks: SQLite has one writer and needs none. */
  locksRows: boolean;
}

export type EngineSettings = Pick<Settings, 'DATABASE_URL' | 'DATA_DIR'>;

/** `connections` is how many PostgreSQL is asked for at most; SQLite has one. */
export function openEngine({ DATABASE_URL, DATA_DIR }: EngineSettings, connections: number): Engine {
  return DATABASE_URL ? postgres(DATABASE_URL, connections) : sqlite(join(DATA_DIR, 'leeboard.db'), DATA_DIR);
}

function sqlite(file: string, folder: string): Engine {
  // Sessions and what people decided are in it: the owner's alone.
  mkdirSync(folder, { recursive: true, mode: 0o700 });
  const connection = new SQLite(file);
  connection.pragma('journal_mode = WAL');
  // FULL: an accepted advisory is on the disk, not only in the log's cache, before it is answered.
  connection.pragma('synchronous = FULL');
  connection.pragma('foreign_keys = ON');
  connection.pragma('busy_timeout = 5000');
  return { name: 'sqlite', dialect: new SqliteDialect({ database: connection }), bytes: sql`blob`, locksRows: false };
}

const CONNECT_WITHIN_MS = 10_000;

function postgres(url: string, connections: number): Engine {
  const connection = new pg.Pool({ connectionString: url, max: connections, connectionTimeoutMillis: CONNECT_WITHIN_MS, application_name: 'leeboard' });
  // An idle connection that breaks is replaced at the next use; if that fails, whoever uses it is told.
  connection.on('error', () => {});
  return { name: 'postgres', dialect: new PostgresDialect({ pool: connection }), bytes: sql`bytea`, locksRows: true };
}
