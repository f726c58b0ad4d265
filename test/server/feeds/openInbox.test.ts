import { existsSync, mkdirSync, mkdtempSync, readdirSync, readFileSync, rmSync, utimesSync, writeFileSync } from 'node:fs';
import { tmpdir } from 'node:os';
import { join } from 'node:path';
import { pino } from 'pino';
import { afterEach, beforeEach, expect, test } from 'vitest';
import { makeBus } from '../../../server/bus';
import { openInbox } from '../../../server/feeds';
import { openStore } from '../../../server/store';
import type { OpenedStore } from '../../../server/store';
import { handTimers } from '../handTimers';
import { bulletin, plain } from '../http/world';

let dataDir: string;
let folder: string;
let store: OpenedStore;
let logged: string[];
let requested: string[];
const timers = handTimers();
const stops: (() => Promise<void>)[] = [];

beforeEach(async () => {
  dataDir = mkdtempSync(join(tmpdir(), 'leeboard-inbox-'));
  folder = join(dataDir, 'inbox');
  logged = [];
  requested = [];
  store = await openStore({ DATA_DIR: dataDir, DATABASE_URL: undefined });
  await store.events.add({ id: 'quillon', name: 'Quillon', timeZone: 'Etc/GMT+3', exercise: true, demo: false, clock: null, createdAt: '2031-09-19T00:00:00.000Z' });
});
afterEach(async () => {
  await Promise.all(stops.splice(0).map((stop) => stop()));
  await store.close();
  rmSync(dataDir, { recursive: true, force: true });
});

function open() {
  const inbox = openInbox({
    services: {
      store,
      bus: makeBus(),
      runs: { request: (id) => void requested.push(id), underWay: () => null, waiting: 0, resume: async () => {}, close: async () => {} },
      clock: { nowMs: () => Date.parse('2031-09-19T09:30:00Z') },
      logger: pino({ level: 'info' }, { write: (line: string) => void logged.push(line) }),
    },
    folder,
    timers,
  });
  stops.push(inbox.close);
  return inbox;
}
const put = (name: string, content: string | Uint8Array, eventId = 'quillon'): void => {
  mkdirSync(join(folder, eventId), { recursive: true });
  writeFileSync(join(folder, eventId, name), content);
};
const filesIn = (...path: string[]): string[] => (existsSync(join(folder, 'quillon', ...path)) ? readdirSync(join(folder, 'quillon', ...path)).sort() : []);
const numbers = async (): Promise<string[]> => (await store.advisories.list('quillon', { offset: 0, limit: 100 })).items.map((advisory) => advisory.number).sort();
const advisory = (number: string, issuedAt = plain.issuedAt): string => JSON.stringify({ ...plain, number, issuedAt });

test('every event has a folder to put forecasts into', async () => {
  await open().look();
  expect(readdirSync(folder)).toEqual(['quillon']);
});

test('a bulletin that lies still from one look to the next is issued, computed, and moved to done', async () => {
  const inbox = open();
  await inbox.look();
  put('012.txt', bulletin('al012004.fstadv.012'));
  await inbox.look();
  expect(await numbers()).toEqual([]);
  await inbox.look();
  const { items } = await store.advisories.list('quillon', { offset: 0, limit: 10 });
  expect(items).toMatchObject([{ number: '12', storm: { name: 'Alex' }, format: 'bulletin', receivedBy: 'watched folder' }]);
  expect(Buffer.from((await store.advisories.source('quillon', items[0].id))!.bytes)).toEqual(bulletin('al012004.fstadv.012'));
  expect(requested).toEqual(['quillon']);
  expect([filesIn(), filesIn('done')]).toEqual([['done'], ['012.txt']]);
});

test('it looks by itself, every two seconds', async () => {
  const inbox = open();
  await inbox.look();
  put('a.json', advisory('5'));
  timers.pass(2000);
  await inbox.look();
  timers.pass(2000);
  await inbox.look();
  expect(await numbers()).toEqual(['5']);
});

test('a file that is still growing waits', async () => {
  const inbox = open();
  const whole = bulletin('al012004.fstadv.012');
  for (const part of [0.3, 0.6, 1]) {
    put('growing.txt', whole.subarray(0, Math.round(whole.length * part)));
    await inbox.look();
    expect(await numbers()).toEqual([]);
  }
  await inbox.look();
  expect(await numbers()).toEqual(['12']);
});

test('what lay there while the server was away is taken after the next start', async () => {
  put('a.json', advisory('5'));
  const inbox = open();
  await inbox.look();
  await inbox.look();
  expect(await numbers()).toEqual(['5']);
});

test('files put in together are issued in the order they were written', async () => {
  for (const [name, number, minute] of [['z.json', '5', 1], ['a10.json', '7', 2], ['a9.json', '6', 2]] as const) {
    put(name, advisory(number, `2031-09-19T0${number}:00:00Z`));
    utimesSync(join(folder, 'quillon', name), 60 * minute, 60 * minute);
  }
  const inbox = open();
  await inbox.look();
  await inbox.look();
  const { items } = await store.advisories.list('quillon', { offset: 0, limit: 10 });
  expect(items.sort((a, b) => a.sequence - b.sequence).map(({ number }) => number)).toEqual(['5', '6', '7']);
});

test.each<[string, string, string | Uint8Array, RegExp]>([
  ['a photo renamed .txt', 'photo.txt', Buffer.from('ffd8ffe000104a46494600010100000100010000ffdb0043', 'hex'), /text/],
  ['an empty file', 'empty.txt', '', /empty/],
  ['a latitude of 95', 'far.json', JSON.stringify({ ...plain, points: [{ ...plain.points[0], lat: 95 }] }), /points.*lat.*latitude lies between -90 and 90/],
  ['a file of 6 MB', 'large.txt', Buffer.alloc(6_000_000, 'x'), /6000000 bytes.*5242880 at most/],
])('%s is moved to refused, with the reason beside it, and nothing is stored', async (_what, name, content, says) => {
  const inbox = open();
  put(name, content);
  await inbox.look();
  await inbox.look();
  expect(await numbers()).toEqual([]);
  expect(filesIn('refused')).toEqual([name, `${name}.txt`]);
  expect(readFileSync(join(folder, 'quillon', 'refused', name)).equals(Buffer.from(content as string))).toBe(true);
  expect(readFileSync(join(folder, 'quillon', 'refused', `${name}.txt`), 'utf8')).toMatch(says);
});

test('a bulletin with an error says at which line', async () => {
  const inbox = open();
  put('bad.txt', bulletin('al012004.fstadv.012').toString('latin1').replace(/MAX WIND +\d+ KT/, 'MAX WIND  MANY KT'));
  await inbox.look();
  await inbox.look();
  expect(readFileSync(join(folder, 'quillon', 'refused', 'bad.txt.txt'), 'utf8')).toMatch(/line \d+/);
});

test('a second file of the same name keeps the first', async () => {
  const inbox = open();
  for (const number of ['5', '6']) {
    put('latest.json', advisory(number));
    await inbox.look();
    await inbox.look();
  }
  expect(filesIn('done')).toEqual(['2-latest.json', 'latest.json']);
  expect(await numbers()).toEqual(['5', '6']);
});

test('a file met again after a crash between issuing and moving is moved, and not issued twice', async () => {
  const inbox = open();
  put('a.json', advisory('5'));
  await inbox.look();
  await inbox.look();
  put('a.json', advisory('5'));
  await inbox.look();
  await inbox.look();
  expect(await numbers()).toEqual(['5']);
  expect(filesIn('done')).toEqual(['2-a.json', 'a.json']);
  expect(requested).toEqual(['quillon']);
});

test('while the store is away nothing is moved, and it is taken afterwards', async () => {
  const inbox = open();
  put('a.json', advisory('5'));
  await inbox.look();
  const { add } = store.advisories;
  store.advisories.add = () => Promise.reject(new Error('disk full'));
  await inbox.look();
  await inbox.look();
  expect(filesIn()).toContain('a.json');
  expect(logged.filter((line) => line.includes('disk full'))).toHaveLength(1);
  store.advisories.add = add;
  await inbox.look();
  expect(await numbers()).toEqual(['5']);
});

test('a folder that is no event is complained of once, and its files stay', async () => {
  put('a.json', advisory('5'), 'quilon');
  const inbox = open();
  for (let n = 0; n < 3; n++) await inbox.look();
  expect(readdirSync(join(folder, 'quilon'))).toEqual(['a.json']);
  expect(logged.filter((line) => line.includes('quilon'))).toHaveLength(1);
});

test('hidden files, folders and what was dealt with are left alone', async () => {
  const inbox = open();
  put('.a.json.part', advisory('5'));
  mkdirSync(join(folder, 'quillon', 'archive'), { recursive: true });
  await inbox.look();
  await inbox.look();
  expect(await numbers()).toEqual([]);
  expect(filesIn()).toEqual(['.a.json.part', 'archive']);
});
