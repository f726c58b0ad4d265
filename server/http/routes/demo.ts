import { issuedSchema } from '../../../lib/wire';
import type { Accepted } from '../../feeds';
import { callerOf } from '../access';
import { eventOf } from '../eventOf';
import type { Api, HttpServices } from '../httpServices';
import { Refusal } from '../problems';
import { idempotencyKeyOf } from '../rawBodies';
import { answers, eventPath } from '../schemas';
import { issuedOf } from './advisories';

/** Keys remembered at most; a press of a button is repeated within seconds or never. */
const MOST_KEYS = 100;

export function demoRoutes(app: Api, services: HttpServices): void {
  const { demo } = services;
  // The stored advisories carry keys of the demo's own, so repeated presses are known here.
  const pressed = new Map<string, Promise<Accepted | null>>();

  app.post('/events/:id/demo/next', { config: { access: 'operator' }, schema: { summary: 'Issue the next advisory of the demo exercise', params: eventPath, response: answers(201, issuedSchema) } }, async (request, reply) => {
    const event = await eventOf(services, request.params.id);
    if (!event.demo || !demo) throw new Refusal('conflict', 'This event is not the demo exercise: its advisories come from a forecast centre.');
    const key = idempotencyKeyOf(request);
    const pressedAs = `${event.id} ${key ?? request.id}`;
    const issuing = pressed.get(pressedAs) ?? demo.next(event, callerOf(request).name);
    pressed.set(pressedAs, issuing);
    if (pressed.size > MOST_KEYS) pressed.delete(pressed.keys().next().value!);
    const accepted = await issuing.catch((error: unknown) => {
      pressed.delete(pressedAs);
      throw error;
    });
    if (!accepted) throw new Refusal('conflict', 'All advisories of the demo exercise are in.');
    return reply.code(201).send(issuedOf(accepted));
  });
}
