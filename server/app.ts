import { readFileSync } from 'node:fs';
import { join } from 'node:path';
import { pino } from 'pino';
import { openAuth } from './auth';
import { makeBus } from './bus';
import { openPool } from './compute/pool';
import { openRuns } from './compute/runs';
import { demoExercise, readScenario } from './demo';
import { eventDescriber } from './describeEvent';
import { openInbox } from './feeds';
import { buildHttp } from './http';
import type { HttpServices } from './http';
import { cannotListen, freePort } from './listening';
import { openLive } from './live';
import { openPages } from './openPages';
import { readSettings } from './settings';
import { stopsInReverse } from './stops';
import { openStore } from './store';
import { machineTimers } from './timers';

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
  const asked = readSettings(env);
  const settings = { ...asked, PORT: await freePort(asked) };
  const origin = `http://${settings.HOST.includes(':') ? `[${settings.HOST}]` : settings.HOST}:${settings.PORT}`;
  const logger = pino({ level: settings.LOG_LEVEL });
  const { version } = JSON.parse(readFileSync(join(dir, 'package.json'), 'utf8')) as { version: string };
  const stops = stopsInReverse();
  try {
    const store = await openStore(settings);
    stops.add(() => store.close());
    const auth = await openAuth(store, settings, origin);
    const bus = makeBus((err) => logger.error({ err }, 'a listener failed'));
    const clock = { nowMs: () => Date.now() };
    const scenario = readScenario(join(dir, 'public', 'demo'));
    const pool = openPool();
    const runs = openRuns({ settings, store, bus, logger, clock, demoCoastFile: scenario.coastFile, pool });
    stops.add(() => runs.close());
    const demo = demoExercise({ store, bus, runs, clock, inspectLayer: pool.inspectLayer }, scenario);
    const services: HttpServices = {
      settings, logger, store, auth, bus, runs, clock, version, demo,
      inspectLayer: pool.inspectLayer,
      describeEvent: eventDescriber({ clock }, demo.left),
    };
    const http = await buildHttp(services, { development });
    stops.add(() => http.close());
    const pages = await openPages({ dir, development });
    stops.add(() => pages.close());
    http.setNotFoundHandler({}, (request, reply) => {
      for (const [name, value] of Object.entries(reply.getHeaders())) if (value !== undefined) reply.raw.setHeader(name, value);
      reply.hijack();
      pages.show(request.raw, reply.raw).catch((err: unknown) => {
        logger.error({ err, url: request.url }, 'a page could not be shown');
        reply.raw.destroy();
      });
    });
    const live = openLive(http.server, services);
    stops.add(() => live.close());
    http.server.on('upgrade', (request, socket, head) => {
      if (!request.url?.startsWith(SOCKET_PATH)) pages.upgrade(request, socket, head);
    });
    if (settings.DEMO === 'on' && (await store.events.list({ offset: 0, limit: 1 })).total === 0) await demo.load();
    await http.listen({ host: settings.HOST, port: settings.PORT }).catch((error: NodeJS.ErrnoException) => {
      throw cannotListen(settings, error);
    });
    await runs.resume();
    const inbox = openInbox({ services, folder: join(settings.DATA_DIR, 'inbox'), timers: machineTimers });
    stops.add(() => inbox.close());
    const link = (await auth.everSignedIn()) ? null : (await auth.createSignInLink({ name: 'Admin', role: 'admin' })).url;
    return { url: origin, signInLink: link, close: stops.run };
  } catch (error) {
    await stops.run().catch((err: unknown) => logger.error({ err }, 'what was started could not all be stopped'));
    throw error;
  }
}
