import { io } from 'socket.io-client';
import type { Advisory } from '../../lib/advisory';
import type { ImpactNotice } from '../../lib/wire';
import { newDataDir, removeDataDir, startServerProcess } from '../server/serverProcess';
import { median, row } from './report';
import type { Row } from './report';

const ROUNDS = 10;

interface Screen {
  /** The next impact of an advisory at a stage, and when it came. */
  impact(advisoryId: string, stage: 'track' | 'members'): Promise<{ notice: ImpactNotice; atMs: number }>;
  close(): void;
}

async function openScreen(url: string, key: string, eventId: string): Promise<Screen> {
  const socket = io(`${url}/live`, { auth: { key }, transports: ['websocket'] });
  const came = new Map<string, { notice: ImpactNotice; atMs: number }>();
  const waiting = new Map<string, (value: { notice: ImpactNotice; atMs: number }) => void>();
  socket.on('impact', (notice: ImpactNotice) => {
    const name = `${notice.advisoryId} ${notice.stage}`;
    const value = { notice, atMs: performance.now() };
    came.set(name, value);
    waiting.get(name)?.(value);
  });
  await new Promise<void>((resolve, reject) => {
    socket.once('connect_error', reject);
    socket.emit('join', { eventId, revision: null }, () => resolve());
  });
  return {
    impact: (advisoryId, stage) => {
      const name = `${advisoryId} ${stage}`;
      const held = came.get(name);
      return held ? Promise.resolve(held) : new Promise((resolve) => waiting.set(name, resolve));
    },
    close: () => socket.close(),
  };
}

/** The demo's newest forecast, corrected: a little further along each time, so that every round computes something new. */
const shifted = (advisory: Advisory, round: number): Advisory => ({
  storm: advisory.storm,
  number: `${advisory.number}${String.fromCharCode(65 + round)}`,
  centre: advisory.centre,
  issuedAt: advisory.issuedAt,
  averaging: advisory.averaging,
  points: advisory.points.map((point) => ({ ...point, lon: Math.round((point.lon + 0.02 * (round + 1)) * 100) / 100 })),
});

function metric(text: string, name: string): number {
  const line = text.split('\n').find((entry) => entry.startsWith(`${name} `) || entry.startsWith(`${name}{`));
  return line ? Number(line.slice(line.lastIndexOf(' ') + 1)) : NaN;
}

/** From POST to the second screen, on the demo, with the server in a process of its own. */
export async function benchLive(): Promise<Row[]> {
  const server = await startServerProcess(newDataDir());
  try {
    const events = (await (await server.get('/api/v1/events')).json()) as { items: { id: string }[] };
    const [event] = events.items;
    // The newest that is in, computed or not: an older one posted again would not become the forecast in force.
    const advisories = (await (await server.get(`/api/v1/events/${event.id}/advisories?limit=1`)).json()) as { items: Advisory[] };
    const [advisory] = advisories.items;
    const [first, second] = await Promise.all([openScreen(server.url, server.key, event.id), openScreen(server.url, server.key, event.id)]);
    // Reading the figures starts their delays anew: what the start cost is left out.
    await server.get('/metrics');
    const trackMs: number[] = [];
    const membersMs: number[] = [];
    const apartMs: number[] = [];
    let bytes = 0;
    for (let round = 0; round < ROUNDS; round++) {
      const started = performance.now();
      const answer = await server.post(`/api/v1/events/${event.id}/advisories`, JSON.stringify(shifted(advisory, round)), 'application/json');
      const body = (await answer.json()) as { advisory?: { id: string } };
      if (answer.status !== 201 || !body.advisory) throw new Error(`POST answered ${answer.status}: ${JSON.stringify(body)}`);
      const track = await second.impact(body.advisory.id, 'track');
      const members = await second.impact(body.advisory.id, 'members');
      const elsewhere = await first.impact(body.advisory.id, 'members');
      trackMs.push(track.atMs - started);
      membersMs.push(members.atMs - started);
      apartMs.push(Math.abs(elsewhere.atMs - members.atMs));
      bytes = JSON.stringify(members.notice).length;
    }
    const metrics = await (await server.get('/metrics')).text();
    first.close();
    second.close();
    return [
      row('POST to track impact at the second screen, median of 10', median(trackMs), 'ms'),
      row('POST to members impact at the second screen, median of 10', median(membersMs), 'ms'),
      row('two screens apart, worst of 10', Math.max(...apartMs), 'ms'),
      row('server event-loop delay, p99', metric(metrics, 'leeboard_nodejs_eventloop_lag_p99_seconds') * 1000, 'ms'),
      row('server event-loop delay, greatest', metric(metrics, 'leeboard_nodejs_eventloop_lag_max_seconds') * 1000, 'ms'),
      row('server memory (resident)', metric(metrics, 'leeboard_process_resident_memory_bytes') / 1e6, 'MB'),
      row('impact message', bytes / 1000, 'kB'),
    ];
  } finally {
    await server.end('SIGINT');
    removeDataDir(server.dataDir);
  }
}
