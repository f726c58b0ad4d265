import { logEntrySchema, newLogEntrySchema } from '../../../lib/wire';
import { callerOf } from '../access';
import { eventOf, nowOf } from '../eventOf';
import type { Api, HttpServices } from '../httpServices';
import { idempotencyKeyOf } from '../rawBodies';
import { answers, eventPath, listAnswer, pageQuery } from '../schemas';

export function logRoutes(app: Api, services: HttpServices): void {
  const { store, bus, clock } = services;

  app.post('/events/:id/log', { config: { access: 'operator' }, schema: { summary: 'Log a decision, a handover or a note; what is logged stays', params: eventPath, body: newLogEntrySchema, response: answers(201, logEntrySchema) } }, async (request, reply) => {
    const event = await eventOf(services, request.params.id);
    const { kind, text, zoneId } = request.body;
    const written = { eventId: event.id, kind, text, zoneId: zoneId ?? null, by: callerOf(request).name, at: nowOf(services, event), recordedAt: new Date(clock.nowMs()).toISOString() };
    const { entry, repeated } = await store.log.add(written, idempotencyKeyOf(request));
    if (!repeated) bus.emit('log', entry);
    return reply.code(201).send(entry);
  });

  app.get('/events/:id/log', { config: { access: 'viewer' }, schema: { summary: 'The log, newest first', params: eventPath, querystring: pageQuery, response: listAnswer(logEntrySchema) } }, async ({ params, query }) => {
    const event = await eventOf(services, params.id);
    return store.log.list(event.id, query);
  });
}
