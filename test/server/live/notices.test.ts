import { afterEach, beforeEach, expect, test } from 'vitest';
import { presenceApartMs } from '../../../server/live/limits';
import { connected, hearing, joined, liveWorld, settled } from './world';
import type { Client, LiveWorld } from './world';

let world: LiveWorld;
beforeEach(async () => {
  world = await liveWorld();
});
afterEach(() => world.close());

const screen = async (key = 'viewer-key'): Promise<Client> => {
  const client = await connected(world.client({ auth: { key } }));
  await joined(client, null);
  return client;
};
const progress = (done: number, runId = 'r1'): void => world.bus.emit('progress', { eventId: 'e1', runId, done, of: 100 });

test('rule 9: a hundred steps within a second are at most five notices, the last among them', async () => {
  const client = await screen();
  const heard = hearing(client, 'progress');
  for (let done = 1; done <= 100; done++) {
    progress(done);
    world.timers.pass(9);
  }
  await settled(client);
  expect(heard.length).toBeLessThanOrEqual(5);
  world.timers.pass(200);
  await settled(client);
  expect(heard[0].done).toBe(1);
  expect(heard.at(-1)!.done).toBe(100);
});

test('rule 9: no progress follows the impact that ends the run', async () => {
  const client = await screen();
  const heard = hearing(client, 'progress');
  progress(1);
  progress(100);
  world.publish({ stage: 'members' });
  world.timers.pass(1000);
  await settled(client);
  expect(heard.map(({ done }) => done)).toEqual([1]);
});

test('rule 9: no progress follows a failed run', async () => {
  const client = await screen();
  const heard = hearing(client, 'progress');
  progress(1);
  progress(2);
  world.bus.emit('failed', { eventId: 'e1', runId: 'r1', advisoryId: 'a1', message: 'no' });
  world.timers.pass(1000);
  await settled(client);
  expect(heard.map(({ done }) => done)).toEqual([1]);
});

test('rule 10: the clock follows a join, a change, and every ten seconds', async () => {
  const client = await connected(world.client());
  const heard = hearing(client, 'clock');
  await joined(client, null);
  await settled(client);
  expect(heard).toEqual([{ eventId: 'e1', now: '2031-09-19T11:00:00.000Z', rate: 1 }]);

  const changed = next(client);
  world.record.clock = { startsAt: '2031-09-20T00:00:00Z', anchoredAt: '2026-12-01T00:00:00Z', rate: 60 };
  world.bus.emit('event', { eventId: 'e1' });
  expect(await changed).toEqual({ eventId: 'e1', now: '2031-09-20T00:00:00.000Z', rate: 60 });

  const ticked = next(client);
  world.wall.ms += 10_000;
  world.timers.pass(10_000);
  expect(await ticked).toEqual({ eventId: 'e1', now: '2031-09-20T00:10:00.000Z', rate: 60 });
});

test('rule 10: an event on the wall clock says so', async () => {
  world.record.clock = null;
  const client = await connected(world.client());
  const heard = next(client);
  await joined(client, null);
  expect(await heard).toEqual({ eventId: 'e1', now: '2026-12-01T00:00:00.000Z', rate: 1 });
});

test('rule 11: presence names who is there, in which role, and the revision each shows', async () => {
  world.commit();
  const wall = await screen();
  world.timers.pass(2000);
  const heard = hearing(wall, 'presence');
  const duty = await screen('operator-key');
  duty.emit('seen', { eventId: 'e1', revision: 1 });
  await settled(duty);
  world.timers.pass(2000);
  await settled(wall);
  expect(heard.at(-1)!.screens).toEqual([
    { id: wall.id, name: 'Wall', role: 'viewer', revision: null },
    { id: duty.id, name: 'Duty desk', role: 'operator', revision: 1 },
  ]);
});

test('rule 11: a screen that goes is missed', async () => {
  const wall = await screen();
  const duty = await screen('operator-key');
  world.timers.pass(2000);
  await settled(wall);
  const gone = new Promise<{ screens: unknown[] }>((resolve) => wall.once('presence', resolve));
  duty.close();
  expect((await gone).screens).toHaveLength(1);
});

test('rule 11: many changes within a second are one list at once and one at its end', async () => {
  const wall = await screen();
  world.timers.pass(2000);
  await settled(wall);
  const heard = hearing(wall, 'presence');
  for (let revision = 0; revision < 50; revision++) wall.emit('seen', { eventId: 'e1', revision });
  await settled(wall);
  expect(heard).toHaveLength(1);
  world.timers.pass(1000);
  await settled(wall);
  expect(heard).toHaveLength(2);
  expect(heard[1].screens[0].revision).toBe(49);
});

test('rule 11: a thousand screens are listed every twenty seconds at most', () => {
  expect([presenceApartMs(10), presenceApartMs(1000)]).toEqual([1000, 20_000]);
});

const next = (client: Client): Promise<{ eventId: string; now: string; rate: number }> => new Promise((resolve) => client.once('clock', resolve));
