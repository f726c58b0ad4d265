import { mkdtempSync, readFileSync, rmSync } from 'node:fs';
import { tmpdir } from 'node:os';
import { join } from 'node:path';
import { gzipSync } from 'node:zlib';
import type { FastifyInstance, InjectOptions, LightMyRequestResponse } from 'fastify';
import { pino } from 'pino';
import { assetTableOf, tabulated } from './impact';
import type { Impact } from '../../../lib/impact';
import { eventNowMs } from '../../../lib/wire';
import type { Event, Problem, Role, StoredAdvisory } from '../../../lib/wire';
import { openAuth } from '../../../server/auth';
import type { LeeboardAuth } from '../../../server/auth';
import { makeBus } from '../../../server/bus';
import { inspectLayer } from '../../../server/compute/worker';
import { buildHttp } from '../../../server/http';
import type { HttpServices } from '../../../server/http';
import type { BusEvents } from '../../../server/services';
import { readSettings } from '../../../server/settings';
import { openStore } from '../../../server/store';
import type { OpenedStore } from '../../../server/store';

export const BOOTSTRAP = 'a-bootstrap-key-of-some-length';
export const HOST = '127.0.0.1:4600';
export const ORIGIN = `http://${HOST}`;

export const bulletin = (name: string): Buffer => readFileSync(new URL(`../../fixtures/bulletins/${name}.txt`, import.meta.url));

/** An advisory as a program sends it. */
export const plain = {
  storm: { id: 'XX012031', name: 'Quillon' },
  number: '5',
  centre: 'Test centre',
  issuedAt: '2031-09-19T09:00:00Z',
  averaging: '1-min',
  points: [
    { validAt: '2031-09-19T09:00:00Z', lat: 22.4, lon: -45.2, maxWindKt: 85, radiiNm: { '34': { ne: 140, se: 120, sw: 80, nw: 110 } } },
    { validAt: '2031-09-19T21:00:00Z', lat: 24.0, lon: -46.9, maxWindKt: 95, radiiNm: { '34': { ne: 150, se: 130, sw: 80, nw: 120 } } },
  ],
};

export interface World {
  app: FastifyInstance;
  services: HttpServices & { store: OpenedStore; auth: LeeboardAuth };
  /** Events whose impact was asked for, in order. */
  requested: string[];
  heard: { name: keyof BusEvents; payload: unknown }[];
  logged: string[];
  keys: Record<Role, string>;
  call(options: InjectOptions & { as?: Role | null }): Promise<LightMyRequestResponse>;
  newEvent(over?: Record<string, unknown>): Promise<Event>;
  issue(eventId: string, over?: Record<string, unknown>): Promise<StoredAdvisory>;
  /** Publishes an impact of an advisory, as a run does. */
  publish(advisory: StoredAdvisory, stage?: Impact['stage']): Promise<Impact>;
  close(): Promise<void>;
}

/** The API over a store and people of its own, with a clock that stands and runs that only count. */
export async function httpWorld(over: Partial<HttpServices> = {}): Promise<World> {
  const folder = mkdtempSync(join(tmpdir(), 'leeboard-http-'));
  const settings = readSettings({ LEEBOARD_DATA_DIR: folder, LEEBOARD_BOOTSTRAP_KEY: BOOTSTRAP });
  const store = await openStore(settings);
  const auth = await openAuth(store, settings, ORIGIN);
  const bus = makeBus();
  const requested: string[] = [];
  const heard: World['heard'] = [];
  const logged: string[] = [];
  for (const name of ['advisory', 'progress', 'impact', 'failed', 'log', 'event'] as const) bus.on(name, (payload) => heard.push({ name, payload }));
  const clock = { nowMs: () => Date.parse('2031-09-19T09:30:00Z') };
  const services: World['services'] = {
    settings,
    logger: pino({ level: 'info' }, { write: (line: string) => void logged.push(line) }),
    bus,
    runs: { request: (eventId) => void requested.push(eventId), underWay: () => null, waiting: 0, resume: async () => {}, close: async () => {} },
    clock,
    describeEvent: async (record) => ({ ...record, advisoriesLeft: null, now: new Date(eventNowMs(record.clock, clock.nowMs())).toISOString() }),
    inspectLayer: async (task) => inspectLayer(task),
    version: '0.0.0-test',
    ...over,
    store: (over.store as OpenedStore | undefined) ?? store,
    auth,
  };
  const app = await buildHttp(services);
  const keys = { viewer: '', operator: '', admin: '' };
  for (const role of ['viewer', 'operator', 'admin'] as const) keys[role] = (await auth.keys.create({ name: `the ${role}`, role })).key;

  const call: World['call'] = ({ as = 'admin', headers, ...options }) => app.inject({ ...options, headers: { host: HOST, ...(as ? { authorization: `Bearer ${keys[as]}` } : {}), ...headers } });
  return {
    app,
    services,
    requested,
    heard,
    logged,
    keys,
    call,
    async newEvent(given = {}) {
      const answer = await call({ method: 'POST', url: '/api/v1/events', payload: { name: 'Quillon', timeZone: 'Etc/GMT+3', exercise: false, ...given } });
      return answer.json<Event>();
    },
    async issue(eventId, given = {}) {
      const answer = await call({ method: 'POST', url: `/api/v1/events/${eventId}/advisories`, payload: { ...plain, ...given } });
      return answer.json<{ advisory: StoredAdvisory }>().advisory;
    },
    async publish(advisory, stage = 'members') {
      const impact = { ...tabulated(advisory), stage, members: stage === 'members' ? 10 : 0 };
      const { assets, marks } = assetTableOf(advisory);
      const peak = gzipSync(JSON.stringify({ type: 'FeatureCollection', features: [{ type: 'Feature', properties: { product: 'peak', thresholdKt: 34 }, geometry: { type: 'MultiPolygon', coordinates: [[[[-46, 22], [-45, 22], [-45, 23], [-46, 22]]]] } }] }));
      return store.impacts.publish({ impact, bulk: { assets, marks, peak, arrival: peak, ...(stage === 'members' ? { chance34: peak } : {}) } });
    },
    async close() {
      await app.close();
      await store.close();
      rmSync(folder, { recursive: true, force: true });
    },
  };
}

export const problemOf = (answer: LightMyRequestResponse): Problem => {
  if (!String(answer.headers['content-type']).startsWith('application/problem+json')) throw new Error(`expected a problem document, got ${answer.statusCode} ${String(answer.headers['content-type'])}: ${answer.body.slice(0, 200)}`);
  return answer.json<Problem>();
};
