import { expect, test } from 'vitest';
import { uniformInt } from 'pure-rand/distribution/uniformInt';
import { xoroshiro128plus } from 'pure-rand/generator/xoroshiro128plus';
import type { Impact } from '../../../lib/impact';
import { liveWorld } from './world';
import type { Client } from './world';

const SCREENS = 8;
const STEPS = 150;

/**
 * A screen that believes the rules: it orders nothing and drops nothing, but for what crosses a join or a leave of its own on the
 * way. What breaks a rule it writes down.
 */
function openScreen(client: Client) {
  let held: number | null = null;
  let place: 'outside' | 'crossing' | 'inside' = 'outside';
  let joining: string | undefined;
  const broken: string[] = [];
  let waiting: { revision: number; done: () => void }[] = [];

  function show(revision: number): void {
    held = revision;
    for (const { done } of waiting.filter((wish) => wish.revision <= revision)) done();
    waiting = waiting.filter((wish) => wish.revision > revision);
  }

  function follow({ revision }: Impact, how: string): void {
    if (revision !== (held ?? 0) + 1) broken.push(`${how} ${revision} after ${held}`);
    show(revision);
  }

  /** One join at a time, as a screen that wants its answer does. */
  function join(): void {
    if (joining === client.id) return;
    joining = client.id;
    place = place === 'outside' ? 'outside' : 'crossing';
    const { id } = client;
    client.emit('join', { eventId: 'e1', revision: held }, (ack) => {
      if (client.id !== id) return;
      joining = undefined;
      if (!ack.ok) return void turn().then(join);
      place = 'inside';
      if ('missed' in ack) ack.missed.forEach((impact) => follow(impact, 'missed'));
      else {
        const { revision } = ack.snapshot.event;
        if ((ack.snapshot.impact?.revision ?? 0) !== revision) broken.push(`a snapshot at ${revision} with the impact of ${ack.snapshot.impact?.revision}`);
        if (revision < (held ?? 0)) broken.push(`a snapshot at ${revision} after ${held}`);
        show(revision);
      }
    });
  }

  client.on('connect', () => {
    place = 'outside';
    join();
  });
  client.on('impact', (impact) => {
    if (place === 'inside') follow(impact, 'told of');
    else if (place === 'outside') broken.push(`told of ${impact.revision} outside the room`);
  });
  client.connect();

  return {
    broken,
    join: () => void (client.connected && join()),
    leave() {
      if (!client.connected || place === 'outside') return;
      place = 'crossing';
      const { id } = client;
      client.emit('leave', { eventId: 'e1' }, () => {
        if (client.id === id && place === 'crossing' && !joining) place = 'outside';
      });
    },
    cut: () => void (client.connected && client.io.engine.close()),
    at: (revision: number) => new Promise<void>((done) => void (held !== null && held >= revision ? done() : waiting.push({ revision, done }))),
  };
}

/** Lets what is on its way on this machine's loopback move on. */
const turn = (): Promise<void> => new Promise((resolve) => setImmediate(resolve));

async function storm(seed: number): Promise<string[]> {
  const random = xoroshiro128plus(seed);
  const below = (n: number): number => uniformInt(random, 0, n - 1);
  const world = await liveWorld();
  const screens = Array.from({ length: SCREENS }, (_, n) => openScreen(world.client({ transports: n % 4 === 3 ? ['polling'] : ['websocket'] })));
  const { get } = world.store.events;
  let failing = false;
  world.store.events.get = (id) => (failing ? Promise.reject(new Error('away')) : get(id));
  let untold: Impact[] = [];

  for (let step = 0; step < STEPS; step++) {
    const screen = screens[below(SCREENS)];
    switch (below(14)) {
      case 0:
      case 1:
        screen.cut();
        break;
      case 2:
        screen.join();
        break;
      case 3:
        screen.leave();
        break;
      case 4:
        world.reads.shut();
        break;
      case 5:
        world.reads.open();
        break;
      case 12:
        world.answers.shut();
        break;
      case 13:
        world.answers.open();
        break;
      case 6:
        failing = !failing && below(3) === 0;
        break;
      case 7:
        untold.push(world.commit());
        break;
      case 8:
        // Told late, and in any order.
        while (untold.length > 0) world.bus.emit('impact', untold.splice(below(untold.length), 1)[0]);
        break;
      default:
        for (const impact of [...untold, world.commit()]) world.bus.emit('impact', impact);
        untold = [];
    }
    for (let turns = below(6); turns > 0; turns--) await turn();
  }

  failing = false;
  world.reads.open();
  world.answers.open();
  for (const impact of [...untold, world.commit()]) world.bus.emit('impact', impact);
  screens.forEach((screen) => screen.join());
  await Promise.all(screens.map((screen) => screen.at(world.record.revision)));
  await world.close();
  return screens.flatMap((screen, n) => screen.broken.map((what) => `screen ${n}: ${what}`));
}

test.each(Array.from({ length: 20 }, (_, n) => n + 1))('rules 1 to 4: in a storm of cuts, joins, leaves, failing reads and late news (seed %i) every screen ends with every revision, in order, each once', async (seed) => {
  expect(await storm(seed)).toEqual([]);
});
