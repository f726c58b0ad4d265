import * as z from 'zod';
import { newKeySchema, personSchema } from '../../../lib/wire';
import { callerOf } from '../access';
import type { Api, HttpServices } from '../httpServices';
import { Refusal } from '../problems';
import { answers, listAnswer, pageQuery, refusals } from '../schemas';

const linkSchema = z.object({ url: z.string(), expiresAt: z.iso.datetime() });

export function peopleRoutes(app: Api, { auth }: HttpServices): void {
  app.post('/sign-in-links', { config: { access: 'admin' }, schema: { summary: 'Make a link that signs one person in, once', body: newKeySchema, response: answers(201, linkSchema) } }, async (request, reply) => {
    const link = await auth.createSignInLink(request.body);
    request.log.info({ name: request.body.name, role: request.body.role, by: callerOf(request).name }, 'sign-in link made');
    return reply.code(201).header('cache-control', 'no-store').send(link);
  });

  app.get('/people', { config: { access: 'admin' }, schema: { summary: 'Whoever was given a one-time link, newest first', querystring: pageQuery, response: listAnswer(personSchema) } }, async ({ query: { offset, limit } }) => {
    const people = await auth.people.list();
    return { items: people.slice(offset, offset + limit), total: people.length, offset };
  });

  app.delete('/people/:personId', { config: { access: 'admin' }, schema: { summary: 'Remove a person and end their sessions and links', params: z.object({ personId: z.string() }), response: { 204: z.undefined(), ...refusals } } }, async (request, reply) => {
    if (!(await auth.people.remove(request.params.personId))) throw new Refusal('not-found', 'There is no such person; they may have been removed before.');
    request.log.info({ person: request.params.personId, by: callerOf(request).name }, 'person removed');
    return reply.code(204).send();
  });
}
