import { afterEach, beforeEach, expect, test } from 'vitest';
import fc from 'fast-check';
import { plainAckSchema } from '../../../lib/wire';
import { CLIENT_MESSAGE_BYTES } from '../../../server/live/limits';
import { advisory } from '../../app/sample';
import { ask, connected, hearing, joined, liveWorld, refused, settled } from './world';
import type { LiveWorld } from './world';

let world: LiveWorld;
beforeEach(async () => {
  world = await liveWorld();
});
afterEach(() => world.close());

test.each([
  ['no payload', 'join', []],
  ['a null payload', 'join', [null]],
  ['a revision below zero', 'join', [{ eventId: 'e1', revision: -1 }]],
  ['a revision that is no whole number', 'join', [{ eventId: 'e1', revision: 1.5 }]],
  ['an event id that is no text', 'join', [{ eventId: { $ne: 1 }, revision: null }]],
  ['an empty event id', 'leave', [{ eventId: '' }]],
  ['a revision seen as text', 'seen', [{ eventId: 'e1', revision: '1' }]],
  ['a name that is no message', 'publish', [{ eventId: 'e1' }]],
  ['a name every object has', 'constructor', [{}]],
])('rule 6: %s is answered as a bad message, and the connection stays', async (_what, name, args) => {
  const client = await connected(world.client());
  const ack = await ask(client, name, ...args);
  expect(plainAckSchema.parse(ack)).toMatchObject({ ok: false, code: 'bad-message' });
  expect(await joined(client, null)).toMatchObject({ ok: true });
});

test('rule 6: whatever JSON a client sends, it is answered', async () => {
  const client = await connected(world.client());
  await fc.assert(
    fc.asyncProperty(fc.constantFrom('join', 'leave', 'seen', 'toString', 'x'), fc.array(fc.jsonValue(), { maxLength: 3 }), async (name, args) => {
      expect(plainAckSchema.safeParse(await ask(client, name, ...args)).success).toBe(true);
    }),
    { numRuns: 200, seed: 20261201 },
  );
});

test('rule 6: a bad message without an acknowledgement harms nobody', async () => {
  const client = await connected(world.client());
  (client as unknown as { emit(name: string, body: unknown): void }).emit('join', 'nonsense');
  expect(await joined(client, null)).toMatchObject({ ok: true });
});

test('a screen says what it has seen only of an event it joined', async () => {
  const client = await connected(world.client());
  expect(await ask(client, 'seen', { eventId: 'e1', revision: 1 })).toMatchObject({ ok: false, code: 'not-found' });
  await joined(client, null);
  expect(await ask(client, 'seen', { eventId: 'e1', revision: 1 })).toEqual({ ok: true });
});

test('rule 5: messages sent at once are answered in the order they were sent', async () => {
  const client = await connected(world.client());
  const order: string[] = [];
  await Promise.all([
    joined(client, null).then((ack) => order.push(`join ${ack.ok}`)),
    ask(client, 'seen', { eventId: 'e1', revision: 0 }).then((ack) => order.push(`seen ${ack.ok}`)),
    ask(client, 'leave', { eventId: 'e1' }).then((ack) => order.push(`leave ${ack.ok}`)),
    ask(client, 'seen', { eventId: 'e1', revision: 0 }).then((ack) => order.push(`seen ${ack.ok}`)),
  ]);
  expect(order).toEqual(['join true', 'seen true', 'leave true', 'seen false']);
});

test('rule 5: a screen that asks faster than it can be answered is told so', async () => {
  const client = await connected(world.client());
  const answers = await Promise.all(Array.from({ length: 500 }, () => joined(client, null)));
  expect(answers.some((ack) => ack.ok)).toBe(true);
  expect(answers.filter((ack) => !ack.ok).every((ack) => !ack.ok && ack.code === 'failed')).toBe(true);
  expect(answers.some((ack) => !ack.ok)).toBe(true);
});

test('rule 13: a message above the limit ends that connection alone, which comes back', async () => {
  const other = await connected(world.client());
  const client = await connected(world.client());
  const back = new Promise<void>((resolve) => client.once('connect', resolve));
  client.emit('seen', { eventId: 'x'.repeat(CLIENT_MESSAGE_BYTES), revision: 1 });
  await back;
  expect(await joined(client, null)).toMatchObject({ ok: true });
  expect(await joined(other, null)).toMatchObject({ ok: true });
});

test('rule 7: a wrong key is refused with the code "unauthorized"', async () => {
  expect((await refused(world.client({ auth: { key: 'guessed' } }))).data?.code).toBe('unauthorized');
});

test('rule 7: nobody enters without a key or a session', async () => {
  expect((await refused(world.client({ auth: {} }))).data?.code).toBe('unauthorized');
});

test('rule 7: a session cookie is enough', async () => {
  expect(await joined(await connected(world.client({ auth: {}, extraHeaders: { cookie: 'session=duty' } })), null)).toMatchObject({ ok: true });
});

test.each(['https://elsewhere.example', 'null', 'http://127.0.0.1:1'])('rule 7: the foreign origin %s is refused, with a good key too', async (origin) => {
  await expect(connected(world.client({ extraHeaders: { origin } }))).rejects.toThrow();
  await expect(connected(world.client({ extraHeaders: { origin }, transports: ['polling'] }))).rejects.toThrow();
});

test('rule 7: a name made to point at this machine is refused', async () => {
  await expect(connected(world.client({ extraHeaders: { host: 'rebound.example' } }))).rejects.toThrow();
});

test('rule 7: a page of this server is let in', async () => {
  await expect(connected(world.client({ extraHeaders: { origin: world.url } }))).resolves.toBeTruthy();
});

test('rule 7: nothing lives in the root namespace', async () => {
  const { io } = await import('socket.io-client');
  const root = io(world.url, { transports: ['websocket'], forceNew: true, auth: { key: 'viewer-key' } });
  const error = await new Promise<Error & { data?: { code?: string } }>((resolve) => root.once('connect_error', resolve));
  root.close();
  expect(error.data?.code).toBe('not-found');
});

test('rule 8: a revoked key is cut off at the next check and told why', async () => {
  const client = await connected(world.client());
  const other = await connected(world.client({ auth: { key: 'operator-key' } }));
  await joined(client, null);
  world.keys.delete('viewer-key');
  const why = new Promise<Error & { data?: { code?: string } }>((resolve) => client.once('connect_error', resolve));
  world.timers.pass(60_000);
  expect((await why).data?.code).toBe('unauthorized');
  expect(await joined(other, null)).toMatchObject({ ok: true });
});

test('rule 8: nobody is cut off because the check itself failed', async () => {
  const client = await connected(world.client());
  world.keys.get = () => {
    throw new Error('the store is away');
  };
  await world.live.identifyAll();
  expect(await joined(client, null)).toMatchObject({ ok: true });
});

test('an advisory, a log entry and a failed run reach every screen of the event, and no other', async () => {
  const watching = await connected(world.client());
  const idle = await connected(world.client());
  await joined(watching, null);
  const heard = [hearing(watching, 'advisory'), hearing(watching, 'log'), hearing(watching, 'failed')];
  const elsewhere = hearing(idle, 'advisory');
  const entry = { id: 'l1', eventId: 'e1', sequence: 1, kind: 'decision' as const, text: 'Zone 4 leaves at 06', zoneId: null, by: 'Duty desk', at: '2031-09-19T11:00:00Z', recordedAt: '2026-12-01T00:00:00Z' };
  world.bus.emit('advisory', { eventId: 'e1', advisory: advisory(1) });
  world.bus.emit('log', entry);
  world.bus.emit('failed', { eventId: 'e1', runId: 'r1', advisoryId: 'a1', message: 'no' });
  await settled(watching);
  await settled(idle);
  expect(heard).toMatchObject([[{ advisory: { id: 'a1' } }], [entry], [{ runId: 'r1' }]]);
  expect(elsewhere).toEqual([]);
});

test('rule 14: when the server closes, screens lose the transport and are not sent away', async () => {
  const client = await connected(world.client({ reconnection: false }));
  const reason = new Promise<string>((resolve) => client.once('disconnect', resolve));
  await world.live.close();
  expect(await reason).toBe('transport close');
});
