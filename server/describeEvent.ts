import { eventNowMs } from '../lib/wire';
import type { Event } from '../lib/wire';
import type { Services } from './services';
import type { EventRecord } from './store';

/** The event as screens see it, with its clock read now; `advisoriesLeft` counts what the demo has still to issue. */
export function eventDescriber({ clock }: Pick<Services, 'clock'>, advisoriesLeft: (event: EventRecord) => Promise<number>) {
  return async (record: EventRecord): Promise<Event> => ({
    ...record,
    advisoriesLeft: record.demo ? await advisoriesLeft(record) : null,
    now: new Date(eventNowMs(record.clock, clock.nowMs())).toISOString(),
  });
}
