import { mkdtempSync, rmSync } from 'node:fs';
import type { AddressInfo } from 'node:net';
import { tmpdir } from 'node:os';
import { join } from 'node:path';
import { pino } from 'pino';
import { io } from 'socket.io-client';
import type { Socket } from 'socket.io-client';
import { afterAll, beforeAll, expect, test } from 'vitest';
import { openAuth } from '../../../server/auth';
import { makeBus } from '../../../server/bus';
import { openPool } from '../../../server/compute/pool';
import { openRuns } from '../../../server/compute/runs';
import { eventDescriber } from '../../../server/describeEvent';
import { buildHttp } from '../../../server/http';
import { openLive } from '../../../server/live';
import { readSettings } from '../../../server/settings';
import { stopsInReverse } from '../../../server/stops';
import { openStore } from '../../../server/store';

/**
 * A program written from the published contract alone: it knows the names of calls and messages, and takes nothing from the
 * project's code. The server below is whole: store, people, compute threads, HTTP and sockets.
 */
const KEY = 'contract-client-contract-client';
const stops = stopsInReverse();
let url = '';

beforeAll(async () => {
  const dataDir = mkdtempSync(join(tmpdir(), 'leeboard-contract-'));
  stops.add(async () => rmSync(dataDir, { recursive: true, force: true }));
  const settings = readSettings({ LEEBOARD_DATA_DIR: dataDir, LEEBOARD_BOOTSTRAP_KEY: KEY, LEEBOARD_MEMBERS: '20', LEEBOARD_LOG_LEVEL: 'silent' });
  const logger = pino({ level: settings.LOG_LEVEL });
  const clock = { nowMs: () => Date.now() };
  const store = await openStore(settings);
  stops.add(() => store.close());
  const bus = makeBus();
  const pool = openPool(1);
  const runs = openRuns({ settings, store, bus, logger, clock, demoCoastFile: '', pool });
  stops.add(() => runs.close());
  const services = { settings, logger, store, auth: await openAuth(store, settings, 'http://127.0.0.1'), bus, runs, clock, version: 'test', inspectLayer: pool.inspectLayer, describeEvent: eventDescriber({ clock }, async () => 0) };
  const http = await buildHttp(services);
  stops.add(() => http.close());
  const live = openLive(http.server, services);
  stops.add(() => live.close());
  await http.listen({ host: '127.0.0.1', port: 0 });
  url = `http://127.0.0.1:${(http.server.address() as AddressInfo).port}`;
});
afterAll(() => stops.run());

/* eslint-disable-next-line @typescript-eslint/no-explicit-any -- what a program in another language would see: JSON */
type Json = any;

async function call(method: string, path: string, body?: string | object, type = 'application/json'): Promise<Json> {
  const answer = await fetch(`${url}/api/v1${path}`, {
    method,
    headers: { authorization: `Bearer ${KEY}`, ...(body === undefined ? {} : { 'content-type': type }) },
    ...(body === undefined ? {} : { body: typeof body === 'string' ? body : JSON.stringify(body) }),
  });
  const json = (await answer.json()) as Json;
  if (!answer.ok) throw new Error(`${method} ${path} answered ${answer.status}: ${JSON.stringify(json)}`);
  return json;
}

const advisory = (number: number, lon: number): object => ({
  storm: { name: 'Quillon' },
  number: String(number),
  centre: 'Exercise centre',
  issuedAt: `2031-09-19T${String(3 + 3 * number).padStart(2, '0')}:00:00Z`,
  averaging: '1-min',
  points: [0, 12, 24, 36].map((hours) => ({
    validAt: new Date(Date.UTC(2031, 8, 19, 3 + 3 * number + hours)).toISOString().replace('.000', ''),
    lat: 22 + hours / 12,
    lon: lon - hours / 10,
    maxWindKt: 80,
    radiiNm: { '34': { ne: 120, se: 100, sw: 80, nw: 110 }, '64': { ne: 30, se: 25, sw: 20, nw: 25 } },
  })),
});

/** Keeps what is said under each name, and waits for the next thing wanted. */
function listen(socket: Socket) {
  const heard: { name: string; message: Json }[] = [];
  let waiting: { wanted: (name: string, message: Json) => boolean; done: (message: Json) => void }[] = [];
  socket.onAny((name: string, message: Json) => {
    heard.push({ name, message });
    for (const one of waiting.filter(({ wanted }) => wanted(name, message))) one.done(message);
    waiting = waiting.filter(({ wanted }) => !wanted(name, message));
  });
  return {
    heard,
    of: (name: string): Json[] => heard.filter((one) => one.name === name).map(({ message }) => message),
    until: (wanted: (name: string, message: Json) => boolean): Promise<Json> => {
      const already = heard.find(({ name, message }) => wanted(name, message));
      return already ? Promise.resolve(already.message) : new Promise((done) => void waiting.push({ wanted, done }));
    },
  };
}

const open = (options: object = {}): Socket => io(`${url}/live`, { auth: { key: KEY }, forceNew: true, ...options });
const ask = (socket: Socket, name: string, message: object): Promise<Json> => new Promise((resolve) => socket.emit(name, message, resolve));
const members = (advisoryId: string) => (name: string, message: Json): boolean => name === 'impact' && message.advisoryId === advisoryId && message.stage === 'members';

test('it follows an exercise from the first join to what it missed, by the names of the contract', async () => {
  const event = await call('POST', '/events', { name: 'Quillon', timeZone: 'Etc/GMT+3', exercise: true, clock: { startsAt: '2031-09-19T08:00:00Z', rate: 1 } });
  await call('POST', `/events/${event.id}/layers?kind=population&name=people`, 'lat,lon,people\n22.5,-45.5,1000\n24.2,-46.8,2500\n', 'text/csv');

  const socket = open();
  const ear = listen(socket);
  const snapshot = await ask(socket, 'join', { eventId: event.id, revision: null });
  expect(snapshot).toMatchObject({ ok: true, snapshot: { event: { id: event.id, revision: 0 }, impact: null } });
  expect(await ear.until((name) => name === 'clock')).toMatchObject({ eventId: event.id, rate: 1, now: expect.stringMatching(/^2031-09-19T08:00:\d\d/) });
  expect(await ear.until((name) => name === 'presence')).toMatchObject({ eventId: event.id, screens: [{ role: 'admin' }] });

  const first = await call('POST', `/events/${event.id}/advisories`, advisory(1, -45));
  await ear.until(members(first.advisory.id));
  expect(ear.of('advisory')).toMatchObject([{ eventId: event.id, advisory: { id: first.advisory.id, number: '1' } }]);
  const impacts = ear.of('impact');
  expect(impacts.map(({ revision, stage }) => `${revision} ${stage}`)).toEqual(['1 track', '2 members']);
  for (const impact of impacts) expect(Object.keys(impact)).toEqual(expect.arrayContaining(['eventId', 'revision', 'advisoryId', 'stage', 'totals', 'zones', 'classes', 'change']));
  expect(impacts[1].totals.people).toBe(3500);
  for (const progress of ear.of('progress')) expect(progress).toEqual({ eventId: event.id, runId: expect.any(String), done: expect.any(Number), of: expect.any(Number) });
  const names = ear.heard.map(({ name }) => name).filter((name) => name === 'advisory' || name === 'impact');
  expect(names).toEqual(['advisory', 'impact', 'impact']);
  expect(await ask(socket, 'seen', { eventId: event.id, revision: 2 })).toEqual({ ok: true });

  await call('POST', `/events/${event.id}/log`, { kind: 'decision', text: 'Zone 4 leaves at 06' });
  expect(await ear.until((name) => name === 'log')).toMatchObject({ eventId: event.id, kind: 'decision', text: 'Zone 4 leaves at 06' });

  // Away for two advisories, watched by another screen.
  socket.disconnect();
  const other = open();
  const otherEar = listen(other);
  await ask(other, 'join', { eventId: event.id, revision: null });
  for (const number of [2, 3]) {
    const { advisory: next } = await call('POST', `/events/${event.id}/advisories`, advisory(number, -45 + number / 10));
    await otherEar.until(members(next.id));
  }
  const { revision: now } = await call('GET', `/events/${event.id}`);
  socket.connect();
  const back = await ask(socket, 'join', { eventId: event.id, revision: 2 });
  expect(back.missed.map((impact: Json) => impact.revision)).toEqual(Array.from({ length: now - 2 }, (_, n) => n + 3));
  expect(await call('GET', `/events/${event.id}/impact`)).toMatchObject({ revision: now, totals: back.missed.at(-1).totals });

  expect(await ask(socket, 'leave', { eventId: event.id })).toEqual({ ok: true });
  socket.close();
  other.close();
});

test.each<[string, object]>([
  ['a wrong key', { auth: { key: 'not-a-key' } }],
  ['no key', { auth: {} }],
])('with %s it is refused as unauthorized', async (_what, options) => {
  const socket = open(options);
  const error = await new Promise<Error & { data?: { code: string } }>((resolve) => socket.once('connect_error', resolve));
  socket.close();
  expect(error.data?.code).toBe('unauthorized');
});
