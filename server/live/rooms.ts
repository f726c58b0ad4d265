import type { Services } from '../services';
import type { Handlers } from './receiver';
import { openRoom } from './room';
import type { Room } from './room';
import type { Message, Screen } from './screen';
import type { Timers } from '../timers';

export interface RoomsOptions {
  services: Pick<Services, 'store' | 'runs' | 'describeEvent' | 'logger'>;
  timers: Timers;
  broadcast: (eventId: string, message: Message, exceptIds: string[]) => void;
}

export interface Rooms {
  /** What is done with the messages of one screen. */
  handlers(screen: Screen): Handlers;
  /** A screen's connection ended. */
  gone(screen: Screen): void;
  tell(message: Message): void;
  tellClock(eventId: string): void;
  tellClocks(): void;
}

/** The rooms that have screens in them, by event. An event nobody watches costs nothing. */
export function openRooms({ services, timers, broadcast }: RoomsOptions): Rooms {
  const rooms = new Map<string, Room>();

  function roomOf(eventId: string): Room {
    const room = rooms.get(eventId) ?? openRoom({ eventId, services, timers, broadcast: (message, exceptIds) => broadcast(eventId, message, exceptIds) });
    rooms.set(eventId, room);
    return room;
  }

  function tidy(eventId: string, room: Room): void {
    if (room.empty && rooms.get(eventId) === room) rooms.delete(eventId);
  }

  function tellClock(eventId: string): void {
    rooms.get(eventId)?.tellClock().catch((err: unknown) => services.logger.error({ err, eventId }, 'clock could not be read'));
  }

  return {
    handlers: (screen) => ({
      async join({ eventId, revision }, reply) {
        const room = roomOf(eventId);
        try {
          await room.join(screen, revision, reply);
        } finally {
          tidy(eventId, room);
        }
      },
      leave({ eventId }, reply) {
        const room = rooms.get(eventId);
        room?.leave(screen.id);
        if (room) tidy(eventId, room);
        reply({ ok: true });
      },
      seen({ eventId, revision }, reply) {
        const known = rooms.get(eventId)?.seen(screen.id, revision);
        reply(known ? { ok: true } : { ok: false, code: 'not-found', message: `Join event ${eventId} first.` });
      },
    }),
    gone(screen) {
      for (const [eventId, room] of rooms) {
        room.leave(screen.id);
        tidy(eventId, room);
      }
    },
    tell: (message) => rooms.get(message.payload.eventId)?.tell(message),
    tellClock,
    tellClocks: () => [...rooms.keys()].forEach(tellClock),
  };
}
