import { randomUUID } from 'node:crypto';
import { afterAll, beforeAll, beforeEach, describe, expect, test } from 'vitest';
import type { Impact } from '../../../lib/impact';
import { tabulate } from '../../../lib/impact';
import type { NewAdvisory } from '../../../server/store';
import { hazardOf, smallExposure } from '../../impact/world';
import { recurving } from '../../hazard/storms';
import { ENGINES } from './engines';
import type { Opened } from './engines';


describe.each(ENGINES)('the store on %s', (_, open) => {
  let opened: Opened;
  let eventId: string;
  beforeAll(async () => {
    opened = await open();
  }, 60_000);
  afterAll(() => opened.close());
  beforeEach(async () => {
    eventId = randomUUID();
    await opened.store.events.add({ id: eventId, name: 'Quillon', timeZone: 'Etc/GMT+3', exercise: true, demo: false, clock: null, createdAt: '2031-09-19T09:00:00.000Z' });
  });

  const advisory = (number: string, issuedAt: string, rest: Partial<NewAdvisory> = {}): NewAdvisory => ({
    eventId,
    advisory: { ...recurving, number, issuedAt },
    format: 'json',
    warnings: [{ code: 'jump', message: 'A jump.', line: 3 }],
    source: { bytes: Uint8Array.of(0, 255, 10, 13, 0), contentType: 'text/plain', fileName: 'a "b".txt' },
    receivedAt: '2031-09-19T09:05:00.000Z',
    receivedBy: 'Mara',
    idempotencyKey: null,
    ...rest,
  });
  const impact = (advisoryId: string, stage: Impact['stage'] = 'track'): Omit<Impact, 'revision'> => ({
    ...tabulate({ eventId, advisoryId, issuedAtMs: 0, nowMs: 0, seed: 1, computedAt: '2031-09-19T09:06:00.000Z' }, smallExposure(), hazardOf(new Array<number>(7).fill(0), new Array<null[]>(7).fill([null, null, null])), null, null).impact,
    stage,
  });

  test('an event comes back as it was put in, with no revision yet', async () => {
    expect(await opened.store.events.get(eventId)).toMatchObject({ name: 'Quillon', exercise: true, demo: false, clock: null, revision: 0, advisoryId: null });
    expect(await opened.store.events.get('nobody')).toBeNull();
  });

  test('an event keeps the clock it is given', async () => {
    const clock = { startsAt: '2031-09-19T11:00:00Z', anchoredAt: '2026-12-01T10:00:00Z', rate: 4 };
    await opened.store.events.setClock(eventId, clock);
    expect((await opened.store.events.get(eventId))?.clock).toEqual(clock);
  });

  test('advisories are numbered as they come, and their files are kept byte for byte', async () => {
    const first = await opened.store.advisories.add(advisory('5', '2031-09-19T09:00:00Z'));
    const second = await opened.store.advisories.add(advisory('6', '2031-09-19T15:00:00Z'));
    expect([first.advisory.sequence, second.advisory.sequence]).toEqual([1, 2]);
    const source = await opened.store.advisories.source(eventId, first.advisory.id);
    expect(Array.from(source!.bytes)).toEqual([0, 255, 10, 13, 0]);
    expect(source).toMatchObject({ contentType: 'text/plain', fileName: 'a "b".txt' });
    expect(await opened.store.advisories.get(eventId, first.advisory.id)).toEqual(first.advisory);
    expect(first.advisory.points).toEqual(recurving.points);
  });

  test('a repeated idempotency key answers the advisory stored the first time', async () => {
    const first = await opened.store.advisories.add(advisory('5', '2031-09-19T09:00:00Z', { idempotencyKey: 'k' }));
    const again = await opened.store.advisories.add(advisory('5', '2031-09-19T09:00:00Z', { idempotencyKey: 'k' }));
    expect(again).toEqual({ advisory: first.advisory, repeated: true });
    expect((await opened.store.advisories.list(eventId, { offset: 0, limit: 10 })).total).toBe(1);
  });

  test('a correction supersedes the advisory of the same storm and number', async () => {
    const first = await opened.store.advisories.add(advisory('5', '2031-09-19T09:00:00Z'));
    const corrected = await opened.store.advisories.add(advisory('5', '2031-09-19T09:00:00Z'));
    expect(corrected.advisory.supersedes).toBe(first.advisory.id);
    expect((await opened.store.advisories.latest(eventId))?.id).toBe(corrected.advisory.id);
  });

  test('a forecast that comes late does not push a newer one aside', async () => {
    await opened.store.advisories.add(advisory('4', '2031-09-19T03:00:00Z'));
    const newest = await opened.store.advisories.add(advisory('6', '2031-09-19T15:00:00Z'));
    const late = await opened.store.advisories.add(advisory('5', '2031-09-19T09:00:00Z'));
    expect((await opened.store.advisories.latest(eventId))?.id).toBe(newest.advisory.id);
    expect((await opened.store.advisories.before(newest.advisory))?.id).toBe(late.advisory.id);
  });

  test('advisories posted at once each get their own number', async () => {
    const added = await Promise.all(Array.from({ length: 8 }, (_, i) => opened.store.advisories.add(advisory(`${i}`, `2031-09-19T0${i}:00:00Z`))));
    expect(added.map((entry) => entry.advisory.sequence).sort()).toEqual([1, 2, 3, 4, 5, 6, 7, 8]);
  });

  test('each published impact is the next revision, and the event says which is current', async () => {
    const { advisory: stored } = await opened.store.advisories.add(advisory('5', '2031-09-19T09:00:00Z'));
    const revisions = [];
    for (const stage of ['track', 'members', 'track'] as const) revisions.push((await opened.store.impacts.publish({ impact: impact(stored.id, stage), bulk: {} })).revision);
    expect(revisions).toEqual([1, 2, 3]);
    expect(await opened.store.events.get(eventId)).toMatchObject({ revision: 3, advisoryId: stored.id });
    expect((await opened.store.impacts.since(eventId, 1, 10)).map(({ revision }) => revision)).toEqual([2, 3]);
    expect((await opened.store.impacts.since(eventId, 0, 2)).map(({ revision }) => revision)).toEqual([2, 3]);
    expect((await opened.store.impacts.ofAdvisory(stored.id, 'track'))?.revision).toBe(3);
    expect((await opened.store.impacts.current(eventId))?.revision).toBe(3);
  });

  test('the bulk of a revision comes back byte for byte, and only what was put in', async () => {
    const { advisory: stored } = await opened.store.advisories.add(advisory('5', '2031-09-19T09:00:00Z'));
    const { revision } = await opened.store.impacts.publish({ impact: impact(stored.id), bulk: { peak: Uint8Array.of(1, 0, 2) } });
    expect(Array.from((await opened.store.impacts.bulk(eventId, revision, 'peak'))!)).toEqual([1, 0, 2]);
    expect(await opened.store.impacts.bulk(eventId, revision, 'chance34')).toBeNull();
  });

  test('bringing a layer in again is its next version, and the newest of each name is current', async () => {
    const layer = (name: string, rows: number) => ({
      eventId,
      kind: 'assets' as const,
      name,
      rows,
      classes: [{ class: 'hospital', count: rows }],
      source: { bytes: Uint8Array.of(1), contentType: 'text/csv', fileName: null },
      receivedAt: '2031-09-19T09:00:00.000Z',
      receivedBy: 'Mara',
    });
    await opened.store.layers.add(layer('Hospitals', 3));
    await opened.store.layers.add(layer('Shelters', 5));
    const again = await opened.store.layers.add(layer('Hospitals', 4));
    expect(again.version).toBe(2);
    expect((await opened.store.layers.current(eventId)).map(({ name, rows }) => [name, rows])).toEqual([['Hospitals', 4], ['Shelters', 5]]);
    expect((await opened.store.layers.list(eventId, { offset: 0, limit: 10 })).total).toBe(3);
  });

  test('a layer comes back byte for byte, whatever it holds', async () => {
    const bytes = Uint8Array.from({ length: 300_000 }, (_, i) => (i * 7919) % 256);
    const layer = await opened.store.layers.add({ eventId, kind: 'assets', name: 'Any', rows: 1, classes: [], source: { bytes, contentType: 'text/csv', fileName: 'any.csv' }, receivedAt: '2031-09-19T09:00:00.000Z', receivedBy: 'Mara' });
    const source = await opened.store.layers.source(eventId, layer.id);
    expect(Buffer.compare(source!.bytes, bytes)).toBe(0);
    expect(source).toMatchObject({ contentType: 'text/csv', fileName: 'any.csv' });
  });

  test('an advisory is found by the key it was sent with, in its own event', async () => {
    const { advisory: stored } = await opened.store.advisories.add(advisory('5', '2031-09-19T09:00:00Z', { idempotencyKey: 'k' }));
    expect(await opened.store.advisories.ofKey(eventId, 'k')).toEqual(stored);
    expect(await opened.store.advisories.ofKey(eventId, 'other')).toBeNull();
    expect(await opened.store.advisories.ofKey('elsewhere', 'k')).toBeNull();
  });

  test('what belongs to one event is not found in another', async () => {
    const { advisory: stored } = await opened.store.advisories.add(advisory('5', '2031-09-19T09:00:00Z'));
    const other = randomUUID();
    expect(await opened.store.advisories.get(other, stored.id)).toBeNull();
    expect(await opened.store.advisories.source(other, stored.id)).toBeNull();
    expect(await opened.store.impacts.get(other, 1)).toBeNull();
  });

  test('nothing is put into an event that is not there, and half a thing never', async () => {
    await expect(opened.store.advisories.add(advisory('5', '2031-09-19T09:00:00Z', { eventId: 'nowhere' }))).rejects.toThrow('There is no event nowhere.');
    await expect(opened.store.impacts.publish({ impact: impact('no-advisory'), bulk: {} })).rejects.toThrow(/foreign key/i);
    expect(await opened.store.events.get(eventId)).toMatchObject({ revision: 0, advisoryId: null });
    expect(await opened.store.impacts.current(eventId)).toBeNull();
  });

  test('impacts published at once each get a revision of their own, with none left out', async () => {
    const { advisory: stored } = await opened.store.advisories.add(advisory('5', '2031-09-19T09:00:00Z'));
    const published = await Promise.all(Array.from({ length: 6 }, () => opened.store.impacts.publish({ impact: impact(stored.id), bulk: { peak: Uint8Array.of(1) } })));
    expect(published.map(({ revision }) => revision).sort()).toEqual([1, 2, 3, 4, 5, 6]);
  });

  test('a log entry sent twice with one key is there once', async () => {
    const entry = { eventId, kind: 'note' as const, text: 'x', zoneId: 'Z1', by: 'Mara', at: '2031-09-19T09:00:00.000Z', recordedAt: '2026-12-01T10:00:00.000Z' };
    const first = await opened.store.log.add(entry, 'k');
    expect(await opened.store.log.add({ ...entry, text: 'y' }, 'k')).toEqual({ entry: first.entry, repeated: true });
    expect((await opened.store.log.list(eventId, { offset: 0, limit: 10 })).items).toEqual([first.entry]);
  });

  test('the log only grows, newest first', async () => {
    const entry = (text: string) => ({ eventId, kind: 'decision' as const, text, zoneId: null, by: 'Mara', at: '2031-09-19T09:00:00.000Z', recordedAt: '2026-12-01T10:00:00.000Z' });
    await opened.store.log.add(entry('Saltmarsh ordered'), null);
    await opened.store.log.add(entry('Crews stop at 18:00'), null);
    const { items, total } = await opened.store.log.list(eventId, { offset: 0, limit: 1 });
    expect(total).toBe(2);
    expect(items[0]).toMatchObject({ sequence: 2, text: 'Crews stop at 18:00' });
  });
});
