import type { Server as HttpServer } from 'node:http';
import { Server } from 'socket.io';
import type { Socket } from 'socket.io';
import { LIVE_NAMESPACE } from '../../lib/wire';
import type { ClientToServer, Identity, ServerToClient } from '../../lib/wire';
import { answersTo, comesFromHere } from '../http';
import type { Services } from '../services';
import { machineTimers } from '../timers';
import type { Timers } from '../timers';
import { credentialsOf, identifyBy, refusal } from './handshake';
import { CLIENT_MESSAGE_BYTES, CLOCK_EVERY_MS, IDENTIFY_EVERY_MS } from './limits';
import { receiver } from './receiver';
import { openRooms } from './rooms';
import type { Screen } from './screen';

interface SocketData {
  identity: Identity;
}
type NoEvents = Record<string, never>;
type LiveServer = Server<ClientToServer, ServerToClient, NoEvents, SocketData>;
type LiveSocket = Socket<ClientToServer, ServerToClient, NoEvents, SocketData>;

export interface Live {
  /** Identifies everyone again now (rule 8). */
  identifyAll(): Promise<void>;
  /** Cuts every connection, so that screens try to come back, and takes no more. */
  close(): Promise<void>;
}

/** Serves the namespace `/live` on an HTTP server. Upgrades of other paths are left alone. */
export function openLive(httpServer: HttpServer, services: Services, timers: Timers = machineTimers): Live {
  const { auth, bus, logger, settings } = services;
  let closing = false;
  const io: LiveServer = new Server({
    serveClient: false,
    perMessageDeflate: false,
    maxHttpBufferSize: CLIENT_MESSAGE_BYTES,
    allowRequest: ({ method = 'GET', headers }, decide) => {
      if (closing) decide('the server is closing', false);
      else if (!answersTo(settings, headers.host)) decide('this server does not go by that name', false);
      else if (!comesFromHere(method, headers)) decide('foreign origin', false);
      else decide(null, true);
    },
  });
  io.attach(httpServer, { destroyUpgrade: false });
  io.use((_socket, next) => next(refusal('not-found', `Nothing lives here; connect to the namespace ${LIVE_NAMESPACE}.`)));

  const live = io.of(LIVE_NAMESPACE);
  const rooms = openRooms({
    services,
    timers,
    broadcast: (eventId, message, exceptIds) => void live.to(eventId).except(exceptIds).emit(message.name, message.payload as never),
  });

  live.use((socket, next) => {
    identifyBy(auth, credentialsOf(socket.handshake)).then(
      (identity) => {
        if (!identity) return next(refusal('unauthorized', 'This key or session is not known here, or no longer.'));
        socket.data.identity = identity;
        next();
      },
      (err: unknown) => {
        logger.error({ err }, 'identification failed');
        next(refusal('failed', 'The server could not check who you are; the reason is in its log. Try again.'));
      },
    );
  });

  live.on('connection', (socket: LiveSocket) => {
    const screen = screenOf(socket);
    const read = receiver(() => socket.data.identity, rooms.handlers(screen), logger.child({ screen: socket.id }));
    socket.onAny(read);
    socket.on('disconnect', () => rooms.gone(screen));
  });

  async function identifyAll(): Promise<void> {
    await Promise.all(
      [...live.sockets.values()].map(async (socket) => {
        const identity = await identifyBy(auth, credentialsOf(socket.handshake));
        if (identity) socket.data.identity = identity;
        // Cutting the connection, rather than taking leave, makes the client try again and hear why it may not.
        else socket.conn.close();
      }),
    ).catch((err: unknown) => logger.error({ err }, 'identification failed; everyone stays until the next check'));
  }

  const stops = [
    bus.on('advisory', (payload) => rooms.tell({ name: 'advisory', payload })),
    bus.on('progress', (payload) => rooms.tell({ name: 'progress', payload })),
    bus.on('impact', (payload) => rooms.tell({ name: 'impact', payload })),
    bus.on('failed', (payload) => rooms.tell({ name: 'failed', payload })),
    bus.on('log', (payload) => rooms.tell({ name: 'log', payload })),
    bus.on('event', ({ eventId }) => rooms.tellClock(eventId)),
    timers.every(CLOCK_EVERY_MS, () => rooms.tellClocks()),
    timers.every(IDENTIFY_EVERY_MS, () => void identifyAll()),
  ];

  return {
    identifyAll,
    async close() {
      closing = true;
      stops.forEach((stop) => stop());
      io.engine.close();
      await Promise.all([io.sockets.adapter.close(), live.adapter.close()]);
    },
  };
}

function screenOf(socket: LiveSocket): Screen {
  return {
    id: socket.id,
    get connected() {
      return socket.connected;
    },
    get identity() {
      return socket.data.identity;
    },
    send: (message) => void socket.emit(message.name, message.payload as never),
    enter: (eventId) => void socket.join(eventId),
    exit: (eventId) => void socket.leave(eventId),
  };
}
