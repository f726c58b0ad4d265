import { mkdirSync, writeFileSync } from 'node:fs';
import { join } from 'node:path';
import { expect, test } from '@playwright/test';
import { newDataDir, removeDataDir, startServerProcess } from '../test/server/serverProcess';
import type { ServerProcess } from '../test/server/serverProcess';

/** The process as whoever installs it meets it: the built server, started, stopped and killed. */
let dataDir: string;
let server: ServerProcess | null = null;
test.beforeEach(() => {
  dataDir = newDataDir();
});
test.afterEach(async () => {
  await server?.end('SIGKILL');
  server = null;
  removeDataDir(dataDir);
});

interface EventAnswer {
  items: { id: string; revision: number; advisoryId: string | null; demo: boolean; advisoriesLeft: number | null }[];
}
const eventOf = async (from: ServerProcess) => ((await (await from.get('/api/v1/events')).json()) as EventAnswer).items[0];

test('the first start loads the exercise and prints one link that signs one person in, once', async ({ browser }) => {
  server = await startServerProcess(dataDir, { LEEBOARD_MEMBERS: '20' });
  await expect.poll(() => server!.printed()).toMatch(/^Leeboard is at [^\n]*\n$/);
  const links = [...server.printed().matchAll(/http:\/\/\S+\/sign-in\?token=\S+/g)].map(([link]) => link);
  expect(links).toHaveLength(1);
  expect(await eventOf(server)).toMatchObject({ demo: true, advisoriesLeft: 5 });

  const first = await (await browser.newContext()).newPage();
  await first.goto(links[0]);
  await first.waitForURL(/\/events\//);
  await expect(first.locator('tbody tr[aria-rowindex]').first()).toBeVisible();

  const second = await (await browser.newContext()).newPage();
  await second.goto(links[0]);
  await expect(second.getByText(/used before|out of date|used already|no longer/).first()).toBeVisible();
  expect((await second.request.get(`${server.url}/api/v1/events`)).status()).toBe(401);
});

test('Ctrl-C stops it cleanly, and the next start brings everything back without a link', async ({ browser }) => {
  server = await startServerProcess(dataDir, { LEEBOARD_MEMBERS: '20' });
  const before = await eventOf(server);
  const link = /http:\/\/\S+\/sign-in\?token=\S+/.exec(server.printed())![0];
  const page = await (await browser.newContext()).newPage();
  await page.goto(link);
  await page.waitForURL(/\/events\//);
  expect(await server.end('SIGINT')).toBe(0);

  server = await startServerProcess(dataDir, { LEEBOARD_MEMBERS: '20' });
  expect(server.printed()).not.toContain('sign-in?token');
  const after = await eventOf(server);
  expect(after.id).toBe(before.id);
  expect(after.revision).toBeGreaterThanOrEqual(before.revision);
});

test('killed while it computes, it keeps the advisory it answered for, computes it at the next start, and never goes back', async () => {
  server = await startServerProcess(dataDir, { LEEBOARD_MEMBERS: '400' });
  const { id, revision } = await eventOf(server);
  const answer = await server.post(`/api/v1/events/${id}/demo/next`, '{}', 'application/json');
  expect(answer.status).toBe(201);
  const { advisory } = (await answer.json()) as { advisory: { id: string; number: string } };
  await server.end('SIGKILL');

  server = await startServerProcess(dataDir, { LEEBOARD_MEMBERS: '20' });
  const kept = await server.get(`/api/v1/events/${id}/advisories/${advisory.id}`);
  expect(((await kept.json()) as { number: string }).number).toBe(advisory.number);
  await expect
    .poll(async () => {
      const impact = (await (await server!.get(`/api/v1/events/${id}/impact`)).json()) as { advisoryId: string; stage: string };
      return `${impact.advisoryId} ${impact.stage}`;
    }, { timeout: 60_000 })
    .toBe(`${advisory.id} members`);
  expect((await eventOf(server)).revision).toBeGreaterThan(revision);
});

test('a forecast put into the watched folder is issued and computed', async () => {
  server = await startServerProcess(dataDir, { LEEBOARD_MEMBERS: '20' });
  const { id, advisoryId } = await eventOf(server);
  const source = await server.get(`/api/v1/events/${id}/advisories/${advisoryId}/source`);
  const corrected = (await source.text()).replace(/ADVISORY NUMBER +(\d+)/i, 'ADVISORY NUMBER  $1...CORRECTED');
  const folder = join(dataDir, 'inbox', id);
  mkdirSync(folder, { recursive: true });
  writeFileSync(join(folder, 'corrected.txt'), corrected);
  await expect
    .poll(async () => {
      const impact = (await (await server!.get(`/api/v1/events/${id}/impact`)).json()) as { advisoryId: string; stage: string };
      return impact.advisoryId !== advisoryId && impact.stage;
    }, { timeout: 30_000 })
    .toBe('members');
});

test.describe('what stops the start is told in one line, and nothing else is printed', () => {
  const refusal = (env: Record<string, string>): Promise<string> =>
    startServerProcess(dataDir, env).then(
      () => 'it started',
      (error: Error) => error.message.replace('The server did not start: ', '').trim(),
    );

  test('a setting that is wrong', async () => {
    expect(await refusal({ LEEBOARD_MEMBERS: 'many' })).toMatch(/^Leeboard did not start: LEEBOARD_MEMBERS[^\n]*$/);
  });

  test('a port that is taken', async () => {
    server = await startServerProcess(dataDir, { LEEBOARD_MEMBERS: '20', LEEBOARD_DEMO: 'off' });
    expect(await refusal({ LEEBOARD_PORT: new URL(server.url).port })).toMatch(/^Leeboard did not start: [^\n]* is taken[^\n]*LEEBOARD_PORT[^\n]*$/);
  });

  test('a data folder that is a file', async () => {
    const file = join(dataDir, 'file');
    writeFileSync(file, '');
    expect(await refusal({ LEEBOARD_DATA_DIR: file })).toMatch(/^Leeboard did not start: LEEBOARD_DATA_DIR[^\n]*$/);
  });
});
