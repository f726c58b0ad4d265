import * as z from 'zod';
import { identitySchema } from '../../../lib/wire';
import { callerOf } from '../access';
import type { Api, HttpServices } from '../httpServices';
import { Refusal } from '../problems';
import { answers, refusals } from '../schemas';

const given = z.union([z.strictObject({ token: z.string().min(1).max(500) }), z.strictObject({ key: z.string().min(1).max(500) })], 'give the token of a one-time link, or a key');
/** Far above what people do, far below what guessing needs. */
const RATE = { max: 30, timeWindow: 60_000 };

export function sessionRoutes(app: Api, { auth }: HttpServices): void {
  app.get('/me', { config: { access: 'viewer' }, schema: { summary: 'Who is calling', response: answers(200, identitySchema) } }, async (request) => callerOf(request));

  app.post('/sign-in', { config: { access: 'anyone', rateLimit: RATE }, schema: { summary: 'Start a session with a one-time token or a key', body: given, response: answers(200, identitySchema) } }, async ({ body }, reply) => {
    const session = 'token' in body ? await auth.redeemSignIn(body.token) : await auth.signInWithKey(body.key);
    const identity = session && (await auth.identify({ cookie: session.setCookie.split(';')[0] }));
    if (!identity) throw new Refusal('unauthorized', 'token' in body ? 'This link was used before, is out of date, or was never made. Ask an admin for a new one.' : 'This key is not known here.');
    return reply.header('set-cookie', session.setCookie).header('cache-control', 'no-store').send(identity);
  });

  app.post('/sign-out', { config: { access: 'viewer' }, schema: { summary: 'End the session', response: { 204: z.undefined(), ...refusals } } }, async ({ headers }, reply) =>
    reply.header('set-cookie', await auth.signOut(headers.cookie)).code(204).send(),
  );
}
