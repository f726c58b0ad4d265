import { issuedSchema } from '../../../lib/wire';
import { callerOf } from '../access';
import { eventOf } from '../eventOf';
import type { Api, HttpServices } from '../httpServices';
import { Refusal } from '../problems';
import { idempotencyKeyOf } from '../rawBodies';
import { answers, eventPath } from '../schemas';
import { issuedOf } from './advisories';

export function demoRoutes(app: Api, services: HttpServices): void {
  const { store, demo } = services;

  app.post('/events/:id/demo/next', { config: { access: 'operator' }, schema: { summary: 'Issue the next advisory of the demo exercise', params: eventPath, response: answers(201, issuedSchema) } }, async (request, reply) => {
    const event = await eventOf(services, request.params.id);
    if (!event.demo || !demo) throw new Refusal('conflict', 'This event is not the demo exercise: its advisories come from a forecast centre.');
    const key = idempotencyKeyOf(request);
    // The next advisory is another one once the first is in: a repeated call is known by its key alone.
    const before = key === null ? null : await store.advisories.ofKey(event.id, key);
    if (before) return reply.code(201).send({ advisory: before, revision: event.revision, warnings: before.warnings });
    const accepted = await demo.next(event, callerOf(request).name, key);
    if (!accepted) throw new Refusal('conflict', 'All advisories of the demo exercise are in.');
    return reply.code(201).send(issuedOf(accepted));
  });
}
