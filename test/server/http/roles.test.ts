import type { RouteOptions } from 'fastify';
import { afterAll, beforeAll, describe, expect, test } from 'vitest';
import { atLeast, ROLES } from '../../../lib/wire';
import type { Role } from '../../../lib/wire';
import { httpWorld } from './world';
import type { World } from './world';

/** What the contract gives to each role: read off its tables, route by route. */
const CONTRACT: Record<string, string> = {
  'GET /api/v1/health': 'anyone',
  'GET /api/v1/openapi.json': 'anyone',
  'POST /api/v1/sign-in': 'anyone',
  'POST /api/v1/sign-out': 'viewer',
  'GET /api/v1/me': 'viewer',
  'GET /metrics': 'viewer',
  'GET /api/v1/events': 'viewer',
  'GET /api/v1/events/:id': 'viewer',
  'POST /api/v1/events': 'operator',
  'PATCH /api/v1/events/:id/clock': 'operator',
  'POST /api/v1/events/:id/advisories': 'operator',
  'GET /api/v1/events/:id/advisories': 'viewer',
  'GET /api/v1/events/:id/advisories/:advisoryId': 'viewer',
  'GET /api/v1/events/:id/advisories/:advisoryId/source': 'viewer',
  'POST /api/v1/events/:id/demo/next': 'operator',
  'POST /api/v1/events/:id/layers': 'admin',
  'GET /api/v1/events/:id/layers': 'viewer',
  'GET /api/v1/events/:id/layers/:layerId/source': 'viewer',
  'GET /api/v1/events/:id/impact': 'viewer',
  'GET /api/v1/events/:id/impact/assets': 'viewer',
  'GET /api/v1/events/:id/impact/marks': 'viewer',
  'GET /api/v1/events/:id/swath': 'viewer',
  'GET /api/v1/events/:id/exports/:name': 'viewer',
  'POST /api/v1/events/:id/log': 'operator',
  'GET /api/v1/events/:id/log': 'viewer',
  'GET /api/v1/keys': 'admin',
  'POST /api/v1/keys': 'admin',
  'DELETE /api/v1/keys/:keyId': 'admin',
  'POST /api/v1/sign-in-links': 'admin',
  'GET /api/v1/people': 'admin',
  'DELETE /api/v1/people/:personId': 'admin',
};

let world: World;
beforeAll(async () => {
  world = await httpWorld();
  await world.app.ready();
});
afterAll(() => world.close());

/** Methods and addresses of every route, from the router's own tree. */
function registered(): string[] {
  const found: string[] = [];
  const parts: string[] = [];
  for (const line of world.app.printRoutes({ commonPrefix: false }).split('\n')) {
    const match = /^((?:[│ ] {3})*)[├└]── (\S*)(?: \(([^)]+)\))?$/.exec(line);
    if (!match) continue;
    const depth = match[1].length / 4;
    parts.length = depth;
    parts[depth] = match[2];
    for (const method of match[3]?.split(', ') ?? []) found.push(`${method} ${parts.join('')}`);
  }
  return found;
}

const REFUSED = [401, 403];
const routes = (): string[] => registered().filter((route) => !route.startsWith('HEAD '));
const withoutParameters = (url: string): string => url.replace(/:\w+/g, 'nothing');

test('the routes are those of the contract, no more and no less', () => {
  expect(routes().sort()).toEqual(Object.keys(CONTRACT).sort());
});

describe.each(Object.entries(CONTRACT))('%s, open to %s', (route, access) => {
  const [method, url] = route.split(' ') as ['GET', string];

  test.each([['without a key', {}], ['with a key that nobody made', { authorization: 'Bearer lb_made_up' }]])('%s', async (_, headers) => {
    const answer = await world.call({ method, url: withoutParameters(url), as: null, headers });
    if (access === 'anyone') return expect(REFUSED).not.toContain(answer.statusCode);
    expect(answer.statusCode).toBe(401);
    expect(answer.headers['www-authenticate']).toBe('Bearer');
  });

  test.each(ROLES)('as %s', async (role) => {
    const { statusCode } = await world.call({ method, url: withoutParameters(url), as: role });
    if (access === 'anyone' || atLeast(role, access as Role)) expect(REFUSED).not.toContain(statusCode);
    else expect(statusCode).toBe(403);
  });
});

test('a HEAD asks for no less than its GET', async () => {
  for (const route of registered().filter((one) => one.startsWith('HEAD '))) {
    const url = route.slice('HEAD '.length);
    if (CONTRACT[`GET ${url}`] === 'anyone') continue;
    expect((await world.call({ method: 'HEAD', url: withoutParameters(url), as: null })).statusCode, route).toBe(401);
  }
});

test('a route that does not say who may call it cannot be made', async () => {
  const { buildHttp } = await import('../../../server/http');
  const app = await buildHttp(world.services);
  const open: RouteOptions = { method: 'GET', url: '/open', handler: async () => 'anything' };
  expect(() => app.route(open)).toThrow('does not say who may call it');
  await app.close();
});

test('a refused caller is refused before a byte of the body is read', async () => {
  const { statusCode } = await world.call({ method: 'POST', url: '/api/v1/events/nothing/layers?kind=assets&name=n', as: 'operator', headers: { 'content-type': 'image/png' }, payload: Buffer.alloc(10) });
  expect(statusCode).toBe(403);
});
