import * as z from 'zod';
import { formatSchema } from '../../../lib/advisory';
import { dryRunSchema, issuedSchema, MOST_ADVISORY_BYTES, storedAdvisorySchema } from '../../../lib/wire';
import { acceptAdvisory, readReceived } from '../../feeds';
import type { Accepted } from '../../feeds';
import { callerOf } from '../access';
import { eventOf } from '../eventOf';
import { fileHeaders } from '../fileHeaders';
import type { Api, HttpServices } from '../httpServices';
import { Refusal } from '../problems';
import { idempotencyKeyOf, keepBodiesRaw, sourceOf } from '../rawBodies';
import { advisoryPath, answers, eventPath, fileAnswer, listAnswer, pageQuery, refusals } from '../schemas';

const ACCEPTS = ['application/json', 'text/plain', 'text/csv', 'application/geo+json', 'application/octet-stream'] as const;

const howToRead = z.strictObject({
  format: formatSchema.optional(),
  technique: z.string().max(20).optional(),
  cycle: z.string().max(20).optional(),
  dryRun: z.enum(['true', 'false']).optional(),
});

export function advisoryRoutes(app: Api, services: HttpServices): void {
  const { store } = services;
  keepBodiesRaw(app, ACCEPTS);

  app.post(
    '/events/:id/advisories',
    {
      config: { access: 'operator', accepts: ACCEPTS },
      bodyLimit: MOST_ADVISORY_BYTES,
      schema: {
        summary: 'Issue an advisory, or (dryRun) read and check it only',
        params: eventPath,
        querystring: howToRead,
        response: { 200: dryRunSchema, 201: issuedSchema, ...refusals },
      },
    },
    async (request, reply) => {
      const event = await eventOf(services, request.params.id);
      const source = sourceOf(request);
      const { dryRun, ...how } = request.query;
      if (dryRun === 'true') {
        const reading = await readReceived(services, { event, source, how });
        if (!reading.ok) throw new Refusal('invalid', 'The forecast cannot be read.', reading.errors);
        const { advisory, format, warnings } = reading;
        return reply.code(200).send({ advisory, format, warnings, revision: event.revision });
      }
      const accepted = await acceptAdvisory(services, { event, source, how, by: callerOf(request).name, idempotencyKey: idempotencyKeyOf(request) });
      return reply.code(201).send(issuedOf(accepted));
    },
  );

  app.get('/events/:id/advisories', { config: { access: 'viewer' }, schema: { summary: 'Advisories, newest first', params: eventPath, querystring: pageQuery, response: listAnswer(storedAdvisorySchema) } }, async ({ params, query }) => {
    const event = await eventOf(services, params.id);
    return store.advisories.list(event.id, query);
  });

  app.get('/events/:id/advisories/:advisoryId', { config: { access: 'viewer' }, schema: { summary: 'One advisory', params: advisoryPath, response: answers(200, storedAdvisorySchema) } }, async ({ params }) => {
    const advisory = await store.advisories.get(params.id, params.advisoryId);
    if (!advisory) throw new Refusal('not-found', `There is no advisory ${params.advisoryId} in this event.`);
    return advisory;
  });

  app.get(
    '/events/:id/advisories/:advisoryId/source',
    { config: { access: 'viewer' }, schema: { summary: 'The file of an advisory, byte for byte as it was received', params: advisoryPath, response: fileAnswer('The file', ...ACCEPTS) } },
    async ({ params }, reply) => {
      const source = await store.advisories.source(params.id, params.advisoryId);
      if (!source) throw new Refusal('not-found', `There is no advisory ${params.advisoryId} in this event.`);
      return reply.headers(fileHeaders(source, `advisory-${params.advisoryId}`)).send(source.bytes);
    },
  );
}

/** The answer to an accepted advisory; a refused one is thrown. */
export function issuedOf(accepted: Accepted): z.infer<typeof issuedSchema> {
  if (!accepted.ok) throw new Refusal('invalid', accepted.reason === 'unreadable' ? 'The forecast cannot be read; nothing was stored.' : 'The Idempotency-Key was used for another advisory; nothing was stored.', accepted.errors);
  const { advisory, revision } = accepted;
  return { advisory, revision, warnings: advisory.warnings };
}
