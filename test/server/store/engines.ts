import { mkdtempSync, rmSync } from 'node:fs';
import { tmpdir } from 'node:os';
import { join } from 'node:path';
import { PGlite } from '@electric-sql/pglite';
import { PGLiteSocketServer } from '@electric-sql/pglite-socket';
import { openStore } from '../../../server/store';
import type { OpenedStore } from '../../../server/store';

export interface Opened {
  store: OpenedStore;
  close(): Promise<void>;
}

async function sqlite(): Promise<Opened> {
  const folder = mkdtempSync(join(tmpdir(), 'leeboard-store-'));
  const store = await openStore({ DATA_DIR: folder, DATABASE_URL: undefined });
  return {
    store,
    async close() {
      await store.close();
      rmSync(folder, { recursive: true, force: true });
    },
  };
}

/**
 * PostgreSQL compiled to WebAssembly behind a socket, so that the real driver and its pool are what is tested. One connection:
 * it is one session, and messages of several would mix (electric-sql/pglite issue 1046).
 */
async function postgres(): Promise<Opened> {
  const database = await PGlite.create();
  const server = new PGLiteSocketServer({ db: database, port: 0, host: '127.0.0.1' });
  await server.start();
  const store = await openStore({ DATA_DIR: '', DATABASE_URL: `postgres://postgres@${server.getServerConn()}/postgres` }, { connections: 1 });
  return {
    store,
    async close() {
      await store.close();
      await server.stop();
      await database.close();
    },
  };
}

/** A PostgreSQL of your own, with an empty database for these tests alone: many connections, and real locks between them. */
const ownServer = process.env.LEEBOARD_TEST_DATABASE_URL;
async function postgresServer(): Promise<Opened> {
  const store = await openStore({ DATA_DIR: '', DATABASE_URL: ownServer });
  return { store, close: () => store.close() };
}

export const ENGINES: [string, () => Promise<Opened>][] = [
  ['SQLite', sqlite],
  ['PostgreSQL', postgres],
  ...(ownServer ? [['a PostgreSQL server', postgresServer] as [string, () => Promise<Opened>]] : []),
];
