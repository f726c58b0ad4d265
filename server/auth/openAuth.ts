import { createHash, randomUUID, timingSafeEqual } from 'node:crypto';
import { roleSchema } from '../../lib/wire';
import type { Identity, Role } from '../../lib/wire';
import type { Settings } from '../settings';
import type { OpenedStore } from '../store';
import { keyCache } from './keyCache';
import { COOKIE_PREFIX, LINK_SECONDS, openLibrary } from './library';
import type { AuthLibrary } from './library';
import type { KeyRecord, LeeboardAuth } from './model';
import { address, endSessionsOfFormer, peopleOf, PERSON } from './people';
import { sessionSecret } from './secret';

const KEEPER = address('keys');
const BOOTSTRAP_ID = 'bootstrap';

const digest = (text: string): Buffer => createHash('sha256').update(text).digest();

export type AuthSettings = Pick<Settings, 'DATA_DIR' | 'BOOTSTRAP_KEY'>;

/** People, sessions and keys, in the store's own database. `origin` is where people reach the server, for links and cookies. */
export async function openAuth(store: Pick<OpenedStore, 'shared'>, settings: AuthSettings, origin: string): Promise<LeeboardAuth> {
  const delivered = new Map<string, string>();
  const library = await openLibrary(store.shared, sessionSecret(settings.DATA_DIR), origin, (ticket, token) => delivered.set(ticket, token));
  const { internalAdapter, adapter } = await library.$context;
  const keeperId = await keeper(library);
  // Whoever came in by a bootstrap key goes when it is changed or taken away.
  const bootstrapHolder = settings.BOOTSTRAP_KEY ? address(`key-${BOOTSTRAP_ID}-${digest(settings.BOOTSTRAP_KEY).toString('hex').slice(0, 16)}`) : null;
  await endSessionsOfFormer(library, `key-${BOOTSTRAP_ID}-`, bootstrapHolder);
  const holderOf = (keyId: string): string => (keyId === BOOTSTRAP_ID && bootstrapHolder) || address(`key-${keyId}`);
  const cache = keyCache(identifyStoredKey);

  async function identifyKey(key: string): Promise<Identity | null> {
    if (settings.BOOTSTRAP_KEY && timingSafeEqual(digest(key), digest(settings.BOOTSTRAP_KEY))) return { id: BOOTSTRAP_ID, name: 'bootstrap key', role: 'admin' };
    return cache.get(key);
  }

  async function identifyStoredKey(key: string): Promise<Identity | null> {
    const { valid, key: record } = await library.api.verifyApiKey({ body: { key } });
    return valid && record ? { id: record.id, name: record.name ?? 'key', role: roleOfMetadata(record.metadata) } : null;
  }

  /** A one-time token for a person, who is made if need be. */
  async function oneTimeToken(email: string, name: string, role: Role): Promise<string> {
    const found = await internalAdapter.findUserByEmail(email);
    if (found) await internalAdapter.updateUser(found.user.id, { name, role });
    else await internalAdapter.createUser({ email, name, role, emailVerified: false }, { method: 'admin' });
    const ticket = randomUUID();
    await library.api.signInMagicLink({ body: { email, name, metadata: { ticket } }, headers: new Headers() });
    const token = delivered.get(ticket);
    delivered.delete(ticket);
    if (!token) throw new Error('The auth library gave no token.');
    return token;
  }

  async function redeemSignIn(token: string): Promise<{ setCookie: string } | null> {
    const answer = await library.api.magicLinkVerify({ query: { token, callbackURL: '/' }, headers: new Headers(), asResponse: true });
    const setCookie = answer.headers.getSetCookie().find((cookie) => cookie.startsWith(`${COOKIE_PREFIX}.session_token=`) && !cookie.includes('Max-Age=0'));
    return setCookie ? { setCookie } : null;
  }

  return {
    identifyKey,
    async identify({ authorization, cookie }) {
      const bearer = /^Bearer +(\S+)$/i.exec(authorization ?? '')?.[1];
      if (bearer !== undefined) return identifyKey(bearer);
      if (cookie === undefined || !cookie.includes(COOKIE_PREFIX)) return null;
      const session = await library.api.getSession({ headers: new Headers({ cookie }) });
      return session ? { id: session.user.id, name: session.user.name, role: roleSchema.parse(session.user.role) } : null;
    },
    async createSignInLink({ name, role }) {
      const token = await oneTimeToken(address(`${PERSON}${randomUUID()}`), name, role);
      return { url: `${origin}/sign-in?token=${token}`, expiresAt: new Date(Date.now() + LINK_SECONDS * 1000).toISOString() };
    },
    redeemSignIn,
    async signInWithKey(key) {
      const identity = await identifyKey(key);
      return identity ? redeemSignIn(await oneTimeToken(holderOf(identity.id), identity.name, identity.role)) : null;
    },
    async signOut(cookie) {
      const answer = await library.api.signOut({ headers: new Headers(cookie ? { cookie } : {}), asResponse: true });
      return answer.headers.getSetCookie().find((value) => value.startsWith(`${COOKIE_PREFIX}.session_token=`)) ?? `${COOKIE_PREFIX}.session_token=; Max-Age=0; Path=/; HttpOnly; SameSite=Lax`;
    },
    async everSignedIn() {
      return (await adapter.count({ model: 'user', where: [{ field: 'emailVerified', value: true }] })) > 0;
    },
    people: await peopleOf(library),
    keys: {
      async list() {
        const rows = await adapter.findMany<StoredKey>({ model: 'apikey', sortBy: { field: 'createdAt', direction: 'desc' }, limit: 1000 });
        return rows.map(keyOf);
      },
      async create({ name, role }) {
        const made = await library.api.createApiKey({ body: { name, userId: keeperId, metadata: { role } } });
        return { ...keyOf(made as unknown as StoredKey), role, key: made.key };
      },
      async revoke(id) {
        const row = await adapter.findOne<StoredKey>({ model: 'apikey', where: [{ field: 'id', value: id }] });
        if (!row) return false;
        await adapter.delete({ model: 'apikey', where: [{ field: 'id', value: id }] });
        cache.clear();
        const holder = await internalAdapter.findUserByEmail(holderOf(id));
        if (holder) await internalAdapter.deleteUserSessions(holder.user.id);
        return true;
      },
    },
  };
}

/** Keys belong to this one record, which nobody can sign in as. */
async function keeper(library: AuthLibrary): Promise<string> {
  const { internalAdapter } = await library.$context;
  const found = await internalAdapter.findUserByEmail(KEEPER);
  if (found) return found.user.id;
  const { id } = await internalAdapter.createUser({ email: KEEPER, name: 'Keeper of keys', role: 'viewer', emailVerified: false }, { method: 'admin' });
  return id;
}

interface StoredKey {
  id: string;
  name: string | null;
  start: string | null;
  metadata: unknown;
  createdAt: Date | string;
  lastRequest: Date | string | null;
}

function roleOfMetadata(metadata: unknown): Role {
  let value = metadata;
  // The library stores metadata as JSON, in some versions twice over.
  for (let depth = 0; typeof value === 'string' && depth < 2; depth++) value = JSON.parse(value) as unknown;
  return roleSchema.parse((value as { role?: unknown } | null)?.role);
}

const keyOf = (row: StoredKey): KeyRecord => ({
  id: row.id,
  name: row.name ?? '',
  role: roleOfMetadata(row.metadata),
  start: row.start,
  createdAt: new Date(row.createdAt).toISOString(),
  lastUsedAt: row.lastRequest ? new Date(row.lastRequest).toISOString() : null,
});
