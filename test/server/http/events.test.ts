import { afterAll, beforeAll, describe, expect, test } from 'vitest';
import type { Event, LogEntry } from '../../../lib/wire';
import { httpWorld, problemOf } from './world';
import type { World } from './world';

let world: World;
beforeAll(async () => {
  world = await httpWorld();
});
afterAll(() => world.close());

const start = (payload: object) => world.call({ method: 'POST', url: '/api/v1/events', payload, as: 'operator' });

describe('an event', () => {
  test('is started with a name and a time zone, and found where the answer says', async () => {
    const answer = await start({ name: '  Quillon ', timeZone: 'Etc/GMT+3', exercise: false });
    expect(answer.statusCode).toBe(201);
    const event = answer.json<Event>();
    expect(event).toMatchObject({ name: 'Quillon', exercise: false, demo: false, revision: 0, advisoryId: null, clock: null });
    expect((await world.call({ url: String(answer.headers.location), as: 'viewer' })).json()).toEqual(event);
  });

  test.each([
    ['no name', { timeZone: 'UTC', exercise: false }, 'name'],
    ['a blank name', { name: ' ', timeZone: 'UTC', exercise: false }, 'name'],
    ['a zone that is none', { name: 'Q', timeZone: 'Mars/Base', exercise: false }, 'timeZone'],
    ['a clock of its own, which only an exercise has', { name: 'Q', timeZone: 'UTC', exercise: false, clock: { startsAt: '2031-09-19T09:00:00Z', rate: 1 } }, 'clock'],
    ['a clock that runs backwards', { name: 'Q', timeZone: 'UTC', exercise: true, clock: { startsAt: '2031-09-19T09:00:00Z', rate: -1 } }, 'clock.rate'],
  ])('is refused with %s', async (_, payload, path) => {
    const answer = await start(payload);
    expect(answer.statusCode).toBe(422);
    expect(problemOf(answer).errors?.map((error) => error.path)).toEqual([path]);
  });

  test.each([['no JSON', '{"name":'], ['nothing', '']])('is refused with %s', async (_, payload) => {
    const answer = await world.call({ method: 'POST', url: '/api/v1/events', payload, headers: { 'content-type': 'application/json' } });
    expect(problemOf(answer).status).toBe(400);
  });

  test('that nobody started is not found', async () => {
    expect(problemOf(await world.call({ url: '/api/v1/events/nowhere' })).detail).toBe('There is no event nowhere.');
  });

  test('is listed newest first', async () => {
    const { items, total } = (await world.call({ url: '/api/v1/events?limit=1' })).json<{ items: Event[]; total: number }>();
    expect(items).toHaveLength(1);
    expect(total).toBeGreaterThanOrEqual(1);
  });
});

describe("an exercise's clock", () => {
  const change = (event: Event, payload: object) => world.call({ method: 'PATCH', url: `/api/v1/events/${event.id}/clock`, payload, as: 'operator' });
  const exercise = () => world.newEvent({ exercise: true, clock: { startsAt: '2031-09-19T12:00:00Z', rate: 2 } });

  test('is set, and everyone is told', async () => {
    const event = await exercise();
    world.heard.length = 0;
    expect((await change(event, { startsAt: '2031-09-20T00:00:00Z', rate: 60 })).json<Event>()).toMatchObject({ now: '2031-09-20T00:00:00.000Z', clock: { rate: 60, anchoredAt: '2031-09-19T09:30:00.000Z' } });
    expect(world.heard).toEqual([{ name: 'event', payload: { eventId: event.id } }]);
  });

  test('is stopped where it stands', async () => {
    expect((await change(await exercise(), { rate: 0 })).json<Event>()).toMatchObject({ now: '2031-09-19T12:00:00.000Z', clock: { rate: 0 } });
  });

  test('is not changed by nothing', async () => {
    expect((await change(await exercise(), {})).statusCode).toBe(422);
  });

  test('is no business of a real event', async () => {
    expect(problemOf(await change(await world.newEvent(), { rate: 2 }))).toMatchObject({ status: 409 });
  });
});

describe('the log', () => {
  const write = (event: Event, payload: object, headers: Record<string, string> = {}) => world.call({ method: 'POST', url: `/api/v1/events/${event.id}/log`, payload, headers, as: 'operator' });

  test('keeps who decided what, on the clock of the event and of the wall', async () => {
    const event = await world.newEvent({ exercise: true, clock: { startsAt: '2031-09-19T12:00:00Z', rate: 2 } });
    world.heard.length = 0;
    const answer = await write(event, { kind: 'decision', text: 'Saltmarsh ordered', zoneId: 'Z1' });
    expect(answer.statusCode).toBe(201);
    const entry = answer.json<LogEntry>();
    expect(entry).toMatchObject({ sequence: 1, by: 'the operator', zoneId: 'Z1', at: '2031-09-19T12:00:00.000Z', recordedAt: '2031-09-19T09:30:00.000Z' });
    expect(world.heard).toEqual([{ name: 'log', payload: entry }]);
    expect((await world.call({ url: `/api/v1/events/${event.id}/log`, as: 'viewer' })).json()).toEqual({ items: [entry], total: 1, offset: 0 });
  });

  test('takes a repeated entry once', async () => {
    const event = await world.newEvent();
    world.heard.length = 0;
    const answers = [];
    for (let i = 0; i < 2; i++) answers.push((await write(event, { kind: 'note', text: 'Crews stop at 18:00' }, { 'idempotency-key': 'k' })).json<LogEntry>().id);
    expect(answers[0]).toBe(answers[1]);
    expect(world.heard).toHaveLength(1);
  });

  test.each([[{ kind: 'note', text: ' ' }], [{ kind: 'system', text: 'x' }], [{ kind: 'note', text: 'x'.repeat(4001) }], [{}]])('refuses %j', async (payload) => {
    expect((await write(await world.newEvent(), payload)).statusCode).toBe(422);
  });

  test('has no way to change or take back an entry', async () => {
    const event = await world.newEvent();
    for (const method of ['PUT', 'PATCH', 'DELETE'] as const) expect((await world.call({ method, url: `/api/v1/events/${event.id}/log` })).statusCode).toBe(404);
  });
});
