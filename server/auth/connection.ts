import { join } from 'node:path';
import SQLite from 'better-sqlite3';
import pg from 'pg';
import type { Settings } from '../settings';

/** A connection of the auth library's own: its statements never fall inside a transaction of the store. */
export interface AuthConnection {
  database: SQLite.Database | pg.Pool;
  close(): Promise<void>;
}

export function openConnection({ DATABASE_URL, DATA_DIR }: Pick<Settings, 'DATABASE_URL' | 'DATA_DIR'>): AuthConnection {
  if (DATABASE_URL) {
    const pool = new pg.Pool({ connectionString: DATABASE_URL, max: 2 });
    return { database: pool, close: () => pool.end() };
  }
  const database = new SQLite(join(DATA_DIR, 'leeboard.db'));
  database.pragma('journal_mode = WAL');
  database.pragma('busy_timeout = 5000');
  return {
    database,
    async close() {
      database.close();
    },
  };
}
