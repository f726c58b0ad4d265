import * as z from 'zod';
import { LAYER_KINDS } from '../../../lib/exposure';
import type { RowError } from '../../../lib/exposure';
import { layerSchema, layerStoredSchema, MOST_LAYER_BYTES } from '../../../lib/wire';
import type { InputError } from '../../../lib/advisory';
import { acceptLayer } from '../../feeds';
import { callerOf } from '../access';
import { eventOf } from '../eventOf';
import { fileHeaders } from '../fileHeaders';
import type { Api, HttpServices } from '../httpServices';
import { Refusal } from '../problems';
import { keepBodiesRaw, sourceOf } from '../rawBodies';
import { answers, eventPath, fileAnswer, layerPath, listAnswer, pageQuery } from '../schemas';

const ACCEPTS = ['application/geo+json', 'application/json', 'text/csv', 'text/plain', 'application/octet-stream'] as const;

const whatItIs = z.strictObject({ kind: z.enum(LAYER_KINDS), name: z.string().trim().min(1, 'a layer needs a name').max(120) });

export function layerRoutes(app: Api, services: HttpServices): void {
  const { store } = services;
  keepBodiesRaw(app, ACCEPTS);

  app.post(
    '/events/:id/layers',
    {
      config: { access: 'admin', accepts: ACCEPTS },
      bodyLimit: MOST_LAYER_BYTES,
      schema: { summary: 'Bring in a layer (GeoJSON or CSV); the same name again is its next version', params: eventPath, querystring: whatItIs, response: answers(201, layerStoredSchema) },
    },
    async (request, reply) => {
      const event = await eventOf(services, request.params.id);
      const { kind, name } = request.query;
      const source = sourceOf(request);
      const accepted = await acceptLayer(services, { eventId: event.id, kind, name, source, by: callerOf(request).name });
      if (!accepted.ok) throw new Refusal('invalid', 'The layer cannot be read; nothing was stored.', accepted.errors.map(inputErrorOf));
      const { layer, rejected } = accepted;
      return reply.code(201).send({ layer, accepted: layer.rows, rejected });
    },
  );

  app.get('/events/:id/layers', { config: { access: 'viewer' }, schema: { summary: 'Layers in all their versions, newest first', params: eventPath, querystring: pageQuery, response: listAnswer(layerSchema) } }, async ({ params, query }) => {
    const event = await eventOf(services, params.id);
    return store.layers.list(event.id, query);
  });

  app.get(
    '/events/:id/layers/:layerId/source',
    { config: { access: 'viewer' }, schema: { summary: 'The file of a layer, byte for byte as it was received', params: layerPath, response: fileAnswer('The file', ...ACCEPTS) } },
    async ({ params }, reply) => {
      const source = await store.layers.source(params.id, params.layerId);
      if (!source) throw new Refusal('not-found', `There is no layer ${params.layerId} in this event.`);
      return reply.headers(fileHeaders(source, `layer-${params.layerId}`)).send(source.bytes);
    },
  );
}

/** Rows count as lines in a problem document, columns by their names as paths. */
const inputErrorOf = ({ row, column, message }: RowError): InputError => ({ line: row, ...(column === undefined ? {} : { path: column }), message });
