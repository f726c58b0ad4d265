import type { StoreApi } from 'zustand/vanilla';
import type { ClientToServer, ServerToClient } from '../../lib/wire';
import { heldRevision, reduce } from './reduce';
import type { EventState, Happening } from './state';

/** The part of a socket.io client this needs; tests give one they flush by hand. */
export interface LiveSocket {
  connected: boolean;
  on<K extends keyof ServerToClient>(name: K, listener: ServerToClient[K]): unknown;
  on(name: 'connect', listener: () => void): unknown;
  on(name: 'disconnect', listener: (reason: string) => void): unknown;
  on(name: 'connect_error', listener: (error: Error & { data?: { code?: string } }) => void): unknown;
  emit<K extends keyof ClientToServer>(name: K, ...args: Parameters<ClientToServer[K]>): unknown;
  connect(): unknown;
  disconnect(): unknown;
}

export interface Session {
  /** Tell the server which revision this screen shows. */
  seen(revision: number): void;
  /** The network went away or came back, as the browser says. */
  network(online: boolean): void;
  /** Hand in news that came over HTTP. */
  tell(happening: Happening): void;
  close(): void;
}

const JOIN_ANSWER_MS = 10_000;
const RETURN_MS = 1000;

/**
 * Keeps one event's store in step with the server: joins with the revision held, joins again when one was missed, and carries on
 * by itself after a break. Nothing here knows React. `nowMs` and `later` are the machine's clock and timer.
 */
export function openSession(
  store: StoreApi<EventState>,
  socket: LiveSocket,
  { nowMs, later }: { nowMs: () => number; later: (ms: number, run: () => void) => () => void },
): Session {
  const { eventId } = store.getState();
  let stopWaiting: (() => void) | null = null;
  let stopReturning: (() => void) | null = null;
  let reported = 0;

  const tell = (happening: Happening): void => {
    store.setState(reduce(store.getState(), happening), true);
    if (store.getState().mustJoin) join();
  };

  const forget = (): void => {
    stopWaiting?.();
    stopWaiting = null;
  };

  function join(): void {
    if (stopWaiting || !socket.connected) return;
    let open = true;
    stopWaiting = later(JOIN_ANSWER_MS, () => {
      open = false;
      stopWaiting = null;
      join();
    });
    socket.emit('join', { eventId, revision: heldRevision(store.getState()) }, (ack) => {
      if (!open) return;
      open = false;
      forget();
      if (ack.ok) tell({ kind: 'joined', atMs: nowMs(), ack });
      else tell({ kind: 'refused', atMs: nowMs(), code: ack.code, message: ack.message });
    });
  }

  const ours = <T extends { eventId: string }>(use: (notice: T) => void) => (notice: T): void => {
    if (notice.eventId === eventId) use(notice);
  };

  socket.on('connect', () => {
    reported = 0;
    tell({ kind: 'connected', atMs: nowMs() });
  });
  socket.on('disconnect', (reason) => {
    forget();
    tell({ kind: 'disconnected', atMs: nowMs() });
    // socket.io does not come back by itself when the server ended the connection.
    if (reason === 'io server disconnect') stopReturning = later(RETURN_MS, () => socket.connect());
  });
  socket.on('connect_error', (error) => {
    if (error.data?.code === 'unauthorized') tell({ kind: 'refused', atMs: nowMs(), code: 'unauthorized', message: error.message });
    else if (store.getState().link.state === 'live') tell({ kind: 'disconnected', atMs: nowMs() });
  });
  socket.on('advisory', ours((notice) => tell({ kind: 'advisory', notice })));
  socket.on('impact', ours((impact) => tell({ kind: 'impact', impact })));
  socket.on('progress', ours((notice) => tell({ kind: 'progress', notice })));
  socket.on('failed', ours((notice) => tell({ kind: 'failed', notice })));
  socket.on('presence', ours((notice) => tell({ kind: 'presence', notice })));
  socket.on('log', ours((entry) => tell({ kind: 'log', entry })));
  socket.on('clock', ours((notice) => tell({ kind: 'clock', atMs: nowMs(), notice })));
  socket.connect();

  return {
    seen(revision) {
      if (revision <= reported || !socket.connected) return;
      reported = revision;
      socket.emit('seen', { eventId, revision });
    },
    network(online) {
      if (online) socket.connect();
      else socket.disconnect();
    },
    tell,
    close() {
      forget();
      stopReturning?.();
      socket.disconnect();
    },
  };
}
