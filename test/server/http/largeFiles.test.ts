import { connect } from 'node:net';
import type { AddressInfo } from 'node:net';
import { afterAll, beforeAll, describe, expect, test } from 'vitest';
import { MOST_ADVISORY_BYTES, MOST_LAYER_BYTES } from '../../../lib/wire';
import type { Event, Problem } from '../../../lib/wire';
import { httpWorld } from './world';
import type { World } from './world';

const MB = 1024 * 1024;
const BLOCKS = 200;

let world: World;
let event: Event;
let port: number;
beforeAll(async () => {
  world = await httpWorld();
  event = await world.newEvent();
  await world.app.listen({ host: '127.0.0.1', port: 0 });
  port = (world.app.server.address() as AddressInfo).port;
});
afterAll(() => world.close());

interface Sent {
  status: number;
  problem: Problem;
  /** Megabytes taken by the network before the answer came. */
  beforeAnswerMb: number;
  /** Whether all 200 MB could be sent. */
  sentAll: boolean;
  /** How much memory buffers held at most, above what they held before. */
  heldMb: number;
}

/**
 * Sends 200 MB as fast as they are taken and reads the answer after, as browsers do. A socket rather than an HTTP client, since
 * clients differ in what they do when an answer comes early.
 */
function send(path: string, length: 'stated' | 'not stated'): Promise<Sent> {
  const block = Buffer.alloc(MB, 'x');
  const before = process.memoryUsage().arrayBuffers;
  let sent = 0;
  let heldMb = 0;
  let beforeAnswerMb = 0;
  let text = '';
  return new Promise((resolve, reject) => {
    const socket = connect(port, '127.0.0.1');
    const stated = length === 'stated' ? `Content-Length: ${BLOCKS * MB}` : 'Transfer-Encoding: chunked';
    socket.write(`POST ${path} HTTP/1.1\r\nHost: 127.0.0.1:${port}\r\nAuthorization: Bearer ${world.keys.admin}\r\nContent-Type: text/csv\r\n${stated}\r\n\r\n`);
    const finishWhenBoth = (): void => {
      const [head, body] = text.split('\r\n\r\n');
      if (sent < BLOCKS || body === undefined || !body.endsWith('}')) return;
      socket.destroy();
      resolve({ status: Number(head.split(' ')[1]), problem: JSON.parse(body) as Problem, beforeAnswerMb, sentAll: sent === BLOCKS, heldMb });
    };
    const pump = (): void => {
      while (sent < BLOCKS) {
        heldMb = Math.max(heldMb, (process.memoryUsage().arrayBuffers - before) / MB);
        sent++;
        if (length === 'not stated') socket.write(`${MB.toString(16)}\r\n`);
        const more = socket.write(block);
        if (length === 'not stated') socket.write('\r\n');
        if (!more) return void socket.once('drain', pump);
      }
      if (length === 'not stated') socket.write('0\r\n\r\n');
      finishWhenBoth();
    };
    socket.on('data', (part) => {
      if (text === '') beforeAnswerMb = sent;
      text += part.toString();
      finishWhenBoth();
    });
    socket.on('error', reject);
    pump();
  });
}

describe('a file of 200 MB is refused with the limit, without being held, and the answer reaches the sender', () => {
  const advisories = () => `/api/v1/events/${event.id}/advisories`;
  const layers = () => `/api/v1/events/${event.id}/layers?kind=assets&name=n`;

  test.each([
    ['as an advisory', 'stated', advisories, MOST_ADVISORY_BYTES, 20],
    ['as an advisory', 'not stated', advisories, MOST_ADVISORY_BYTES, 40],
    ['as a layer', 'stated', layers, MOST_LAYER_BYTES, 20],
  ] as const)('%s, its length %s', async (_, length, path, limit, answeredWithinMb) => {
    const { status, problem, beforeAnswerMb, sentAll, heldMb } = await send(path(), length);
    expect(status).toBe(413);
    expect(problem.detail).toContain(`${limit / MB} MB`);
    expect(beforeAnswerMb).toBeLessThan(answeredWithinMb);
    expect(sentAll).toBe(true);
    expect(heldMb).toBeLessThan(60);
  });

  test('and nothing of it is stored', async () => {
    expect((await world.services.store.advisories.list(event.id, { offset: 0, limit: 1 })).total).toBe(0);
    expect((await world.services.store.layers.list(event.id, { offset: 0, limit: 1 })).total).toBe(0);
    expect(world.requested).toEqual([]);
  });
});
