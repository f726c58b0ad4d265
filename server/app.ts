import { readFileSync } from 'node:fs';
import { join } from 'node:path';
import next from 'next';
import { pino } from 'pino';
import { openAuth } from './auth';
import { makeBus } from './bus';
import { openPool } from './compute/pool';
import { openRuns } from './compute/runs';
import { demoExercise, readScenario } from './demo';
import { eventDescriber } from './describeEvent';
import { buildHttp } from './http';
import type { HttpServices } from './http';
import { openLive } from './live';
import { readSettings } from './settings';
import { openStore } from './store';

export interface RunningServer {
  url: string;
  /** Where to sign in, once, while nobody ever has. */
  signInLink: string | null;
  close(): Promise<void>;
}

export interface StartOptions {
  env: Record<string, string | undefined>;
  /** The project's folder, where pages and public files are. */
  dir: string;
  development: boolean;
}

const SOCKET_PATH = '/socket.io/';

/** Builds the process from its parts, starts it, and hands back what stops it, parts in the reverse order. */
export async function startServer({ env, dir, development }: StartOptions): Promise<RunningServer> {
  const settings = readSettings(env);
  const logger = pino({ level: settings.LOG_LEVEL });
  const { version } = JSON.parse(readFileSync(join(dir, 'package.json'), 'utf8')) as { version: string };
  const stops: (() => Promise<unknown>)[] = [];
  const close = async (): Promise<void> => {
    for (const stop of stops.reverse().splice(0)) await stop();
  };
  try {
    const origin = `http://${settings.HOST}:${settings.PORT}`;
    const store = await openStore(settings);
    stops.push(() => store.close());
    const auth = await openAuth(store, settings, origin);
    const bus = makeBus((err) => logger.error({ err }, 'a listener failed'));
    const clock = { nowMs: () => Date.now() };
    const scenario = readScenario(join(dir, 'public', 'demo'));
    const pool = openPool();
    const runs = openRuns({ settings, store, bus, logger, clock, demoCoastFile: scenario.coastFile, pool });
    stops.push(() => runs.close());
    const demo = demoExercise({ store, bus, runs, clock, inspectLayer: pool.inspectLayer }, scenario);
    const services: HttpServices = {
      settings, logger, store, auth, bus, runs, clock, version, demo,
      inspectLayer: pool.inspectLayer,
      describeEvent: eventDescriber({ clock }, demo.left),
    };
    const http = await buildHttp(services, { development });
    stops.push(() => http.close());
    const pages = next({ dev: development, dir });
    await pages.prepare();
    stops.push(() => pages.close());
    const showPage = pages.getRequestHandler();
    http.setNotFoundHandler({}, (request, reply) => {
      for (const [name, value] of Object.entries(reply.getHeaders())) if (value !== undefined) reply.raw.setHeader(name, value);
      reply.hijack();
      void showPage(request.raw, reply.raw);
    });
    const live = openLive(http.server, services);
    stops.push(() => live.close());
    const upgradePage = pages.getUpgradeHandler();
    http.server.on('upgrade', (request, socket, head) => {
      if (!request.url?.startsWith(SOCKET_PATH)) void upgradePage(request, socket, head);
    });
    if (settings.DEMO === 'on' && (await store.events.list({ offset: 0, limit: 1 })).total === 0) await demo.load();
    await http.listen({ host: settings.HOST, port: settings.PORT });
    await runs.resume();
    const link = (await auth.everSignedIn()) ? null : (await auth.createSignInLink({ name: 'Admin', role: 'admin' })).url;
    return { url: origin, signInLink: link, close };
  } catch (error) {
    await close();
    throw error;
  }
}
