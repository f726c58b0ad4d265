import { io } from 'socket.io-client';
import { createStore } from 'zustand/vanilla';
import type { StoreApi } from 'zustand/vanilla';
import { openSession } from './session';
import type { LiveSocket, Session } from './session';
import { startState } from './state';
import type { EventState } from './state';

/** The namespace of `lib/wire/live.ts`; written out so that the schemas stay out of the first page load. */
const NAMESPACE = '/live';

export interface LiveEvent {
  store: StoreApi<EventState>;
  session: Pick<Session, 'seen' | 'tell'>;
  /** Opens the socket; returns the function that closes it. */
  open(): () => void;
}

/** One event in this browser: its store, and a socket outside React that keeps it in step while it is open. */
export function makeLiveEvent(eventId: string): LiveEvent {
  const store = createStore<EventState>(() => startState(eventId, Date.now()));
  let session: Session | null = null;
  return {
    store,
    session: {
      seen: (revision) => session?.seen(revision),
      tell: (happening) => session?.tell(happening),
    },
    open() {
      const opened = openSession(store, makeSocket(), { nowMs: () => Date.now(), later });
      session = opened;
      const online = (): void => opened.network(true);
      const offline = (): void => opened.network(false);
      window.addEventListener('online', online);
      window.addEventListener('offline', offline);
      return () => {
        window.removeEventListener('online', online);
        window.removeEventListener('offline', offline);
        opened.close();
        session = null;
      };
    },
  };
}

const makeSocket = (): LiveSocket =>
  io(NAMESPACE, {
    autoConnect: false,
    forceNew: true,
    withCredentials: true,
    transports: ['websocket', 'polling'],
    tryAllTransports: true,
    reconnectionDelay: 400,
    reconnectionDelayMax: 4000,
  }) as unknown as LiveSocket;

function later(ms: number, run: () => void): () => void {
  const timer = setTimeout(run, ms);
  return () => clearTimeout(timer);
}
