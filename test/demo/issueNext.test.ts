import { createServer } from 'node:http';
import type { IncomingMessage } from 'node:http';
import type { AddressInfo } from 'node:net';
import { afterEach, describe, expect, test } from 'vitest';
import { issueNext } from '../../server/demo/issueNext';

const event = { id: 'ev 1', name: 'Quillon over Lambrey', timeZone: 'Etc/GMT+3', exercise: true, demo: true, advisoriesLeft: 5, revision: 6, advisoryId: 'adv3', now: '2031-09-18T23:00:00Z', clock: null, createdAt: '2031-09-18T23:00:00Z' };

interface Seen {
  method: string;
  url: string;
  headers: IncomingMessage['headers'];
}

let stop: (() => void) | null = null;
afterEach(() => stop?.());

/** A server that answers as the contract says, and remembers what it was asked. */
async function serve(answers: Record<string, { status: number; body: unknown }>): Promise<{ base: string; seen: Seen[] }> {
  const seen: Seen[] = [];
  const server = createServer((request, response) => {
    seen.push({ method: request.method!, url: request.url!, headers: request.headers });
    const { status, body } = answers[`${request.method} ${request.url}`] ?? { status: 404, body: { title: 'Not found' } };
    request.resume().on('end', () => response.writeHead(status, { 'content-type': 'application/json' }).end(JSON.stringify(body)));
  });
  await new Promise<void>((done) => server.listen(0, '127.0.0.1', done));
  stop = () => server.close();
  return { base: `http://127.0.0.1:${(server.address() as AddressInfo).port}`, seen };
}

const list = (items: unknown[]) => ({ status: 200, body: { items, total: items.length, offset: 0 } });
const key = 'a-key-of-an-operator-0123456789';

describe('the next advisory', () => {
  test('is issued to the demo among the events, once for each state of it', async () => {
    const { base, seen } = await serve({
      'GET /api/v1/events': list([{ ...event, id: 'other', demo: false, advisoriesLeft: null }, event]),
      'POST /api/v1/events/ev%201/demo/next': { status: 201, body: { advisory: { number: '4', storm: { name: 'Quillon' } }, revision: 7, warnings: [] } },
    });
    expect(await issueNext({ base, key })).toBe('Quillon over Lambrey: advisory 4 of Quillon is issued');
    expect(seen.map(({ headers }) => headers.authorization)).toEqual([`Bearer ${key}`, `Bearer ${key}`]);
    expect(seen[1].headers['idempotency-key']).toBe('demo-adv3');
  });

  test('is none when all are out, and nothing is posted', async () => {
    const { base, seen } = await serve({ 'GET /api/v1/events': list([{ ...event, advisoriesLeft: 0 }]) });
    expect(await issueNext({ base, key })).toBe('Quillon over Lambrey: every advisory is issued');
    expect(seen).toHaveLength(1);
  });
});

describe('what stands in the way is said', () => {
  test('no demo', async () => {
    const { base } = await serve({ 'GET /api/v1/events': list([{ ...event, demo: false }]) });
    await expect(issueNext({ base, key })).rejects.toThrow('holds no demo exercise');
  });

  test('a key that may not', async () => {
    const { base } = await serve({ 'GET /api/v1/events': list([event]), 'POST /api/v1/events/ev%201/demo/next': { status: 403, body: { title: 'Forbidden', detail: 'an operator issues advisories' } } });
    await expect(issueNext({ base, key })).rejects.toThrow('answered 403: Forbidden (an operator issues advisories)');
  });

  test('no server', async () => {
    const { base } = await serve({});
    stop!();
    await expect(issueNext({ base, key })).rejects.toThrow('start the server with npm start');
  });
});
