import { mkdtempSync, rmSync, statSync } from 'node:fs';
import { tmpdir } from 'node:os';
import { join } from 'node:path';
import { afterAll, beforeAll, describe, expect, test } from 'vitest';
import { openAuth } from '../../../server/auth';
import type { LeeboardAuth } from '../../../server/auth';

const ORIGIN = 'http://127.0.0.1:4600';
const BOOTSTRAP = 'a-bootstrap-key-of-some-length';
const folder = mkdtempSync(join(tmpdir(), 'leeboard-auth-'));
let auth: LeeboardAuth;
beforeAll(async () => {
  auth = await openAuth({ DATA_DIR: folder, DATABASE_URL: undefined, BOOTSTRAP_KEY: BOOTSTRAP, HOST: '127.0.0.1', PORT: 4600 }, ORIGIN);
});
afterAll(async () => {
  await auth.close();
  rmSync(folder, { recursive: true, force: true });
});

const tokenOf = (url: string): string => new URL(url).searchParams.get('token')!;
const cookieOf = (setCookie: string): string => setCookie.split(';')[0];

describe('a one-time link', () => {
  test('signs one person in, once', async () => {
    expect(await auth.everSignedIn()).toBe(false);
    const link = await auth.createSignInLink({ name: 'Mara', role: 'operator' });
    expect(link.url.startsWith(`${ORIGIN}/api/v1/sign-in?token=`)).toBe(true);
    const session = await auth.redeemSignIn(tokenOf(link.url));
    expect(await auth.identify({ cookie: cookieOf(session!.setCookie) })).toMatchObject({ name: 'Mara', role: 'operator' });
    expect(await auth.redeemSignIn(tokenOf(link.url))).toBeNull();
    expect(await auth.everSignedIn()).toBe(true);
  });

  test('sets a cookie that scripts cannot read and that other sites do not send', async () => {
    const { setCookie } = (await auth.redeemSignIn(tokenOf((await auth.createSignInLink({ name: 'Odo', role: 'viewer' })).url)))!;
    expect(setCookie).toMatch(/HttpOnly/i);
    expect(setCookie).toMatch(/SameSite=Lax/i);
  });

  test('that nobody made signs nobody in', async () => {
    expect(await auth.redeemSignIn('madeUpToken')).toBeNull();
  });
});

test('signing out ends the session', async () => {
  const { setCookie } = (await auth.redeemSignIn(tokenOf((await auth.createSignInLink({ name: 'Odo', role: 'viewer' })).url)))!;
  await auth.signOut(cookieOf(setCookie));
  expect(await auth.identify({ cookie: cookieOf(setCookie) })).toBeNull();
});

describe('a key', () => {
  test('carries its role', async () => {
    for (const role of ['viewer', 'operator', 'admin'] as const) {
      const { key } = await auth.keys.create({ name: `feed ${role}`, role });
      expect(await auth.identify({ authorization: `Bearer ${key}` })).toMatchObject({ name: `feed ${role}`, role });
    }
  });

  test('is listed without itself', async () => {
    const made = await auth.keys.create({ name: 'listed', role: 'viewer' });
    const listed = (await auth.keys.list()).find(({ id }) => id === made.id);
    expect(listed).toMatchObject({ name: 'listed', role: 'viewer' });
    expect(JSON.stringify(listed)).not.toContain(made.key);
  });

  test('is used more than ten times a day', async () => {
    const { key } = await auth.keys.create({ name: 'busy', role: 'viewer' });
    for (let i = 0; i < 15; i++) expect(await auth.identifyKey(key)).not.toBeNull();
  });

  test('opens a session, which ends when the key is revoked', async () => {
    const made = await auth.keys.create({ name: 'wall screen', role: 'viewer' });
    const { setCookie } = (await auth.signInWithKey(made.key))!;
    expect(await auth.identify({ cookie: cookieOf(setCookie) })).toMatchObject({ role: 'viewer' });
    expect(await auth.keys.revoke(made.id)).toBe(true);
    expect(await auth.identifyKey(made.key)).toBeNull();
    expect(await auth.identify({ cookie: cookieOf(setCookie) })).toBeNull();
  });

  test('that does not exist is nobody, and cannot be revoked', async () => {
    expect(await auth.identify({ authorization: 'Bearer lb_nothing' })).toBeNull();
    expect(await auth.identify({ authorization: 'Basic abc' })).toBeNull();
    expect(await auth.identify({})).toBeNull();
    expect(await auth.keys.revoke('nothing')).toBe(false);
  });

  test('given from outside is an admin', async () => {
    expect(await auth.identifyKey(BOOTSTRAP)).toMatchObject({ role: 'admin' });
    expect(await auth.identifyKey(`${BOOTSTRAP}x`)).toBeNull();
  });
});

test('the secret that signs cookies is its owner\'s alone', () => {
  expect(statSync(join(folder, 'session-secret')).mode & 0o077).toBe(0);
});
