import { randomUUID } from 'node:crypto';
import { mkdtempSync, rmSync, statSync } from 'node:fs';
import { tmpdir } from 'node:os';
import { join } from 'node:path';
import { afterAll, beforeAll, describe, expect, test } from 'vitest';
import { openAuth } from '../../../server/auth';
import type { LeeboardAuth } from '../../../server/auth';
import { ENGINES } from '../store/engines';
import type { Opened } from '../store/engines';

const ORIGIN = 'http://127.0.0.1:4600';
const BOOTSTRAP = 'a-bootstrap-key-of-some-length';
const tokenOf = (url: string): string => new URL(url).searchParams.get('token')!;
const cookieOf = (setCookie: string): string => setCookie.split(';')[0];

describe.each(ENGINES)('on %s', (_, open) => {
  const folder = mkdtempSync(join(tmpdir(), 'leeboard-auth-'));
  let opened: Opened;
  let auth: LeeboardAuth;
  beforeAll(async () => {
    opened = await open();
    auth = await openAuth(opened.store, { DATA_DIR: folder, BOOTSTRAP_KEY: BOOTSTRAP }, ORIGIN);
  }, 60_000);
  afterAll(async () => {
    await opened.close();
    rmSync(folder, { recursive: true, force: true });
  });

  describe('a one-time link', () => {
    test('signs one person in, once', async () => {
      expect(await auth.everSignedIn()).toBe(false);
      const link = await auth.createSignInLink({ name: 'Mara', role: 'operator' });
      expect(link.url.startsWith(`${ORIGIN}/sign-in?token=`)).toBe(true);
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

  test('opened again, it knows everyone', async () => {
    const { key } = await auth.keys.create({ name: 'lasting', role: 'operator' });
    const { setCookie } = (await auth.redeemSignIn(tokenOf((await auth.createSignInLink({ name: 'Odo', role: 'admin' })).url)))!;
    const again = await openAuth(opened.store, { DATA_DIR: folder, BOOTSTRAP_KEY: undefined }, ORIGIN);
    expect(await again.identifyKey(key)).toMatchObject({ name: 'lasting', role: 'operator' });
    expect(await again.identify({ cookie: cookieOf(setCookie) })).toMatchObject({ name: 'Odo', role: 'admin' });
    expect(await again.identifyKey(BOOTSTRAP)).toBeNull();
  });

  test('whoever came in by a bootstrap key goes when it is changed or taken away', async () => {
    const { setCookie } = (await auth.signInWithKey(BOOTSTRAP))!;
    const cookie = cookieOf(setCookie);
    expect(await auth.identify({ cookie })).toMatchObject({ role: 'admin' });
    const same = await openAuth(opened.store, { DATA_DIR: folder, BOOTSTRAP_KEY: BOOTSTRAP }, ORIGIN);
    expect(await same.identify({ cookie })).toMatchObject({ role: 'admin' });
    const changed = await openAuth(opened.store, { DATA_DIR: folder, BOOTSTRAP_KEY: `${BOOTSTRAP}-changed` }, ORIGIN);
    expect(await changed.identify({ cookie })).toBeNull();
  });

  test('keepers of keys are no people, and cannot be removed as such', async () => {
    await auth.signInWithKey((await auth.keys.create({ name: 'wall', role: 'viewer' })).key);
    expect((await auth.people.list()).map(({ name }) => name)).not.toContain('wall');
    expect(await auth.people.remove('nobody')).toBe(false);
  });

  test('people sign in while the store writes: neither waits for a lock of the other', async () => {
    const eventId = randomUUID();
    await opened.store.events.add({ id: eventId, name: 'Quillon', timeZone: 'UTC', exercise: false, demo: false, clock: null, createdAt: '2031-09-19T09:00:00.000Z' });
    const entry = { eventId, kind: 'note' as const, text: 'x', zoneId: null, by: 'Mara', at: '2031-09-19T09:00:00.000Z', recordedAt: '2031-09-19T09:00:00.000Z' };
    await Promise.all(Array.from({ length: 30 }, (_, i) => [opened.store.log.add(entry, null), auth.createSignInLink({ name: `Person ${i}`, role: 'viewer' })]).flat());
    expect((await opened.store.log.list(eventId, { offset: 0, limit: 1 })).total).toBe(30);
  });
});
