import type { Event } from '../../lib/wire';
import { eventNowMs } from '../../lib/wire';
import type { EventRecord } from '../store';
import type { HttpServices } from './httpServices';
import { Refusal } from './problems';

export async function eventOf({ store }: Pick<HttpServices, 'store'>, id: string): Promise<EventRecord> {
  const event = await store.events.get(id);
  if (!event) throw new Refusal('not-found', `There is no event ${id}.`);
  return event;
}

/** The event's clock now, to the second. */
export const nowOf = ({ clock }: Pick<HttpServices, 'clock'>, event: { clock: Event['clock'] }): string => new Date(eventNowMs(event.clock, clock.nowMs())).toISOString();
