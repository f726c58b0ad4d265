import { afterAll, beforeAll, describe, expect, test } from 'vitest';
import { answersTo, comesFromHere } from '../../../server/http/ownSite';
import { httpWorld, HOST, ORIGIN, problemOf } from './world';
import type { World } from './world';

describe('a page of another site (RFC 6454 Origin; W3C Fetch Metadata)', () => {
  test.each<[string, string, Record<string, string>, boolean]>([
    ['a program, which names no origin', 'POST', {}, true],
    ['a page of this server', 'POST', { origin: ORIGIN, 'sec-fetch-site': 'same-origin' }, true],
    ['a page of this server behind an encrypting proxy', 'POST', { origin: `https://${HOST}` }, true],
    ['another site', 'POST', { origin: 'https://elsewhere.example' }, false],
    ['another port of this machine', 'POST', { origin: 'http://127.0.0.1:8080' }, false],
    ['another port, which browsers count as the same site', 'POST', { 'sec-fetch-site': 'same-site' }, false],
    ['a page without an origin, such as a sandboxed frame', 'POST', { origin: 'null' }, false],
    ['another site that sends no Origin', 'POST', { 'sec-fetch-site': 'cross-site' }, false],
    ['a form of another site', 'POST', { 'sec-fetch-site': 'cross-site', 'sec-fetch-mode': 'navigate', 'sec-fetch-dest': 'document' }, false],
    ['a typed address', 'GET', { 'sec-fetch-site': 'none', 'sec-fetch-mode': 'navigate', 'sec-fetch-dest': 'document' }, true],
    ['a link from a mail or a wiki', 'GET', { 'sec-fetch-site': 'cross-site', 'sec-fetch-mode': 'navigate', 'sec-fetch-dest': 'document' }, true],
    ['a frame of another site', 'GET', { 'sec-fetch-site': 'cross-site', 'sec-fetch-mode': 'navigate', 'sec-fetch-dest': 'iframe' }, false],
    ['a script of another site that reads', 'GET', { 'sec-fetch-site': 'cross-site', 'sec-fetch-mode': 'cors', origin: 'https://elsewhere.example' }, false],
    ['a picture of another site', 'GET', { 'sec-fetch-site': 'cross-site', 'sec-fetch-mode': 'no-cors', 'sec-fetch-dest': 'image' }, false],
  ])('%s', (_, method, headers, allowed) => {
    expect(comesFromHere(method, { host: HOST, ...headers })).toBe(allowed);
  });
});

describe('the name the server is asked for', () => {
  test.each([
    ['127.0.0.1', '127.0.0.1:4600', true],
    ['127.0.0.1', 'LOCALHOST:4600', true],
    ['127.0.0.1', '[::1]:4600', true],
    ['127.0.0.1', 'localhost:9999', true],
    ['127.0.0.1', 'rebound.example:4600', false],
    ['127.0.0.1', '127.0.0.1.rebound.example', false],
    ['127.0.0.1', undefined, false],
    ['localhost', 'rebound.example', false],
    ['127.0.0.7', '127.0.0.7:4600', true],
    ['0.0.0.0', 'board.eoc.example', true],
    ['0.0.0.0', 'a b', false],
  ])('listening on %s, asked for as %s', (listens, host, answered) => {
    expect(answersTo({ HOST: listens }, host)).toBe(answered);
  });
});

describe('the running API', () => {
  let world: World;
  beforeAll(async () => {
    world = await httpWorld();
  });
  afterAll(() => world.close());

  test('refuses a forged call with a good session, and does nothing', async () => {
    const cookie = await signedIn(world);
    const forged = (headers: Record<string, string>) => world.call({ method: 'POST', url: '/api/v1/events', as: null, payload: { name: 'Forged', timeZone: 'UTC', exercise: false }, headers: { cookie, ...headers } });
    const foreign: Record<string, string>[] = [{ origin: 'https://elsewhere.example' }, { origin: 'http://localhost:3000' }, { 'sec-fetch-site': 'cross-site' }];
    for (const headers of foreign) {
      const answer = await forged(headers);
      expect(problemOf(answer)).toMatchObject({ status: 403, type: 'urn:leeboard:problem:foreign-origin' });
    }
    expect((await world.call({ url: '/api/v1/events' })).json<{ total: number }>().total).toBe(0);
    expect((await forged({ origin: ORIGIN })).statusCode).toBe(201);
  });

  test('refuses a foreign page even with a key, and even where anyone may call', async () => {
    for (const url of ['/api/v1/events', '/api/v1/health']) expect((await world.call({ url, headers: { origin: 'https://elsewhere.example' } })).statusCode, url).toBe(403);
  });

  test('gives no other site leave to read (no CORS headers)', async () => {
    const { headers } = await world.call({ url: '/api/v1/health' });
    expect(Object.keys(headers).filter((name) => name.startsWith('access-control'))).toEqual([]);
  });

  test('does not answer under a name made to point here', async () => {
    const answer = await world.call({ url: '/api/v1/health', headers: { host: 'rebound.example:4600' } });
    expect(problemOf(answer)).toMatchObject({ status: 421 });
  });

  test('tells browsers to load nothing from elsewhere, and not to be framed', async () => {
    const policy = String((await world.call({ url: '/api/v1/health' })).headers['content-security-policy']);
    expect(policy).toContain("default-src 'self'");
    expect(policy).toContain("frame-ancestors 'none'");
    expect(policy).toContain(`connect-src 'self' ws://${HOST} wss://${HOST}`);
    expect(policy).not.toContain('unsafe-eval');
    expect(policy.match(/https?:\/\//)).toBeNull();
  });
});

async function signedIn({ services }: World): Promise<string> {
  const { url } = await services.auth.createSignInLink({ name: 'Mara', role: 'operator' });
  return (await services.auth.redeemSignIn(new URL(url).searchParams.get('token')!))!.setCookie.split(';')[0];
}
