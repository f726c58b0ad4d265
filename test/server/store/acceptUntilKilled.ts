/** Run by kill.test.ts in a process of its own: accepts advisories and publishes impacts for as long as it is left alive. */
import { writeSync } from 'node:fs';
import { tabulate } from '../../../lib/impact';
import { makeBus } from '../../../server/bus';
import { acceptAdvisory } from '../../../server/feeds';
import { openStore } from '../../../server/store';
import { hazardOf, smallExposure } from '../../impact/world';

export const EVENT_ID = 'e';
const [, , folder, file] = process.argv;

if (folder && file) void run(folder, file);

async function run(dataDir: string, text: string): Promise<void> {
  const store = await openStore({ DATA_DIR: dataDir, DATABASE_URL: undefined });
  const nowMs = Date.parse('2031-09-19T11:00:00Z');
  const services = { store, bus: makeBus(), clock: { nowMs: () => nowMs }, runs: { request: () => {}, underWay: () => null, waiting: 0, resume: async () => {}, close: async () => {} } };
  const event = (await store.events.get(EVENT_ID))!;
  for (;;) {
    const accepted = await acceptAdvisory(services, { event, source: { bytes: Buffer.from(text, 'base64'), contentType: 'text/plain', fileName: null }, by: 'Mara', idempotencyKey: null });
    if (!accepted.ok) throw new Error(JSON.stringify(accepted.errors));
    // Written at once, as an answer is: whoever reads it may rely on it.
    writeSync(1, `advisory ${accepted.advisory.id} ${accepted.advisory.sequence}\n`);
    const run = { eventId: EVENT_ID, advisoryId: accepted.advisory.id, issuedAtMs: nowMs, nowMs, seed: 1, computedAt: '2031-09-19T11:00:00.000Z' };
    const none = hazardOf(new Array<number>(7).fill(0), new Array<null[]>(7).fill([null, null, null]));
    const { impact } = tabulate(run, smallExposure(), none, null, null);
    const { revision } = await store.impacts.publish({ impact, bulk: { assets: Buffer.alloc(200_000, revisionLetter(accepted.advisory.sequence)) } });
    writeSync(1, `revision ${revision}\n`);
  }
}

const revisionLetter = (sequence: number): string => String.fromCharCode(97 + (sequence % 26));
