import { z } from 'zod';
import { eventSchema, listOf } from '../../lib/wire';

export interface IssueNextOptions {
  /** Where the server is, such as `http://127.0.0.1:4600`. */
  base: string;
  /** A key that may issue advisories. */
  key: string;
}

const TIMEOUT_MS = 30_000;

const issuedSchema = z.object({ advisory: z.object({ number: z.string(), storm: z.object({ name: z.string() }) }) });
const problemSchema = z.object({ title: z.string().optional(), detail: z.string().optional() });

/** Issues the next advisory of the demo exercise on a running server; answers with one line that says which. */
export async function issueNext({ base, key }: IssueNextOptions): Promise<string> {
  const headers = { authorization: `Bearer ${key}`, 'content-type': 'application/json' };
  const call = async (path: string, init: RequestInit = {}): Promise<unknown> => {
    let response: Response;
    try {
      response = await fetch(`${base}/api/v1${path}`, { ...init, headers: { ...headers, ...init.headers }, signal: AbortSignal.timeout(TIMEOUT_MS) });
    } catch (error) {
      throw new Error(`no answer from ${base}: start the server with npm start, or set LEEBOARD_HOST and LEEBOARD_PORT`, { cause: error });
    }
    const body: unknown = await response.json().catch(() => ({}));
    if (response.ok) return body;
    const { title, detail } = problemSchema.catch({}).parse(body);
    throw new Error(`${init.method ?? 'GET'} ${path} answered ${response.status}${title ? `: ${title}` : ''}${detail ? ` (${detail})` : ''}`);
  };

  const { items } = listOf(eventSchema).parse(await call('/events'));
  const event = items.find(({ demo }) => demo);
  if (!event) throw new Error('the server holds no demo exercise: start it once with LEEBOARD_DEMO=on and an empty data folder');
  if (event.advisoriesLeft === 0) return `${event.name}: every advisory is issued`;
  // One key for each state of the event: asked twice at once, the next advisory is issued once.
  const idempotency = `demo-${event.advisoryId ?? 'first'}`;
  const answer = await call(`/events/${encodeURIComponent(event.id)}/demo/next`, { method: 'POST', body: '{}', headers: { 'idempotency-key': idempotency } });
  const { advisory } = issuedSchema.parse(answer);
  return `${event.name}: advisory ${advisory.number} of ${advisory.storm.name} is issued`;
}
