import { createServer } from 'node:http';
import type { AddressInfo } from 'node:net';
import { pino } from 'pino';
import { io } from 'socket.io-client';
import type { Socket } from 'socket.io-client';
import type { Impact } from '../../../lib/impact';
import { eventNowMs } from '../../../lib/wire';
import type { ClientToServer, Event, Identity, JoinAck, PlainAck, ServerToClient, StoredAdvisory } from '../../../lib/wire';
import { openLive } from '../../../server/live';
import { makeBus } from '../../../server/bus';
import type { Services } from '../../../server/services';
import { readSettings } from '../../../server/settings';
import type { EventRecord } from '../../../server/store/model';
import { handTimers } from '../handTimers';
import { advisory as sampleAdvisory, impact as sampleImpact } from '../../app/sample';

export type Client = Socket<ServerToClient, ClientToServer>;

export const KEYS: Record<string, Identity> = {
  'viewer-key': { id: 'k1', name: 'Wall', role: 'viewer' },
  'operator-key': { id: 'k2', name: 'Duty desk', role: 'operator' },
};

/** What a door lets through when it is opened; open until it is shut. */
export function gate(): { shut(): void; open(): void; pass(): Promise<void> } {
  let waiting: (() => void)[] = [];
  let isShut = false;
  return {
    shut: () => void (isShut = true),
    open() {
      isShut = false;
      waiting.forEach((go) => go());
      waiting = [];
    },
    pass: () => (isShut ? new Promise((go) => waiting.push(go)) : Promise.resolve()),
  };
}

/** One event, kept in memory, whose reads pass one gate before they look and one before they answer. */
export function memoryStore(eventId = 'e1') {
  const record: EventRecord = {
    id: eventId,
    name: 'Quillon',
    timeZone: 'Etc/GMT+3',
    exercise: true,
    demo: false,
    clock: { startsAt: '2031-09-19T11:00:00Z', anchoredAt: '2026-12-01T00:00:00Z', rate: 1 },
    createdAt: '2026-12-01T00:00:00Z',
    revision: 0,
    advisoryId: null,
  };
  const impacts: Impact[] = [];
  const advisories: StoredAdvisory[] = [];
  const reads = gate();
  const answers = gate();
  const behind = async <T>(look: () => T): Promise<T> => {
    await reads.pass();
    const seen = look();
    await answers.pass();
    return seen;
  };
  const store = {
    events: { get: (id: string) => behind(() => (id === eventId ? { ...record } : null)) },
    advisories: { latest: () => behind(() => advisories.at(-1) ?? null) },
    impacts: {
      get: (_id: string, revision: number) => behind(() => impacts[revision - 1] ?? null),
      since: (_id: string, revision: number, limit: number) => behind(() => impacts.slice(revision).slice(-limit)),
      ofAdvisory: (id: string, stage: Impact['stage']) => behind(() => impacts.findLast((one) => one.advisoryId === id && one.stage === stage) ?? null),
    },
  } as unknown as Services['store'];
  return {
    store,
    record,
    reads,
    answers,
    /** Puts the next impact into the store, as `publish` does, without telling anyone. */
    commit(over: Partial<Impact> = {}): Impact {
      const impact = sampleImpact(record.revision + 1, { eventId, ...over });
      impacts.push(impact);
      record.revision = impact.revision;
      return impact;
    },
    accept(): StoredAdvisory {
      const advisory = sampleAdvisory(advisories.length + 1, { eventId });
      advisories.push(advisory);
      return advisory;
    },
  };
}

/** The live server on a loopback port, over a memory store, with time turned by hand. */
export async function liveWorld() {
  const kept = memoryStore();
  const bus = makeBus();
  const timers = handTimers();
  const keys = new Map(Object.entries(KEYS));
  const wall = { ms: Date.parse('2026-12-01T00:00:00Z') };
  const services: Services = {
    settings: readSettings({}),
    logger: pino({ level: 'silent' }),
    store: kept.store,
    auth: {
      identifyKey: async (key) => keys.get(key) ?? null,
      identify: async ({ cookie }) => (cookie === 'session=duty' ? KEYS['operator-key'] : null),
    },
    bus,
    runs: { underWay: () => null } as unknown as Services['runs'],
    clock: { nowMs: () => wall.ms },
    inspectLayer: () => Promise.reject(new Error('no layers here')),
    describeEvent: async (record) => ({ ...record, advisoriesLeft: null, now: new Date(eventNowMs(record.clock, wall.ms)).toISOString() }) satisfies Event,
  };
  const http = createServer();
  const live = openLive(http, services, timers);
  await new Promise<void>((resolve) => http.listen(0, '127.0.0.1', resolve));
  const url = `http://127.0.0.1:${(http.address() as AddressInfo).port}`;
  const clients: Client[] = [];
  return {
    ...kept,
    bus,
    timers,
    keys,
    wall,
    live,
    http,
    url,
    publish(over: Partial<Impact> = {}): Impact {
      const impact = kept.commit(over);
      bus.emit('impact', impact);
      return impact;
    },
    /** A client that has not connected yet. */
    client(options: Parameters<typeof io>[1] = {}): Client {
      const client: Client = io(`${url}/live`, {
        auth: { key: 'viewer-key' },
        transports: ['websocket'],
        forceNew: true,
        autoConnect: false,
        reconnectionDelay: 1,
        reconnectionDelayMax: 5,
        ...options,
      });
      clients.push(client);
      return client;
    },
    async close() {
      clients.forEach((client) => client.close());
      await live.close();
      await new Promise<void>((resolve) => http.close(() => resolve()));
    },
  };
}

export type LiveWorld = Awaited<ReturnType<typeof liveWorld>>;

export const connected = (client: Client): Promise<Client> =>
  new Promise((resolve, reject) => {
    client.once('connect', () => resolve(client));
    client.once('connect_error', reject);
    client.connect();
  });

export const refused = (client: Client): Promise<Error & { data?: { code?: string } }> =>
  new Promise((resolve, reject) => {
    client.once('connect', () => reject(new Error('connected')));
    client.once('connect_error', resolve);
    client.connect();
  });

export const joined = (client: Client, revision: number | null, eventId = 'e1'): Promise<JoinAck> =>
  new Promise((resolve) => client.emit('join', { eventId, revision }, resolve));

/** A message and its answer. Connections keep order, so whatever was sent before the answer has come too. */
export const ask = (client: Client, name: string, ...args: unknown[]): Promise<PlainAck | JoinAck> =>
  new Promise((resolve) => (client as unknown as Socket).emit(name, ...args, resolve));

export const settled = (client: Client): Promise<unknown> => ask(client, 'leave', { eventId: 'nowhere' });

/** Everything a client hears of one name, from now on. */
export function hearing<K extends keyof ServerToClient>(client: Client, name: K): Parameters<ServerToClient[K]>[0][] {
  const heard: Parameters<ServerToClient[K]>[0][] = [];
  (client as unknown as { on(name: string, listener: (payload: Parameters<ServerToClient[K]>[0]) => void): void }).on(name, (payload) => void heard.push(payload));
  return heard;
}
