import { afterEach, beforeEach, expect, test } from 'vitest';
import { joinAckSchema } from '../../../lib/wire';
import { MOST_MISSED } from '../../../server/live/limits';
import { advisory, zoneRow } from '../../app/sample';
import { connected, hearing, joined, liveWorld, settled } from './world';
import type { LiveWorld } from './world';

let world: LiveWorld;
beforeEach(async () => {
  world = await liveWorld();
});
afterEach(() => world.close());

const revisions = (heard: { revision: number }[]): number[] => heard.map(({ revision }) => revision);

test('rule 2: a screen that holds nothing gets a snapshot, with no impact before the first', async () => {
  const ack = await joined(await connected(world.client()), null);
  expect(joinAckSchema.parse(ack)).toEqual(ack);
  expect(ack).toMatchObject({ ok: true, snapshot: { event: { id: 'e1', revision: 0, now: '2031-09-19T11:00:00.000Z' }, advisory: null, impact: null, computing: null } });
});

test('rule 2: the snapshot is the event, the newest advisory and the current impact', async () => {
  world.accept();
  world.commit();
  world.commit();
  expect(await joined(await connected(world.client()), null)).toMatchObject({ ok: true, snapshot: { event: { revision: 2 }, advisory: { id: 'a1' }, impact: { revision: 2 } } });
});

test('rule 2: a screen that holds revision 1 of 3 gets 2 and 3, in order', async () => {
  for (let n = 0; n < 3; n++) world.commit();
  const ack = await joined(await connected(world.client()), 1);
  expect(joinAckSchema.parse(ack)).toMatchObject({ ok: true, missed: [{ revision: 2 }, { revision: 3 }] });
});

test('rule 2: a screen that is up to date has missed nothing', async () => {
  world.commit();
  expect(await joined(await connected(world.client()), 1)).toEqual({ ok: true, missed: [] });
});

test('rule 2: a screen that holds revision 0 has missed all there are', async () => {
  world.commit();
  expect(await joined(await connected(world.client()), 0)).toMatchObject({ ok: true, missed: [{ revision: 1 }] });
});

test('rule 2: a screen ahead of the event gets a snapshot', async () => {
  world.commit();
  expect(await joined(await connected(world.client()), 7)).toMatchObject({ ok: true, snapshot: { impact: { revision: 1 } } });
});

test('rule 2: a screen too many revisions behind gets a snapshot, one fewer does not', async () => {
  for (let n = 0; n <= MOST_MISSED; n++) world.commit();
  const client = await connected(world.client());
  expect(await joined(client, 0)).toHaveProperty('snapshot');
  expect(await joined(client, 1)).toHaveProperty('missed.length', MOST_MISSED);
});

test('rule 2: a screen that missed more than a megabyte gets a snapshot', async () => {
  const zones = Array.from({ length: 400 }, (_, n) => zoneRow({ id: `z${n}` }));
  for (let n = 0; n < 6; n++) world.commit({ zones });
  expect(await joined(await connected(world.client()), 0)).toHaveProperty('snapshot');
});

test('rule 2: an event that is not there is said not to be there, and the connection stays', async () => {
  const client = await connected(world.client());
  expect(await joined(client, null, 'elsewhere')).toMatchObject({ ok: false, code: 'not-found' });
  expect(await joined(client, null)).toMatchObject({ ok: true });
});

test.each([
  ['before the store is read', 'reads', [3]],
  ['after the store is read', 'answers', [1, 2, 3]],
] as const)('rule 3: what is published while a join is being answered, %s, comes with or after the answer, once', async (_when, door, expected) => {
  world.commit();
  // A screen is inside, so that the room stands.
  await joined(await connected(world.client()), null);
  const client = await connected(world.client());
  const heard = hearing(client, 'impact');
  world[door].shut();
  const answer = joined(client, null);
  await settledOnServer(world);
  world.publish();
  world.publish();
  world[door].open();
  const ack = await answer;
  await settled(client);
  const held = 'snapshot' in ack ? ack.snapshot.impact?.revision : null;
  expect([held, ...revisions(heard)]).toEqual(expected);
});

test('rule 3: an advisory accepted while a join is being answered is told after it, unless the answer has it', async () => {
  await joined(await connected(world.client()), null);
  const client = await connected(world.client());
  const heard = hearing(client, 'advisory');
  world.reads.shut();
  const answer = joined(client, null);
  await settledOnServer(world);
  world.bus.emit('advisory', { eventId: 'e1', advisory: world.accept() });
  world.bus.emit('advisory', { eventId: 'e1', advisory: advisory(2) });
  world.reads.open();
  expect(await answer).toMatchObject({ snapshot: { advisory: { id: 'a1' } } });
  await settled(client);
  expect(heard.map(({ advisory }) => advisory.id)).toEqual(['a2']);
});

test('rule 3: what was stored before the answer and told after it does not come twice', async () => {
  const client = await connected(world.client());
  const heard = hearing(client, 'impact');
  const first = world.commit();
  expect(await joined(client, null)).toMatchObject({ snapshot: { impact: { revision: 1 } } });
  world.bus.emit('impact', first);
  world.publish();
  await settled(client);
  expect(revisions(heard)).toEqual([2]);
});

test('rule 3: while one screen joins, the others are told as ever', async () => {
  const watching = await connected(world.client());
  await joined(watching, null);
  const heard = hearing(watching, 'impact');
  const late = await connected(world.client());
  world.reads.shut();
  const answer = joined(late, null);
  await settledOnServer(world);
  world.publish();
  await settled(watching);
  expect(revisions(heard)).toEqual([1]);
  world.reads.open();
  expect(await answer).toMatchObject({ ok: true, snapshot: { impact: { revision: 1 } } });
});

test('rule 4: revisions told out of order and twice reach the screen in order, each once', async () => {
  const client = await connected(world.client());
  await joined(client, null);
  const heard = hearing(client, 'impact');
  const [one, two, three, four] = [world.commit(), world.commit(), world.commit(), world.commit()];
  for (const impact of [two, one, two, four, three, one]) world.bus.emit('impact', impact);
  await settledOnServer(world);
  await settled(client);
  expect(revisions(heard)).toEqual([1, 2, 3, 4]);
});

test('rule 1: a screen that joins again goes on where it was', async () => {
  const client = await connected(world.client());
  await joined(client, null);
  const heard = hearing(client, 'impact');
  world.publish();
  await settled(client);
  expect(await joined(client, 1)).toEqual({ ok: true, missed: [] });
  world.publish();
  await settled(client);
  expect(revisions(heard)).toEqual([1, 2]);
});

test('a screen that left hears no more of the event', async () => {
  const client = await connected(world.client());
  await joined(client, null);
  const heard = hearing(client, 'impact');
  await new Promise((resolve) => client.emit('leave', { eventId: 'e1' }, resolve));
  world.publish();
  await settled(client);
  expect(heard).toEqual([]);
});

test('rule 12: a screen that missed nothing is told of the advisory that is not computed yet', async () => {
  world.accept();
  world.commit({ stage: 'track' });
  const client = await connected(world.client());
  const heard = hearing(client, 'advisory');
  await joined(client, 1);
  world.commit({ stage: 'members' });
  await joined(client, 2);
  await settled(client);
  expect(heard).toMatchObject([{ eventId: 'e1', advisory: { id: 'a1' } }]);
});

test('a join that fails is said to have failed, and may be tried again', async () => {
  const client = await connected(world.client());
  const { get } = world.store.events;
  world.store.events.get = () => Promise.reject(new Error('disk on fire'));
  const failed = await joined(client, null);
  expect(failed).toMatchObject({ ok: false, code: 'failed' });
  expect(JSON.stringify(failed)).not.toContain('fire');
  world.store.events.get = get;
  expect(await joined(client, null)).toMatchObject({ ok: true });
});

/** A second client's question answered: the server has read whatever was sent before it. */
async function settledOnServer({ client }: LiveWorld): Promise<void> {
  await settled(await connected(client()));
}
