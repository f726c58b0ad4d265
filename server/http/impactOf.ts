import type { Impact } from '../../lib/impact';
import type { EventRecord } from '../store';
import type { HttpServices } from './httpServices';
import { Refusal } from './problems';

/** An impact by its revision; without one, the newest. */
export async function impactOf({ store }: Pick<HttpServices, 'store'>, event: EventRecord, revision: number | undefined): Promise<Impact> {
  const impact = revision === undefined ? await store.impacts.current(event.id) : await store.impacts.get(event.id, revision);
  if (impact) return impact;
  if (event.revision === 0) throw new Refusal('not-computed', 'This event has no impact yet: it is computed when an advisory is in.');
  throw new Refusal('not-found', `There is no revision ${revision}: this event is at revision ${event.revision}.`);
}
