import * as z from 'zod';
import { assetRowSchema, impactSchema } from '../../../lib/impact';
import { ASSET_SORTS, pageOfAssets } from '../../compute/bulk';
import type { BulkName } from '../../store';
import type { assetReader } from '../assetsOf';
import { eventOf } from '../eventOf';
import { FOR_EVER } from '../fileHeaders';
import type { Api, HttpServices } from '../httpServices';
import { impactOf } from '../impactOf';
import { Refusal } from '../problems';
import { answers, eventPath, fileAnswer, listAnswer, page, revision } from '../schemas';
import { sendPacked } from '../sendPacked';

const PRODUCTS = ['peak', 'arrival', 'chance34', 'chance50', 'chance64', 'rain'] as const;

const ofRevision = z.strictObject({ revision });
const assetQuery = z.strictObject({ revision, ...page, layer: z.string().optional(), class: z.string().optional(), sort: z.enum(ASSET_SORTS).optional() });
const swathQuery = z.strictObject({ revision, product: z.enum(PRODUCTS).default('peak') });

/** A named revision never changes; the newest is another one soon. */
const caching = (named: number | undefined): string => (named === undefined ? 'private, no-cache' : FOR_EVER);

export function impactRoutes(app: Api, services: HttpServices, assetsOf: ReturnType<typeof assetReader>): void {
  const { store } = services;

  app.get('/events/:id/impact', { config: { access: 'viewer' }, schema: { summary: 'The impact of a revision', params: eventPath, querystring: ofRevision, response: answers(200, impactSchema) } }, async ({ params, query }, reply) => {
    const impact = await impactOf(services, await eventOf(services, params.id), query.revision);
    return reply.header('cache-control', caching(query.revision)).send(impact);
  });

  app.get('/events/:id/impact/assets', { config: { access: 'viewer' }, schema: { summary: 'Asset rows, a page at a time', params: eventPath, querystring: assetQuery, response: listAnswer(assetRowSchema) } }, async ({ params, query }, reply) => {
    const impact = await impactOf(services, await eventOf(services, params.id), query.revision);
    const rows = await assetsOf(impact.eventId, impact.revision);
    const page = await pageOfAssets(rows, query);
    // Made here by its type: holding a thousand rows against the schema again would keep others waiting.
    return reply.header('cache-control', caching(query.revision)).serializer(JSON.stringify).send(page);
  });

  app.get(
    '/events/:id/impact/marks',
    { config: { access: 'viewer' }, schema: { summary: 'What a map draws of all assets, column by column', params: eventPath, querystring: ofRevision, response: fileAnswer('id, lon, lat, classIndex and maxWindKt in step; classes by index', 'application/json') } },
    async (request, reply) => {
      const impact = await impactOf(services, await eventOf(services, request.params.id), request.query.revision);
      void reply.header('cache-control', caching(request.query.revision));
      return sendPacked(request, reply, 'application/json; charset=utf-8', await bulkOf(impact, 'marks'));
    },
  );

  app.get(
    '/events/:id/swath',
    { config: { access: 'viewer' }, schema: { summary: 'Areas of wind, arrival or chance', params: eventPath, querystring: swathQuery, response: fileAnswer('GeoJSON polygons (RFC 7946)', 'application/geo+json') } },
    async (request, reply) => {
      const { product } = request.query;
      if (product === 'rain') throw new Refusal('not-computed', 'Rain is not computed in this release. No rain shown does not mean that no rain will fall.');
      const impact = await impactOf(services, await eventOf(services, request.params.id), request.query.revision);
      void reply.header('cache-control', caching(request.query.revision));
      return sendPacked(request, reply, 'application/geo+json', await bulkOf(impact, product));
    },
  );

  async function bulkOf({ eventId, revision: at, stage }: z.infer<typeof impactSchema>, name: BulkName): Promise<Uint8Array> {
    const bytes = await store.impacts.bulk(eventId, at, name);
    if (bytes) return bytes;
    if (stage === 'track' && name.startsWith('chance')) throw new Refusal('not-computed', `Revision ${at} holds the forecast track alone; chances come with the members, in the revision after.`);
    throw new Refusal('not-computed', `Revision ${at} has no ${name}.`);
  }
}
