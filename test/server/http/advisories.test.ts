import { readFileSync } from 'node:fs';
import { afterAll, beforeAll, beforeEach, describe, expect, test } from 'vitest';
import type { Event, StoredAdvisory } from '../../../lib/wire';
import { bulletin, httpWorld, plain, problemOf } from './world';
import type { World } from './world';

interface Answer {
  advisory: StoredAdvisory;
  revision: number;
  warnings: { code: string }[];
  format?: string;
}

let world: World;
let event: Event;
beforeAll(async () => {
  world = await httpWorld();
});
afterAll(() => world.close());
beforeEach(async () => {
  event = await world.newEvent();
  world.heard.length = 0;
  world.requested.length = 0;
});

const path = (rest = ''): string => `/api/v1/events/${event.id}/advisories${rest}`;
const post = (payload: string | Buffer | object, headers: Record<string, string> = {}, query = '') => world.call({ method: 'POST', url: path(query), payload, headers, as: 'operator' });
const list = async () => (await world.call({ url: path(), as: 'viewer' })).json<{ items: StoredAdvisory[]; total: number; offset: number }>();

const AS_TEXT = { 'content-type': 'text/plain' };

describe('an accepted advisory', () => {
  test('is answered with itself, stored, told to screens and asked to be computed', async () => {
    const answer = await post(plain);
    expect(answer.statusCode).toBe(201);
    const { advisory, revision, warnings } = answer.json<Answer>();
    expect(advisory).toMatchObject({ ...plain, eventId: event.id, sequence: 1, format: 'json', receivedBy: 'the operator', supersedes: null });
    expect({ revision, warnings }).toEqual({ revision: 0, warnings: [] });
    expect((await world.call({ url: path(`/${advisory.id}`), as: 'viewer' })).json()).toEqual(advisory);
    expect(world.heard).toEqual([{ name: 'advisory', payload: { eventId: event.id, advisory } }]);
    expect(world.requested).toEqual([event.id]);
  });

  test.each([
    ['a bulletin', bulletin('al012004.fstadv.012'), AS_TEXT, 'bulletin'],
    ['a bulletin of unknown type', bulletin('mal0191.001'), { 'content-type': 'application/octet-stream' }, 'bulletin'],
    ['a deck', readFileSync(new URL('../../fixtures/decks/al992023-official.txt', import.meta.url)), AS_TEXT, 'deck'],
    ['a table', Buffer.from('\ufeffvalidAt,lat,lon,maxWindKt\r\n2031-09-19T09:00:00Z,22.4,-45.2,85\r\n2031-09-19T21:00:00Z,24,-46.9,95\r\n'), { 'content-type': 'text/csv; charset=utf-8' }, 'csv'],
  ])('may be %s, which is kept byte for byte', async (_, bytes, headers, format) => {
    const { advisory } = (await post(bytes, { ...headers, 'x-file-name': encodeURIComponent('Gro\u00df "1".txt') })).json<Answer>();
    expect(advisory.format).toBe(format);
    const source = await world.call({ url: path(`/${advisory.id}/source`), as: 'viewer' });
    expect(Buffer.compare(source.rawPayload, bytes)).toBe(0);
    expect(source.headers['content-type']).toBe(headers['content-type']);
    expect(source.headers['content-disposition']).toBe(`attachment; filename="Gro_1_.txt"; filename*=UTF-8''Gro%C3%9F%20%221%22.txt`);
    expect(source.headers['cache-control']).toContain('immutable');
  });

  test.each([
    ['is cut at whole letters', `${'%61'.repeat(199)}%F0%9F%8C%80%F0%9F%8C%80.txt`, `${'a'.repeat(199)}\u{1F300}`],
    ['has no line ends or other controls', 'a%0D%0ASet-Cookie: x%00.txt', 'aSet-Cookie: x.txt'],
    ['is taken as it is where it is not percent-encoded', '100%.txt', '100%.txt'],
  ])('keeps its file name, which %s', async (_, sent, kept) => {
    const { advisory } = (await post(plain, { 'x-file-name': sent })).json<Answer>();
    const source = await world.call({ url: path(`/${advisory.id}/source`), as: 'viewer' });
    expect(decodeURIComponent(String(source.headers['content-disposition']).split("UTF-8''")[1])).toBe(kept);
  });

  test('is listed newest first, a page at a time', async () => {
    for (const number of ['5', '6', '7']) await post({ ...plain, number });
    expect((await list()).items.map(({ number }) => number)).toEqual(['7', '6', '5']);
    const page = (await world.call({ url: path('?offset=1&limit=1') })).json<{ items: StoredAdvisory[] }>();
    expect(page).toMatchObject({ total: 3, offset: 1, items: [{ number: '6' }] });
  });

  test('that corrects another of its number supersedes it', async () => {
    const first = (await post(plain)).json<Answer>().advisory;
    const corrected = (await post({ ...plain, centre: 'Test centre, corrected' })).json<Answer>().advisory;
    expect(corrected).toMatchObject({ supersedes: first.id, sequence: 2 });
    expect((await world.call({ url: path(`/${first.id}`) })).json()).toEqual(first);
  });
});

describe('a dry run', () => {
  test('reads and checks, and stores and tells nothing', async () => {
    const answer = await post(bulletin('al012004.fstadv.012'), AS_TEXT, '?dryRun=true');
    expect(answer.statusCode).toBe(200);
    const { advisory, format, revision } = answer.json<Answer>();
    expect({ format, revision, id: advisory.id }).toEqual({ format: 'bulletin', revision: 0, id: undefined });
    expect(advisory.storm.name).toBe('Alex');
    expect((await list()).total).toBe(0);
    expect([world.heard, world.requested]).toEqual([[], []]);
  });

  test('says what is wrong as an issue does', async () => {
    const problems = [];
    for (const query of ['', '?dryRun=true']) problems.push(problemOf(await post({ ...plain, points: [] }, {}, query)).errors);
    expect(problems[0]).toEqual(problems[1]);
  });
});

describe('an Idempotency-Key (IETF draft-ietf-httpapi-idempotency-key-header-07)', () => {
  test('makes a repeated call the same advisory, told and computed once', async () => {
    const answers = [];
    for (let i = 0; i < 3; i++) answers.push(await post(plain, { 'idempotency-key': 'press-1' }));
    expect(new Set(answers.map(({ statusCode }) => statusCode))).toEqual(new Set([201]));
    expect(new Set(answers.map((answer) => answer.json<Answer>().advisory.id)).size).toBe(1);
    expect((await list()).total).toBe(1);
    expect(world.heard).toHaveLength(1);
    expect(world.requested).toHaveLength(1);
  });

  test('holds for calls made at once', async () => {
    const answers = await Promise.all(Array.from({ length: 5 }, () => post(plain, { 'idempotency-key': 'press-2' })));
    expect(new Set(answers.map((answer) => answer.json<Answer>().advisory.id)).size).toBe(1);
    expect((await list()).total).toBe(1);
  });

  test('used again for other content is refused with 422 (section 2.7)', async () => {
    await post(plain, { 'idempotency-key': 'press-3' });
    const answer = await post({ ...plain, number: '6' }, { 'idempotency-key': 'press-3' });
    expect(answer.statusCode).toBe(422);
    expect(problemOf(answer).errors?.[0].message).toContain('Idempotency-Key');
    expect((await list()).total).toBe(1);
  });

  test('of a refused call may be used for the mended one', async () => {
    expect((await post({ ...plain, points: [] }, { 'idempotency-key': 'press-4' })).statusCode).toBe(422);
    expect((await post(plain, { 'idempotency-key': 'press-4' })).statusCode).toBe(201);
  });

  test('is the event\'s own', async () => {
    await post(plain, { 'idempotency-key': 'press-5' });
    event = await world.newEvent();
    await post({ ...plain, number: '9' }, { 'idempotency-key': 'press-5' });
    expect((await list()).items.map(({ number }) => number)).toEqual(['9']);
  });

  test('that is a book is refused', async () => {
    expect((await post(plain, { 'idempotency-key': 'x'.repeat(201) })).statusCode).toBe(400);
  });
});

describe('the clock of an exercise', () => {
  test('starts two hours after its first advisory was issued, when it was given none', async () => {
    event = await world.newEvent({ exercise: true });
    await post(plain);
    const { clock, now } = (await world.call({ url: `/api/v1/events/${event.id}` })).json<Event>();
    expect(clock).toEqual({ startsAt: '2031-09-19T11:00:00.000Z', anchoredAt: '2031-09-19T09:30:00.000Z', rate: 1 });
    expect(now).toBe('2031-09-19T11:00:00.000Z');
    expect(world.heard.map(({ name }) => name)).toEqual(['event', 'advisory']);
  });

  test('that was given stays as it was given', async () => {
    event = await world.newEvent({ exercise: true, clock: { startsAt: '2031-09-18T00:00:00Z', rate: 4 } });
    await post(plain);
    expect((await world.call({ url: `/api/v1/events/${event.id}` })).json<Event>().clock).toMatchObject({ startsAt: '2031-09-18T00:00:00Z', rate: 4 });
  });

  test('of a real event is the wall clock', async () => {
    await post(plain);
    expect((await world.call({ url: `/api/v1/events/${event.id}` })).json<Event>()).toMatchObject({ clock: null, now: '2031-09-19T09:30:00.000Z' });
  });
});
