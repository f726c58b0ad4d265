import { connect } from 'node:net';
import type { AddressInfo } from 'node:net';
import { afterAll, beforeAll, describe, expect, test } from 'vitest';
import type { Event, Problem } from '../../../lib/wire';
import { acceptAdvisory } from '../../../server/feeds';
import { ENGINES } from '../store/engines';
import { bulletin, httpWorld, plain, problemOf } from './world';
import type { World } from './world';

describe('a fault', () => {
  let world: World;
  beforeAll(async () => {
    world = await httpWorld({ inspectLayer: async () => Promise.reject(new Error('the disk password is hunter2')), describeEvent: async () => Promise.reject(new Error('secret detail')) });
  });
  afterAll(() => world.close());

  test('is told in one neutral sentence and logged whole, under the same number', async () => {
    const added = await world.services.store.events.add({ id: 'e1', name: 'Q', timeZone: 'UTC', exercise: false, demo: false, clock: null, createdAt: '2031-09-19T09:00:00.000Z' });
    const answer = await world.call({ url: `/api/v1/events/${added.id}` });
    const problem = problemOf(answer);
    expect(problem).toMatchObject({ status: 500, title: 'Something went wrong on the server' });
    expect(answer.body).not.toContain('secret detail');
    const logged = world.logged.find((line) => line.includes('secret detail'));
    expect(logged).toContain(problem.instance!.replace('urn:uuid:', ''));
    expect(logged).toContain('faults.test');
  });

  test('while a layer is read stores nothing', async () => {
    const answer = await world.call({ method: 'POST', url: '/api/v1/events/e1/layers?kind=assets&name=Hospitals', payload: 'name,lat,lon\nA,1,1\n', headers: { 'content-type': 'text/csv' } });
    expect(problemOf(answer).status).toBe(500);
    expect((await world.services.store.layers.list('e1', { offset: 0, limit: 1 })).total).toBe(0);
  });
});

test('a server whose store does not answer says so in its health', async () => {
  const world = await httpWorld();
  await world.services.store.close();
  const answer = await world.call({ url: '/api/v1/health', as: null });
  expect(answer.statusCode).toBe(503);
  expect(answer.json()).toMatchObject({ status: 'failing', store: 'failing' });
  await world.app.close();
});

describe('what is not there', () => {
  let world: World;
  beforeAll(async () => {
    world = await httpWorld();
  });
  afterAll(() => world.close());

  test('under /api is a problem document', async () => {
    const answer = await world.call({ method: 'POST', url: '/api/v1/weather?x=1' });
    expect(problemOf(answer)).toMatchObject({ status: 404, detail: expect.stringContaining('There is no POST /api/v1/weather in this API') as string });
  });

  test('is so for an address that is garbled', async () => {
    expect(problemOf(await world.call({ url: '/api/v1/events/%E0%A4%A' })).status).toBe(400);
  });

  test('elsewhere is a page, which whoever starts the server adds', async () => {
    const other = await httpWorld();
    other.app.setNotFoundHandler({}, (_request, reply) => reply.type('text/html').send('<h1>page</h1>'));
    expect((await other.call({ url: '/board', as: null })).body).toBe('<h1>page</h1>');
    for (const url of ['/api', '/api/', '/api/v1', '/api/v1/weather', '/api/v2/events']) expect(problemOf(await other.call({ url, as: null })).status, url).toBe(404);
    expect((await other.call({ url: '/board', as: null })).headers['content-security-policy']).toContain("script-src 'self'");
    await other.close();
  });

  test('has the same members in every problem document (RFC 9457, section 3.1)', async () => {
    const problems: Problem[] = [];
    for (const url of ['/api/v1/weather', '/api/v1/events/nowhere', '/api/v1/events?limit=x']) problems.push(problemOf(await world.call({ url })));
    for (const problem of problems) expect(Object.keys(problem)).toEqual(expect.arrayContaining(['type', 'title', 'status', 'detail', 'instance']));
    for (const problem of problems) expect(problem.type).toMatch(/^urn:leeboard:problem:/);
  });
});

describe('what is no request at all, or too much of one, is a problem document too', () => {
  let world: World;
  let port: number;
  beforeAll(async () => {
    world = await httpWorld();
    await world.app.listen({ host: '127.0.0.1', port: 0 });
    port = (world.app.server.address() as AddressInfo).port;
  });
  afterAll(() => world.close());

  /** What the server says to bytes, until it hangs up. */
  const tell = (bytes: string): Promise<string> =>
    new Promise((resolve, reject) => {
      let heard = '';
      connect(port, '127.0.0.1')
        .on('data', (part) => (heard += part.toString()))
        .on('end', () => resolve(heard))
        .on('error', reject)
        .write(bytes);
    });

  test.each([
    ['an encrypted greeting (RFC 8446)', '\x16\x03\x01\x02\x00\x01\r\n\r\n', 400, 'bad-request'],
    ['headers above the limit (RFC 6585, section 5)', `GET /api/v1/health HTTP/1.1\r\nHost: 127.0.0.1\r\nCookie: ${'x'.repeat(20_000)}\r\n\r\n`, 431, 'headers-too-large'],
  ])('%s', async (_, bytes, status, code) => {
    const [head, body] = (await tell(bytes)).split('\r\n\r\n');
    expect(head).toMatch(new RegExp(`^HTTP/1.1 ${status} `));
    expect(head).toContain('Content-Type: application/problem+json');
    expect(JSON.parse(body)).toMatchObject({ status, type: `urn:leeboard:problem:${code}` });
  });
});

describe.each(ENGINES)('on %s, text that no database should be asked for', (_, open) => {
  let world: World;
  let event: Event;
  let close: () => Promise<void>;
  beforeAll(async () => {
    const opened = await open();
    close = opened.close;
    world = await httpWorld({ store: opened.store });
    event = await world.newEvent();
  }, 60_000);
  afterAll(async () => {
    await world.close();
    await close();
  });

  test.each<[string, string, string, object | string | undefined, number]>([
    ['a name of an event', 'POST', '', { name: 'Quil\0lon', timeZone: 'UTC', exercise: false }, 422],
    ['an entry of the log', 'POST', '/:id/log', { kind: 'note', text: 'a\0b' }, 422],
    ["a storm's name", 'POST', '/:id/advisories', { ...plain, storm: { name: 'Quil\0lon' } }, 422],
    ['an address', 'GET', '/%00', undefined, 400],
    ['a query', 'GET', '/:id/impact/assets?class=a%00b', undefined, 400],
    ["a layer's name", 'POST', '/:id/layers?kind=assets&name=a%00b', 'name,lat,lon\nA,1,1\n', 400],
  ])('NUL in %s is refused', async (_what, method, path, payload, status) => {
    const headers = { 'content-type': typeof payload === 'string' ? 'text/csv' : 'application/json' };
    const answer = await world.call({ method: method as 'GET', url: `/api/v1/events${path.replace(':id', event.id)}`, ...(payload === undefined ? {} : { payload, headers }) });
    expect(problemOf(answer).status).toBe(status);
    expect(answer.body).toContain('NUL');
  });

  test('a backslash and some letters are no NUL', async () => {
    expect((await world.call({ method: 'POST', url: `/api/v1/events/${event.id}/log`, payload: { kind: 'note', text: 'C:\\u0000' } })).statusCode).toBe(201);
  });

  test('a revision beyond all counting is refused, one that is only not there is not found', async () => {
    const statusOf = async (revision: number): Promise<number> => (await world.call({ url: `/api/v1/events/${event.id}/impact?revision=${revision}` })).statusCode;
    expect(await statusOf(2 ** 31)).toBe(400);
    expect(await statusOf(2 ** 31 - 1)).toBe(404);
  });
});

describe('the demo exercise', () => {
  test('issues its next advisory through the common way in, once a press', async () => {
    const files = ['al012004.fstadv.012', 'al102017.fstadv.004'];
    let next = 0;
    const world: World = await httpWorld({
      demo: {
        next: async (event, by) => {
          const name = files[next++];
          return name ? acceptAdvisory(world.services, { event, source: { bytes: bulletin(name), contentType: 'text/plain', fileName: name }, by, idempotencyKey: name }) : null;
        },
      },
    });
    const event = await world.services.store.events.add({ id: 'd', name: 'Demo', timeZone: 'UTC', exercise: true, demo: true, clock: null, createdAt: '2031-09-19T09:00:00.000Z' });
    const press = (key: string) => world.call({ method: 'POST', url: `/api/v1/events/${event.id}/demo/next`, payload: {}, as: 'operator', headers: { 'idempotency-key': key } });
    const [first, again] = await Promise.all([press('a'), press('a')]);
    expect(first.statusCode).toBe(201);
    expect(again.json()).toEqual(first.json());
    expect(first.json<{ advisory: { receivedBy: string } }>().advisory.receivedBy).toBe('the operator');
    expect((await press('a')).json()).toEqual(first.json());
    expect((await press('b')).json<{ advisory: { sequence: number } }>().advisory.sequence).toBe(2);
    expect(problemOf(await press('c'))).toMatchObject({ status: 409, detail: 'All advisories of the demo exercise are in.' });
    expect(world.requested).toEqual([event.id, event.id]);
    const real = await world.newEvent();
    expect(problemOf(await world.call({ method: 'POST', url: `/api/v1/events/${real.id}/demo/next` })).status).toBe(409);
    await world.close();
  });
});

test('figures for Prometheus count what was done', async () => {
  const world = await httpWorld();
  const event = await world.newEvent();
  await world.publish(await world.issue(event.id));
  const answer = await world.call({ url: '/metrics', as: 'viewer' });
  expect(answer.headers['content-type']).toMatch(/^text\/plain; version=0\.0\.4/);
  const value = (name: string): number => Number(new RegExp(`^${name} (\\S+)$`, 'm').exec(answer.body)?.[1]);
  expect(value('leeboard_advisories_total')).toBe(1);
  expect(value('leeboard_runs_waiting')).toBe(0);
  expect(value('leeboard_nodejs_eventloop_lag_p99_seconds')).toBeGreaterThanOrEqual(0);
  expect(answer.body).toMatch(/leeboard_http_request_seconds_count\{method="POST",route="\/api\/v1\/events\/:id\/advisories",status="201"\} 1/);
  await world.close();
});
