import { apiKey } from '@better-auth/api-key';
import { betterAuth } from 'better-auth';
import { getMigrations } from 'better-auth/db/migration';
import { magicLink } from 'better-auth/plugins/magic-link';
import type { SharedDatabase } from '../store';

const DAY_SECONDS = 24 * 3600;
/** A storm season: a screen on the wall is not to ask for a new link in the midst of one. */
const SESSION_DAYS = 180;
export const COOKIE_PREFIX = 'leeboard';

/**
 * The auth library, set up: sessions in cookies, sign-in by one-time link, keys for machines. `deliver` is handed each link's
 * token in place of an e-mail. It shares the store's query layer, not only its database: SQLite has one writer, and a second
 * connection of this thread would wait for the store's transaction while keeping it from ending.
 */
export async function openLibrary({ db, engine }: SharedDatabase, secret: string, origin: string, deliver: (ticket: string, token: string) => void) {
  const auth = betterAuth({
    appName: 'Leeboard',
    baseURL: origin,
    secret,
    database: { db, type: engine, transaction: true },
    telemetry: { enabled: false },
    // A refused key is an answer, not a fault; faults come as exceptions.
    logger: { disabled: true },
    rateLimit: { enabled: false },
    session: { expiresIn: SESSION_DAYS * DAY_SECONDS, updateAge: DAY_SECONDS },
    user: { additionalFields: { role: { type: 'string', required: true, defaultValue: 'viewer', input: false } } },
    advanced: { cookiePrefix: COOKIE_PREFIX, useSecureCookies: origin.startsWith('https:'), defaultCookieAttributes: { sameSite: 'lax', httpOnly: true, path: '/' } },
    plugins: [
      magicLink({
        expiresIn: DAY_SECONDS,
        disableSignUp: true,
        storeToken: 'hashed',
        sendMagicLink: ({ token, metadata }) => deliver(String(metadata?.ticket), token),
      }),
      // Requests are limited by the HTTP server, alike for keys and sessions.
      apiKey({ defaultPrefix: 'lb_', enableMetadata: true, rateLimit: { enabled: false } }),
    ],
  });
  const { runMigrations } = await getMigrations(auth.options);
  await runMigrations();
  return auth;
}

export const LINK_SECONDS = DAY_SECONDS;
export type AuthLibrary = Awaited<ReturnType<typeof openLibrary>>;
