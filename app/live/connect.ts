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
  session: Session;
  close(): void;
}

/** Opens the socket of an event in this browser. The owner calls `close()`. */
export function connectEvent(eventId: string): LiveEvent {
  const store = createStore<EventState>(() => startState(eventId, Date.now()));
  const socket = io(NAMESPACE, {
    autoConnect: false,
    forceNew: true,
    withCredentials: true,
    transports: ['websocket', 'polling'],
    tryAllTransports: true,
    reconnectionDelay: 400,
    reconnectionDelayMax: 4000,
  });
  const session = openSession(store, socket as unknown as LiveSocket, {
    nowMs: () => Date.now(),
    later: (ms, run) => {
      const timer = setTimeout(run, ms);
      return () => clearTimeout(timer);
    },
  });
  const online = (): void => session.network(true);
  const offline = (): void => session.network(false);
  window.addEventListener('online', online);
  window.addEventListener('offline', offline);
  return {
    store,
    session,
    close() {
      window.removeEventListener('online', online);
      window.removeEventListener('offline', offline);
      session.close();
    },
  };
}
