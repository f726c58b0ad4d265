import { afterAll, beforeAll, beforeEach, describe, expect, test } from 'vitest';
import { MOST_ADVISORY_BYTES } from '../../../lib/wire';
import { bulletin, httpWorld, plain, problemOf } from './world';
import type { World } from './world';

let world: World;
let eventId: string;
beforeAll(async () => {
  world = await httpWorld();
});
afterAll(() => world.close());
beforeEach(async () => {
  eventId = (await world.newEvent()).id;
  world.heard.length = 0;
  world.requested.length = 0;
});

const TYPES = { text: 'text/plain', json: 'application/json', csv: 'text/csv' };
const send = (payload: string | Buffer, contentType = TYPES.text, query = '') =>
  world.call({ method: 'POST', url: `/api/v1/events/${eventId}/advisories${query}`, payload, headers: { 'content-type': contentType } });
const held = async (): Promise<number> => (await world.services.store.advisories.list(eventId, { offset: 0, limit: 10 })).total;

/** First bytes of a JPEG file with JFIF marker (ISO/IEC 10918-5), then what a picture holds. */
const photo = Buffer.concat([Buffer.from([0xff, 0xd8, 0xff, 0xe0, 0, 16, 0x4a, 0x46, 0x49, 0x46, 0]), Buffer.from(Array.from({ length: 4000 }, (_, i) => (i * 37) % 256))]);
const points = (...over: object[]): string => JSON.stringify({ ...plain, points: over.map((one, i) => ({ ...plain.points[Math.min(i, 1)], ...one })) });

describe('refused, with where and how to mend it, and nothing stored', () => {
  test.each<[string, string | Buffer, string, RegExp]>([
    ['an empty file', '', TYPES.text, /empty/],
    ['a file of blanks', ' \r\n\t\n', TYPES.text, /blanks/],
    ['a photo renamed .txt', photo, TYPES.text, /JPEG picture/],
    ['a letter that is no forecast', 'Dear all,\nthe meeting is moved to noon.\n', TYPES.text, /none of the forms/],
    ['latitude 95', points({ lat: 95 }), TYPES.json, /latitude lies between -90 and 90/],
    ['wind -5', points({ maxWindKt: -5 }), TYPES.json, /wind cannot be negative/],
    ['NaN, which is no JSON', points({}).replace('"maxWindKt":85', '"maxWindKt":NaN'), TYPES.json, /NaN/],
    ['NaN in a table', 'validAt,lat,lon,maxWindKt\n2031-09-19T09:00:00Z,22.4,-45.2,NaN\n2031-09-19T21:00:00Z,24,-46.9,95\n', TYPES.csv, /NaN/],
    ['no point at all', points(), TYPES.json, /at least one point/],
    ['two points for the same time', points({}, { validAt: plain.points[0].validAt }), TYPES.json, /two points at 2031-09-19T09:00:00Z/],
    ['times out of order', points({ validAt: '2031-09-19T21:00:00Z' }, { validAt: '2031-09-19T09:00:00Z' }), TYPES.json, /put the points in order of time/],
    ['a time of another zone', points({ validAt: '2031-09-19T09:00:00+02:00' }), TYPES.json, /UTC/],
  ])('%s', async (_, payload, contentType, says) => {
    const answer = await send(payload, contentType);
    const problem = problemOf(answer);
    expect(answer.statusCode).toBe(422);
    expect(problem.errors?.map(({ message }) => message).join('\n')).toMatch(says);
    expect(await held()).toBe(0);
    expect(world.heard).toEqual([]);
    expect(world.requested).toEqual([]);
  });

  test('an error in a file says its line and column', async () => {
    const { errors } = problemOf(await send('validAt,lat,lon,maxWindKt\n2031-09-19T09:00:00Z,22.4,-45.2,85\n2031-09-19T21:00:00Z,95,-46.9,95\n', TYPES.csv));
    expect(errors?.[0]).toMatchObject({ line: 3 });
    expect(errors?.[0].column).toBeGreaterThan(0);
  });

  test('an error in JSON says its path', async () => {
    const { errors } = problemOf(await send(points({}, { lat: 95 }), TYPES.json));
    expect(errors?.[0].path).toMatch(/points.*1.*lat/);
  });

  test('a file above the limit, which it states', async () => {
    const answer = await send(Buffer.alloc(MOST_ADVISORY_BYTES + 1, 'a'));
    expect(answer.statusCode).toBe(413);
    expect(problemOf(answer).detail).toContain('5 MB');
    expect(await held()).toBe(0);
  });

  test.each([['text/html', 415], ['image/png', 415], ['multipart/form-data; boundary=x', 415]])('a body sent as %s', async (contentType, status) => {
    const answer = await send(bulletin('al012004.fstadv.012'), contentType);
    expect(answer.statusCode).toBe(status);
    expect(problemOf(answer).detail).toContain('text/plain');
    expect(await held()).toBe(0);
  });

  test('a packed body', async () => {
    const answer = await world.call({ method: 'POST', url: `/api/v1/events/${eventId}/advisories`, payload: Buffer.from([0x1f, 0x8b, 8]), headers: { 'content-type': 'text/plain', 'content-encoding': 'gzip' } });
    expect(answer.statusCode).toBe(415);
  });

  test('a form that the file is not in', async () => {
    expect((await send(JSON.stringify(plain), TYPES.json, '?format=bulletin')).statusCode).toBe(422);
    expect((await send(JSON.stringify(plain), TYPES.json, '?format=poem')).statusCode).toBe(400);
  });

  test('a query that is misspelt', async () => {
    const problem = problemOf(await send(JSON.stringify(plain), TYPES.json, '?dryrun=true'));
    expect(problem).toMatchObject({ status: 400, type: 'urn:leeboard:problem:bad-request' });
    expect(problem.detail).toContain('dryrun');
    expect(await held()).toBe(0);
  });

  test('an event that is not there', async () => {
    const answer = await world.call({ method: 'POST', url: '/api/v1/events/nowhere/advisories', payload: plain });
    expect(problemOf(answer)).toMatchObject({ status: 404, detail: 'There is no event nowhere.' });
  });
});

describe('taken, with what to look at', () => {
  test.each<[string, string, RegExp]>([
    ['one point only', points({}), /only one position/],
    ['a storm on the equator', points({ lat: 1 }, { lat: 2 }), /equator/],
    ['a jump faster than 60 kt', points({}, { lat: 50 }), /faster than storms move/],
    ['a name with HTML in it', JSON.stringify({ ...plain, storm: { name: '<img src=x onerror=alert(1)>' } }), /web page/],
  ])('%s', async (_, payload, warns) => {
    const answer = await send(payload, TYPES.json);
    expect(answer.statusCode).toBe(201);
    const { warnings, advisory } = answer.json<{ warnings: { message: string }[]; advisory: typeof plain }>();
    expect(warnings.map(({ message }) => message).join('\n')).toMatch(warns);
    expect(advisory.storm.name).toBe((JSON.parse(payload) as typeof plain).storm.name);
    expect(await held()).toBe(1);
  });

  test('a storm on the other side of the world, which only reaches nobody here', async () => {
    await world.call({ method: 'POST', url: `/api/v1/events/${eventId}/layers?kind=assets&name=Shelters`, payload: 'name,lat,lon\nHale Hall,25,-48.1\n', headers: { 'content-type': 'text/csv' } });
    const answer = await send(points({ lat: -16.2, lon: 151.8 }, { lat: -17, lon: 149.9 }), TYPES.json);
    expect(answer.statusCode).toBe(201);
    expect(answer.json<{ warnings: object[] }>().warnings).toEqual([]);
    expect(await held()).toBe(1);
  });

  test('a storm other than the one before', async () => {
    await send(JSON.stringify(plain), TYPES.json);
    const { warnings } = (await send(bulletin('al012004.fstadv.012'))).json<{ warnings: { code: string }[] }>();
    expect(warnings.map(({ code }) => code)).toEqual(expect.arrayContaining(['storm-differs', 'older-than-previous']));
  });

  test('a storm issued in the future', async () => {
    const { warnings } = (await send(JSON.stringify({ ...plain, issuedAt: '2031-09-19T21:00:00Z' }), TYPES.json)).json<{ warnings: { code: string }[] }>();
    expect(warnings.map(({ code }) => code)).toContain('issued-in-future');
  });
});

test('HTML in a name is never answered as a page', async () => {
  const answer = await send(JSON.stringify({ ...plain, storm: { name: '<script>alert(1)</script>' } }), TYPES.json);
  expect(answer.headers['content-type']).toMatch(/^application\/json/);
  expect(answer.headers['x-content-type-options']).toBe('nosniff');
  const source = await world.call({ url: `/api/v1/events/${eventId}/advisories/${answer.json<{ advisory: { id: string } }>().advisory.id}/source` });
  expect(source.headers['content-disposition']).toMatch(/^attachment/);
});
