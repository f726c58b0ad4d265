import { randomUUID } from 'node:crypto';
import * as z from 'zod';
import { instant } from '../../../lib/advisory';
import { eventSchema, newClockSchema, newEventSchema } from '../../../lib/wire';
import type { NewEvent } from '../../../lib/wire';
import type { EventRecord } from '../../store';
import { callerOf } from '../access';
import { eventOf, nowOf } from '../eventOf';
import type { Api, HttpServices } from '../httpServices';
import { Refusal } from '../problems';
import { answers, eventPath, listAnswer, pageQuery } from '../schemas';

const changedClock = z
  .strictObject({ startsAt: instant.optional(), rate: newClockSchema.shape.rate.optional() })
  .refine(({ startsAt, rate }) => startsAt !== undefined || rate !== undefined, 'give startsAt, rate, or both');

export function eventRoutes(app: Api, services: HttpServices): void {
  const { store, bus, clock } = services;
  const wallNow = (): string => new Date(clock.nowMs()).toISOString();

  app.get('/events', { config: { access: 'viewer' }, schema: { summary: 'Events, newest first', querystring: pageQuery, response: listAnswer(eventSchema) } }, async ({ query }) => {
    const { items, ...rest } = await store.events.list(query);
    return { ...rest, items: await Promise.all(items.map((record) => services.describeEvent(record))) };
  });

  app.get('/events/:id', { config: { access: 'viewer' }, schema: { summary: 'One event, with its clock read now', params: eventPath, response: answers(200, eventSchema) } }, async ({ params }) =>
    services.describeEvent(await eventOf(services, params.id)),
  );

  app.post('/events', { config: { access: 'operator' }, schema: { summary: 'Start an event', body: newEventSchema, response: answers(201, eventSchema) } }, async (request, reply) => {
    const record = await store.events.add(recordOf(request.body, wallNow()));
    request.log.info({ event: record.id, by: callerOf(request).name }, 'event started');
    return reply.code(201).header('location', `/api/v1/events/${record.id}`).send(await services.describeEvent(record));
  });

  app.patch(
    '/events/:id/clock',
    { config: { access: 'operator' }, schema: { summary: "Set an exercise's clock: where it stands, how fast it runs", params: eventPath, body: changedClock, response: answers(200, eventSchema) } },
    async (request) => {
      const event = await eventOf(services, request.params.id);
      if (!event.exercise) throw new Refusal('conflict', 'A real event runs on the wall clock; only an exercise has a clock of its own.');
      const { startsAt = nowOf(services, event), rate = event.clock?.rate ?? 1 } = request.body;
      await store.events.setClock(event.id, { startsAt, rate, anchoredAt: wallNow() });
      bus.emit('event', { eventId: event.id });
      return services.describeEvent(await eventOf(services, event.id));
    },
  );
}

const recordOf = ({ name, timeZone, exercise, clock }: NewEvent, at: string): Omit<EventRecord, 'revision' | 'advisoryId'> => ({
  id: randomUUID(),
  name,
  timeZone,
  exercise,
  demo: false,
  clock: clock ? { ...clock, anchoredAt: at } : null,
  createdAt: at,
});
