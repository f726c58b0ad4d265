import type { Person, Role } from '../../lib/wire';
import type { Auth } from '../services';

export interface KeyRecord {
  id: string;
  name: string;
  role: Role;
  /** The key's first letters, to tell keys apart. */
  start: string | null;
  createdAt: string;
  lastUsedAt: string | null;
}

/** People, sessions and keys. Nobody has a password: people come by one-time link or with a key. */
export interface LeeboardAuth extends Auth {
  /** A link that signs one person in, once, within a day. */
  createSignInLink(person: { name: string; role: Role }): Promise<{ url: string; expiresAt: string }>;
  /** The cookie of a new session, or null when the token is unknown, used or out of date. */
  redeemSignIn(token: string): Promise<{ setCookie: string } | null>;
  signInWithKey(key: string): Promise<{ setCookie: string } | null>;
  /** Ends the session; answers the cookie that clears it. */
  signOut(cookie: string | undefined): Promise<string>;
  /** Whether anyone has ever signed in. */
  everSignedIn(): Promise<boolean>;
  /** Whoever was given a one-time link. */
  people: {
    list(): Promise<Person[]>;
    /** Ends the person's sessions and links for good. False: no such person. */
    remove(id: string): Promise<boolean>;
  };
  keys: {
    list(): Promise<KeyRecord[]>;
    create(input: { name: string; role: Role }): Promise<KeyRecord & { key: string }>;
    /** False: no such key. Sessions opened with the key end with it. */
    revoke(id: string): Promise<boolean>;
  };
}
