import type { IncomingHttpHeaders } from 'node:http';
import type { Identity } from '../../lib/wire';
import type { Auth } from '../services';

/** What a connection showed when it was made; shown again at each check (rule 8). */
export type Credentials = { key: string } | { authorization: string | undefined; cookie: string | undefined };

export function credentialsOf({ auth, headers }: { auth: Record<string, unknown>; headers: IncomingHttpHeaders }): Credentials {
  if (auth.key !== undefined) return { key: String(auth.key) };
  return { authorization: headers.authorization, cookie: headers.cookie };
}

export const identifyBy = (auth: Auth, credentials: Credentials): Promise<Identity | null> =>
  'key' in credentials ? auth.identifyKey(credentials.key) : auth.identify(credentials);

/** A refused connection, as socket.io hands it to `connect_error`. */
export const refusal = (code: 'unauthorized' | 'failed' | 'not-found', message: string): Error & { data: { code: string } } =>
  Object.assign(new Error(message), { data: { code } });
