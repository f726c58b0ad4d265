import { mkdtempSync, rmSync } from 'node:fs';
import { tmpdir } from 'node:os';
import { join } from 'node:path';
import { afterEach, beforeEach, expect, test } from 'vitest';
import { inspectLayer } from '../../../server/compute/worker';
import { acceptLayer } from '../../../server/feeds';
import type { Services } from '../../../server/services';
import { openStore } from '../../../server/store';
import type { OpenedStore } from '../../../server/store';

let folder: string;
let store: OpenedStore;
let services: Pick<Services, 'store' | 'runs' | 'clock' | 'inspectLayer'>;
/** What was stored when a computation was asked for. */
let asked: Promise<number>[];

beforeEach(async () => {
  folder = mkdtempSync(join(tmpdir(), 'leeboard-feeds-'));
  store = await openStore({ DATA_DIR: folder, DATABASE_URL: undefined });
  asked = [];
  services = {
    store,
    runs: { request: () => void asked.push(stored()), underWay: () => null, waiting: 0, resume: async () => {}, close: async () => {} },
    clock: { nowMs: () => Date.parse('2031-09-19T09:30:00Z') },
    inspectLayer: async (task) => inspectLayer(task),
  };
  await store.events.add({ id: 'e', name: 'Quillon', timeZone: 'UTC', exercise: false, demo: false, clock: null, createdAt: '2031-09-19T09:00:00.000Z' });
});
afterEach(async () => {
  await Promise.all(asked);
  await store.close();
  rmSync(folder, { recursive: true, force: true });
});

const stored = async (): Promise<number> => (await store.layers.list('e', { offset: 0, limit: 10 })).total;
const bring = (text: string) => acceptLayer(services, { eventId: 'e', kind: 'assets', name: 'Shelters', source: { bytes: Buffer.from(text), contentType: 'text/csv', fileName: 'shelters.csv' }, by: 'Mara' });

test('a layer is stored first, and then asked to be computed with', async () => {
  const accepted = await bring('name,lat,lon\nHale Hall,25,-48\n');
  expect(await Promise.all(asked)).toEqual([1]);
  expect(accepted).toMatchObject({ ok: true, rejected: [], layer: { rows: 1, version: 1, receivedBy: 'Mara', receivedAt: '2031-09-19T09:30:00.000Z' } });
});

test('assets that name no class are one class of their own, named as the layer', async () => {
  expect(await bring('name,lat,lon,class\nHale Hall,25,-48,\nOrrin School,25,-48.1,school\n')).toMatchObject({ layer: { classes: [{ class: 'Shelters', count: 1 }, { class: 'school', count: 1 }] } });
});

test('a layer that cannot be read is neither stored nor computed with', async () => {
  expect(await bring('name,lat,lon\nHale Hall,95,-48\n')).toMatchObject({ ok: false, errors: [{ row: 2, column: 'lat' }] });
  expect(await stored()).toBe(0);
  expect(asked).toEqual([]);
});
