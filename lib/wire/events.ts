import * as z from 'zod';
import { instant } from '../advisory';

const timeZone = z.string().refine((value) => {
  try {
    return Boolean(new Intl.DateTimeFormat('en', { timeZone: value }));
  } catch {
    return false;
  }
}, 'expected an IANA time zone such as Etc/GMT+3');

/** An exercise's own clock: reads `startsAt` when the wall clock read `anchoredAt`, and runs at `rate`. */
export const newClockSchema = z.object({ startsAt: instant, rate: z.number().min(0).max(3600) });

export const newEventSchema = z
  .object({
    name: z.string().trim().min(1, 'an event needs a name').max(120),
    timeZone,
    exercise: z.boolean(),
    clock: newClockSchema.optional(),
  })
  .refine((event) => event.exercise || !event.clock, { path: ['clock'], message: 'only an exercise has a clock of its own' });
export type NewEvent = z.infer<typeof newEventSchema>;

export const eventSchema = z.object({
  id: z.string(),
  name: z.string(),
  timeZone: z.string(),
  exercise: z.boolean(),
  /** True for the exercise that ships with the program: it has a coast of its own and advisories still to issue. */
  demo: z.boolean(),
  /** Demo only: advisories not issued yet. */
  advisoriesLeft: z.number().int().nullable(),
  /** 0 before the first impact. */
  revision: z.number().int().nonnegative(),
  advisoryId: z.string().nullable(),
  now: instant,
  clock: z.object({ startsAt: instant, anchoredAt: instant, rate: z.number() }).nullable(),
  createdAt: instant,
});
export type Event = z.infer<typeof eventSchema>;

/** The event's clock at a wall-clock instant (both milliseconds since 1970). Real events run on the wall clock. */
export function eventNowMs(clock: Event['clock'], wallMs: number): number {
  return clock ? Date.parse(clock.startsAt) + (wallMs - Date.parse(clock.anchoredAt)) * clock.rate : wallMs;
}

export const listOf = <T extends z.ZodType>(item: T) => z.object({ items: z.array(item), total: z.number().int(), offset: z.number().int() });
