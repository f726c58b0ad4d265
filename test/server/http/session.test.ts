import { afterAll, beforeAll, describe, expect, test } from 'vitest';
import type { Person } from '../../../lib/wire';
import { BOOTSTRAP, httpWorld, problemOf } from './world';
import type { World } from './world';

let world: World;
beforeAll(async () => {
  world = await httpWorld();
});
afterAll(() => world.close());

const signIn = (payload: object) => world.call({ method: 'POST', url: '/api/v1/sign-in', payload, as: null });
const link = async (role = 'operator') => (await world.call({ method: 'POST', url: '/api/v1/sign-in-links', payload: { name: 'Mara', role } })).json<{ url: string; expiresAt: string }>();
const tokenOf = (url: string): string => new URL(url).searchParams.get('token')!;

describe('a one-time link', () => {
  test('leads to the sign-in page, whose token starts a session, once', async () => {
    const { url } = await link();
    expect(new URL(url).pathname).toBe('/sign-in');
    const answer = await signIn({ token: tokenOf(url) });
    expect(answer.statusCode).toBe(200);
    expect(answer.json()).toMatchObject({ name: 'Mara', role: 'operator' });
    const cookie = String(answer.headers['set-cookie']);
    expect(cookie).toMatch(/; HttpOnly/i);
    expect(cookie).toMatch(/; SameSite=Lax/i);
    expect(cookie).not.toMatch(/; Secure/i);
    const me = await world.call({ url: '/api/v1/me', as: null, headers: { cookie: cookie.split(';')[0] } });
    expect(me.json()).toEqual(answer.json());
    expect(problemOf(await signIn({ token: tokenOf(url) }))).toMatchObject({ status: 401 });
  });

  test('ends with signing out', async () => {
    const cookie = String((await signIn({ token: tokenOf((await link()).url) })).headers['set-cookie']).split(';')[0];
    const out = await world.call({ method: 'POST', url: '/api/v1/sign-out', as: null, headers: { cookie } });
    expect(out.statusCode).toBe(204);
    expect(String(out.headers['set-cookie'])).toContain('Max-Age=0');
    expect((await world.call({ url: '/api/v1/me', as: null, headers: { cookie } })).statusCode).toBe(401);
  });
});

test('a person is removed with their session and with a link not used yet', async () => {
  const used = await link();
  const cookie = String((await signIn({ token: tokenOf(used.url) })).headers['set-cookie']).split(';')[0];
  const unused = await link();
  const people = (await world.call({ url: '/api/v1/people' })).json<{ items: Person[] }>().items.slice(0, 2);
  expect(people.map(({ name, role, everSignedIn }) => ({ name, role, everSignedIn }))).toEqual(expect.arrayContaining([{ name: 'Mara', role: 'operator', everSignedIn: true }, { name: 'Mara', role: 'operator', everSignedIn: false }]));
  for (const { id } of people) expect((await world.call({ method: 'DELETE', url: `/api/v1/people/${id}` })).statusCode).toBe(204);
  expect((await world.call({ url: '/api/v1/me', as: null, headers: { cookie } })).statusCode).toBe(401);
  expect((await signIn({ token: tokenOf(unused.url) })).statusCode).toBe(401);
  expect((await world.call({ method: 'DELETE', url: `/api/v1/people/${people[0].id}` })).statusCode).toBe(404);
});

describe('a key', () => {
  test('made by an admin is shown once, works, and is revoked', async () => {
    const made = (await world.call({ method: 'POST', url: '/api/v1/keys', payload: { name: 'Feed', role: 'operator' } })).json<{ id: string; key: string }>();
    const me = () => world.call({ url: '/api/v1/me', as: null, headers: { authorization: `Bearer ${made.key}` } });
    expect((await me()).json()).toMatchObject({ name: 'Feed', role: 'operator' });
    const listed = await world.call({ url: '/api/v1/keys' });
    expect(listed.json<{ items: { id: string }[] }>().items.map(({ id }) => id)).toContain(made.id);
    expect(listed.body).not.toContain(made.key);
    expect((await world.call({ method: 'DELETE', url: `/api/v1/keys/${made.id}` })).statusCode).toBe(204);
    expect((await me()).statusCode).toBe(401);
    expect((await world.call({ method: 'DELETE', url: `/api/v1/keys/${made.id}` })).statusCode).toBe(404);
  });

  test('from outside starts a headless install', async () => {
    expect((await world.call({ url: '/api/v1/keys', as: null, headers: { authorization: `Bearer ${BOOTSTRAP}` } })).statusCode).toBe(200);
  });

  test('opens a session in a browser', async () => {
    const answer = await signIn({ key: world.keys.viewer });
    expect(answer.json()).toMatchObject({ role: 'viewer' });
    expect((await signIn({ key: 'lb_made_up' })).statusCode).toBe(401);
  });

  test('and no secret are ever in the log', async () => {
    await world.call({ url: '/api/v1/me' });
    const text = world.logged.join('');
    for (const secret of [...Object.values(world.keys), BOOTSTRAP]) expect(text).not.toContain(secret);
    expect(text).toContain('key made');
  });
});

test.each([[{}], [{ token: '' }], [{ token: 'a', key: 'b' }], [{ password: 'x' }]])('signing in with %j is refused', async (payload) => {
  expect((await signIn(payload)).statusCode).toBe(422);
});

test('guessing is slowed down', async () => {
  const other = await httpWorld();
  const statuses = [];
  for (let i = 0; i < 31; i++) statuses.push((await other.call({ method: 'POST', url: '/api/v1/sign-in', payload: { key: `guess-${i}` }, as: null })).statusCode);
  const last = await other.call({ method: 'POST', url: '/api/v1/sign-in', payload: { key: 'guess' }, as: null });
  await other.close();
  expect(new Set(statuses.slice(0, 30))).toEqual(new Set([401]));
  expect(problemOf(last)).toMatchObject({ status: 429 });
  expect(last.headers['retry-after']).toBeDefined();
});
