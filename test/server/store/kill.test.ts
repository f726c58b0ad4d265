import { spawn } from 'node:child_process';
import { mkdtempSync, rmSync } from 'node:fs';
import { tmpdir } from 'node:os';
import { join } from 'node:path';
import { fileURLToPath } from 'node:url';
import { sql } from 'kysely';
import { afterAll, beforeAll, expect, test } from 'vitest';
import { openStore } from '../../../server/store';
import { bulletin } from '../http/world';
import { EVENT_ID } from './acceptUntilKilled';

const folder = mkdtempSync(join(tmpdir(), 'leeboard-kill-'));
const settings = { DATA_DIR: folder, DATABASE_URL: undefined };
const text = bulletin('al012004.fstadv.012');

beforeAll(async () => {
  const store = await openStore(settings);
  await store.events.add({ id: EVENT_ID, name: 'Quillon', timeZone: 'UTC', exercise: false, demo: false, clock: null, createdAt: '2031-09-19T09:00:00.000Z' });
  await store.close();
});
afterAll(() => rmSync(folder, { recursive: true, force: true }));

/** Lets a process accept advisories until it has said so many lines, then kills it in the midst of the next. */
function acceptThenKill(lines: number): Promise<string[]> {
  const child = spawn(process.execPath, ['--import', 'tsx', fileURLToPath(new URL('./acceptUntilKilled.ts', import.meta.url)), folder, text.toString('base64')], { stdio: ['ignore', 'pipe', 'inherit'] });
  let said = '';
  return new Promise((resolve, reject) => {
    child.stdout.on('data', (part: Buffer) => {
      said += part.toString();
      if (said.split('\n').length > lines) child.kill('SIGKILL');
    });
    child.on('error', reject);
    child.on('close', (code, signal) => (signal === 'SIGKILL' ? resolve(said.split('\n').slice(0, -1)) : reject(new Error(`The process ended by itself with ${code}.`))));
  });
}

const said = { advisories: new Map<string, number>(), revision: 0 };

test.each([1, 2, 7, 20, 41])('killed after %i answers, every advisory that was answered is there and no revision goes back', async (lines) => {
  for (const line of await acceptThenKill(lines)) {
    const [what, value, sequence] = line.split(' ');
    if (what === 'advisory') said.advisories.set(value, Number(sequence));
    else said.revision = Number(value);
  }
  const store = await openStore(settings);
  const { rows } = await sql<{ integrity_check: string }>`pragma integrity_check`.execute(store.shared.db);
  expect(rows).toEqual([{ integrity_check: 'ok' }]);

  expect(said.advisories.size).toBeGreaterThan(0);
  for (const [id, sequence] of said.advisories) {
    expect(await store.advisories.get(EVENT_ID, id), id).toMatchObject({ sequence });
    expect(Buffer.compare((await store.advisories.source(EVENT_ID, id))!.bytes, text)).toBe(0);
  }

  const { revision } = (await store.events.get(EVENT_ID))!;
  expect(revision).toBeGreaterThanOrEqual(said.revision);
  if (revision > 0) {
    // A revision is there whole, or not at all.
    const impact = (await store.impacts.get(EVENT_ID, revision))!;
    expect(await store.impacts.current(EVENT_ID)).toEqual(impact);
    expect((await store.impacts.bulk(EVENT_ID, revision, 'assets'))?.length).toBe(200_000);
    expect((await store.impacts.publish({ impact, bulk: { assets: Buffer.alloc(200_000) } })).revision).toBe(revision + 1);
  }
  expect(await store.impacts.get(EVENT_ID, revision + 2)).toBeNull();
  await store.close();
});

test('the disk has an advisory before it is answered: SQLite writes ahead and waits for the disk at every commit (sqlite.org, PRAGMA synchronous)', async () => {
  const store = await openStore(settings);
  const pragma = async (name: string): Promise<unknown> => Object.values((await sql.raw<Record<string, unknown>>(`pragma ${name}`).execute(store.shared.db)).rows[0])[0];
  expect(await pragma('journal_mode')).toBe('wal');
  expect(await pragma('synchronous'), 'FULL').toBe(2);
  expect(await pragma('foreign_keys')).toBe(1);
  await store.close();
});
