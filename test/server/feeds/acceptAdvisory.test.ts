import { mkdtempSync, rmSync } from 'node:fs';
import { tmpdir } from 'node:os';
import { join } from 'node:path';
import { afterEach, beforeEach, expect, test } from 'vitest';
import { makeBus } from '../../../server/bus';
import { acceptAdvisory, readReceived } from '../../../server/feeds';
import type { Bus, Runs, WallClock } from '../../../server/services';
import { openStore } from '../../../server/store';
import type { EventRecord, OpenedStore } from '../../../server/store';
import { bulletin } from '../http/world';

let folder: string;
let services: { store: OpenedStore; bus: Bus; runs: Runs; clock: WallClock };
let event: EventRecord;
let steps: string[];
const failures: unknown[] = [];

beforeEach(async () => {
  folder = mkdtempSync(join(tmpdir(), 'leeboard-feeds-'));
  steps = [];
  failures.length = 0;
  services = {
    store: await openStore({ DATA_DIR: folder, DATABASE_URL: undefined }),
    bus: makeBus((error) => failures.push(error)),
    runs: { request: (id) => void steps.push(`asked to compute ${id}`), underWay: () => null, waiting: 0, resume: async () => {}, close: async () => {} },
    clock: { nowMs: () => Date.parse('2004-08-05T00:00:00Z') },
  };
  event = await services.store.events.add({ id: 'e', name: 'Alex', timeZone: 'UTC', exercise: false, demo: false, clock: null, createdAt: '2004-08-01T00:00:00.000Z' });
});
afterEach(async () => {
  await services.store.close();
  rmSync(folder, { recursive: true, force: true });
});

const received = (bytes: Uint8Array = bulletin('al012004.fstadv.012')) => ({ event, source: { bytes, contentType: 'text/plain', fileName: null }, by: 'Mara', idempotencyKey: null });

test('an advisory is stored first, told after, and then asked to be computed', async () => {
  const looks: Promise<unknown>[] = [];
  services.bus.on('advisory', ({ advisory }) => {
    steps.push('told');
    looks.push(services.store.advisories.get('e', advisory.id));
  });
  const accepted = await acceptAdvisory(services, received());
  expect(steps).toEqual(['told', 'asked to compute e']);
  expect(await looks[0]).toEqual(accepted.ok && accepted.advisory);
});

test('an advisory that cannot be stored is neither told nor computed', async () => {
  services.bus.on('advisory', () => steps.push('told'));
  const broken = { ...services, store: { ...services.store, advisories: { ...services.store.advisories, add: async () => Promise.reject(new Error('disk full')) } } };
  await expect(acceptAdvisory(broken, received())).rejects.toThrow('disk full');
  expect(steps).toEqual([]);
});

test('a listener that fails does not undo what is stored, nor keep it from being computed', async () => {
  services.bus.on('advisory', () => {
    throw new Error('a screen went away');
  });
  services.bus.on('advisory', () => steps.push('told'));
  expect(await acceptAdvisory(services, received())).toMatchObject({ ok: true, repeated: false });
  expect(steps).toEqual(['told', 'asked to compute e']);
  expect(failures).toEqual([new Error('a screen went away')]);
});

test('whoever stops listening hears no more', async () => {
  services.bus.on('advisory', () => steps.push('told'))();
  await acceptAdvisory(services, received());
  expect(steps).toEqual(['asked to compute e']);
});

test("a file is held against the event's clock", async () => {
  const codes = async (clock: EventRecord['clock']): Promise<string[]> => ((await readReceived(services, { ...received(), event: { ...event, clock } })) as { warnings: { code: string }[] }).warnings.map(({ code }) => code);
  expect(await codes(null)).not.toContain('issued-in-future');
  expect(await codes({ startsAt: '2004-08-01T00:00:00Z', anchoredAt: '2004-08-05T00:00:00Z', rate: 1 })).toContain('issued-in-future');
});

test('an exercise without a clock gets it from its first advisory, which is then never still to come', async () => {
  const exercise = await services.store.events.add({ ...event, id: 'x', exercise: true });
  const early = { ...services, clock: { nowMs: () => Date.parse('2004-07-01T00:00:00Z') } };
  const codes = async (held: EventRecord): Promise<string[]> => ((await readReceived(early, { ...received(), event: held })) as { warnings: { code: string }[] }).warnings.map(({ code }) => code);
  expect(await codes(event)).toContain('issued-in-future');
  expect(await codes(exercise)).not.toContain('issued-in-future');
});

test('an exercise whose clock goes with its advisories is taken to two hours after the issue, at the rate it runs, before it is computed', async () => {
  const clock = { startsAt: '2004-08-01T00:00:00Z', anchoredAt: '2004-08-05T00:00:00Z', rate: 6 };
  const exercise = await services.store.events.add({ ...event, id: 'x', exercise: true, clock });
  const whenAsked: Promise<EventRecord | null>[] = [];
  const runs = { ...services.runs, request: () => void whenAsked.push(services.store.events.get('x')) };
  const accepted = await acceptAdvisory({ ...services, runs }, { ...received(), event: exercise, setsClock: true });
  expect(accepted).toMatchObject({ ok: true, advisory: { issuedAt: '2004-08-03T09:00:00Z' } });
  expect(accepted.ok && accepted.advisory.warnings.map(({ code }) => code)).not.toContain('issued-in-future');
  expect((await whenAsked[0])?.clock).toEqual({ startsAt: '2004-08-03T11:00:00.000Z', anchoredAt: '2004-08-05T00:00:00.000Z', rate: 6 });
});

test('the clock of a real event is never set', async () => {
  await acceptAdvisory(services, { ...received(), setsClock: true });
  expect((await services.store.events.get('e'))?.clock).toBeNull();
});

test('a file is held against the advisory before it', async () => {
  await acceptAdvisory(services, received());
  const { warnings } = (await readReceived(services, received(bulletin('al102017.fstadv.004')))) as { warnings: { code: string }[] };
  expect(warnings.map(({ code }) => code)).toContain('storm-differs');
});
