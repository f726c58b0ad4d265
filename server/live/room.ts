import type { Impact } from '../../lib/impact';
import type { JoinAck } from '../../lib/wire';
import type { Services } from '../services';
import { answerJoin } from './answerJoin';
import { inOrder } from './inOrder';
import { LARGE_IMPACT_BYTES, PROGRESS_APART_MS, presenceApartMs } from './limits';
import { bytesOf } from './bytesOf';
import type { Message, Screen } from './screen';
import { throttle } from './throttle';
import type { Timers } from '../timers';

/** A screen in the room. */
interface Place {
  screen: Screen;
  /** The highest revision it was given. */
  revision: number;
  /** The revision it says it shows. */
  seen: number | null;
  /** What the room was told while its join is being answered; null once it has entered. */
  held: Message[] | null;
}

export interface RoomOptions {
  eventId: string;
  services: Pick<Services, 'store' | 'runs' | 'describeEvent' | 'logger'>;
  timers: Timers;
  /** Sends to every screen that entered, less some. */
  broadcast: (message: Message, exceptIds: string[]) => void;
}

export interface Room {
  /** Answers a join through `reply`, then lets the screen in. Throws when the store cannot be read: the screen is then outside. */
  join(screen: Screen, held: number | null, reply: (ack: JoinAck) => void): Promise<void>;
  leave(screenId: string): void;
  /** False: that screen is not in the room. */
  seen(screenId: string, revision: number): boolean;
  tell(message: Message): void;
  /** Sends the event's clock to everyone. */
  tellClock(): Promise<void>;
  readonly empty: boolean;
}

/** The screens of one event, and what they have been given. The rules are in RULES.md. */
export function openRoom({ eventId, services, timers, broadcast }: RoomOptions): Room {
  const { store, logger } = services;
  const places = new Map<string, Place>();
  const order = inOrder({
    revision: async () => (await store.events.get(eventId))?.revision ?? 0,
    since: (revision) => store.impacts.since(eventId, revision, 1000),
    deliver: (payload) => give({ name: 'impact', payload }),
    failed: (err) => logger.error({ eventId, err }, 'missed revisions could not be read'),
  });
  const presence = throttle<void>(timers, () => presenceApartMs(places.size), tellPresence);
  const progress = throttle<Message>(timers, () => PROGRESS_APART_MS, give);

  /** To everyone inside, and on the list of everyone at the door. */
  function give(message: Message): void {
    const except: string[] = [];
    for (const place of places.values()) {
      if (place.held) place.held.push(message);
      else if (message.name === 'impact') {
        if (place.revision >= message.payload.revision) except.push(place.screen.id);
        else place.revision = message.payload.revision;
      }
    }
    broadcast(message, except);
  }

  function tellPresence(): void {
    const screens = [...places.values()].map(({ screen, seen }) => ({ id: screen.id, name: screen.identity.name, role: screen.identity.role, revision: seen }));
    give({ name: 'presence', payload: { eventId, screens } });
  }

  async function readClock(): Promise<Message | null> {
    const record = await store.events.get(eventId);
    if (!record) return null;
    const { now, clock } = await services.describeEvent(record);
    return { name: 'clock', payload: { eventId, now, rate: clock?.rate ?? 1 } };
  }

  function remove(screenId: string): void {
    const place = places.get(screenId);
    if (!place) return;
    places.delete(screenId);
    place.screen.exit(eventId);
    if (places.size > 0) presence.put();
  }

  function enter(place: Place, revision: number, advisorySequence: number): void {
    const held = place.held!;
    place.held = null;
    place.revision = revision;
    for (const message of held) {
      if (message.name === 'advisory' && message.payload.advisory.sequence <= advisorySequence) continue;
      if (message.name === 'impact') {
        if (message.payload.revision <= place.revision) continue;
        place.revision = message.payload.revision;
      }
      place.screen.send(message);
    }
    place.screen.enter(eventId);
  }

  return {
    async join(screen, held, reply) {
      if (!screen.connected) return;
      places.get(screen.id)?.screen.exit(eventId);
      const place: Place = { screen, revision: 0, seen: held, held: [] };
      places.set(screen.id, place);
      const inside = (): boolean => places.get(screen.id) === place;
      try {
        await order.open();
        const answer = await answerJoin(services, eventId, held);
        if (!inside()) return;
        if (!answer) {
          remove(screen.id);
          reply({ ok: false, code: 'not-found', message: `There is no event ${eventId}.` });
          return;
        }
        reply(answer.ack);
        if (answer.advisory) screen.send({ name: 'advisory', payload: answer.advisory });
        enter(place, answer.revision, answer.advisorySequence);
        presence.put();
      } catch (error) {
        if (inside()) remove(screen.id);
        throw error;
      }
      const clock = await readClock();
      if (clock && inside()) screen.send(clock);
    },
    leave: remove,
    seen(screenId, revision) {
      const place = places.get(screenId);
      if (!place) return false;
      place.seen = revision;
      presence.put();
      return true;
    },
    tell(message) {
      if (message.name === 'progress') return progress.put(message);
      // Rule 9: nothing about a run follows its end.
      if (message.name === 'failed' || (message.name === 'impact' && message.payload.stage === 'members')) progress.drop();
      if (message.name !== 'impact') return give(message);
      measure(message.payload);
      order.put(message.payload);
    },
    async tellClock() {
      const clock = await readClock();
      if (clock) give(clock);
    },
    get empty() {
      return places.size === 0;
    },
  };

  function measure(impact: Impact): void {
    const bytes = bytesOf(impact);
    if (bytes > LARGE_IMPACT_BYTES) logger.warn({ eventId, revision: impact.revision, bytes }, 'large impact message');
  }
}
