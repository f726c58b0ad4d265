import type { FastifyRequest } from 'fastify';
import { atLeast } from '../../lib/wire';
import type { Identity, Role } from '../../lib/wire';
import type { Api, HttpServices } from './httpServices';
import { Refusal } from './problems';

/** Who may call a route: anyone, or whoever holds a role. */
export type Access = 'anyone' | Role;

declare module 'fastify' {
  interface FastifyContextConfig {
    /** Every route says who may call it; one that does not cannot be registered. */
    access?: Access;
    /** Content types of a body that is kept as it was received. */
    accepts?: readonly string[];
  }
  interface FastifyRequest {
    identity: Identity | null;
  }
}

/** Checks every call before anything of its body is read. */
export function guardAccess(app: Api, { auth }: Pick<HttpServices, 'auth'>): void {
  app.addHook('onRoute', ({ method, url, config }) => {
    if (!config?.access) throw new Error(`The route ${String(method)} ${url} does not say who may call it.`);
  });
  app.decorateRequest('identity', null);
  app.addHook('onRequest', async (request) => {
    const { access } = request.routeOptions.config;
    if (request.is404 || access === undefined || access === 'anyone') return;
    const { authorization, cookie } = request.headers;
    request.identity = await auth.identify({ authorization, cookie });
    if (!request.identity) {
      throw new Refusal('unauthorized', authorization || cookie ? 'This key or session is not known here, or no longer.' : 'Sign in, or send a key as "Authorization: Bearer KEY".');
    }
    if (!atLeast(request.identity.role, access)) throw new Refusal('forbidden', `This needs the role ${access}; you are signed in as ${request.identity.role}.`);
  });
}

/** Who is calling a route that asks for a role. */
export function callerOf(request: FastifyRequest): Identity {
  if (!request.identity) throw new Error(`${request.method} ${request.routeOptions.url} asks who is calling but lets anyone in.`);
  return request.identity;
}
