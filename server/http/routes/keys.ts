import * as z from 'zod';
import { keySchema, madeKeySchema, newKeySchema } from '../../../lib/wire';
import { callerOf } from '../access';
import type { Api, HttpServices } from '../httpServices';
import { Refusal } from '../problems';
import { answers, listAnswer, pageQuery, refusals } from '../schemas';

export function keyRoutes(app: Api, { auth }: HttpServices): void {
  app.get('/keys', { config: { access: 'admin' }, schema: { summary: 'Keys, newest first, without themselves', querystring: pageQuery, response: listAnswer(keySchema) } }, async ({ query: { offset, limit } }) => {
    const keys = await auth.keys.list();
    return { items: keys.slice(offset, offset + limit), total: keys.length, offset };
  });

  app.post('/keys', { config: { access: 'admin' }, schema: { summary: 'Make a key; it is shown once', body: newKeySchema, response: answers(201, madeKeySchema) } }, async (request, reply) => {
    const made = await auth.keys.create(request.body);
    request.log.info({ key: made.id, name: made.name, role: made.role, by: callerOf(request).name }, 'key made');
    return reply.code(201).header('cache-control', 'no-store').send(made);
  });

  app.delete('/keys/:keyId', { config: { access: 'admin' }, schema: { summary: 'Revoke a key and end the sessions opened with it', params: z.object({ keyId: z.string() }), response: { 204: z.undefined(), ...refusals } } }, async (request, reply) => {
    if (!(await auth.keys.revoke(request.params.keyId))) throw new Refusal('not-found', 'There is no such key; it may have been revoked before.');
    request.log.info({ key: request.params.keyId, by: callerOf(request).name }, 'key revoked');
    return reply.code(204).send();
  });
}
