import { beforeAll, describe, expect, test } from 'vitest';
import { compileExposure, readLayer } from '../../../lib/exposure';
import { ASSET_SORTS, openAssets, pageOfAssets, writeAssets } from '../../../server/compute/bulk';
import type { AssetRows } from '../../../server/compute/bulk';

const COUNT = 700;
const CLASSES = ['substation', 'Bridge', 'école'];
/** Steps that share no factor with the count visit everything once, in no order. */
const shuffled = (i: number, step: number): number => (i * step) % COUNT;

const csv = ['id,name,lat,lon,class', ...Array.from({ length: COUNT }, (_, i) => `a${i},Site ${shuffled(i, 33)},25,${-48 + i / 1000},${CLASSES[i % 3]}`)].join('\n');

let rows: AssetRows;
beforeAll(async () => {
  const reading = readLayer(csv, { kind: 'assets', assetClass: 'sites' });
  if (!reading.ok) throw new Error(reading.errors[0].message);
  const exposure = compileExposure([{ layerId: 'L', data: reading.data }], () => 'open');
  const number = exposure.assets.id.map((id) => Number(id.slice(1)));
  const columns = (valueOf: (asset: number) => number) => Float32Array.from({ length: COUNT * 3 }, (_, k) => valueOf(number[Math.floor(k / 3)]));
  const { assets } = writeAssets(exposure, {
    issuedAtMs: Date.parse('2031-09-19T09:00:00Z'),
    members: 0,
    // Four assets share each wind, and every fifth has no arrival.
    peakKt: Float32Array.from(number, (n) => Math.floor(shuffled(n, 51) / 4)),
    gustKt: Float32Array.from(number, (n) => n),
    arrival: columns((n) => (n % 5 === 0 ? NaN : shuffled(n, 17))),
    end: columns(() => NaN),
    reached: new Uint16Array(0),
    moments: new Float32Array(0),
  });
  rows = await openAssets(assets);
});

const page = async (query: Partial<Parameters<typeof pageOfAssets>[1]>) => pageOfAssets(rows, { offset: 0, limit: COUNT, ...query });

describe('asset rows', () => {
  test.each(ASSET_SORTS)('sorted by %s are every asset once, and pages laid end to end are the whole', async (sort) => {
    const whole = (await page({ sort })).items.map(({ id }) => id);
    expect(new Set(whole).size).toBe(COUNT);
    const pages = await Promise.all([0, 300, 600].map((offset) => page({ sort, offset, limit: 300 })));
    expect(pages.map(({ items, total, offset }) => [items.length, total, offset])).toEqual([[300, COUNT, 0], [300, COUNT, 300], [100, COUNT, 600]]);
    expect(pages.flatMap(({ items }) => items.map(({ id }) => id))).toEqual(whole);
  });

  test('come strongest wind first unless sorted otherwise', async () => {
    const winds = (await page({})).items.map(({ maxWindKt }) => maxWindKt);
    expect(winds).toEqual([...winds].sort((a, b) => b - a));
    expect(winds[0]).toBe(174);
  });

  test('come by first arrival of 34 kt, those without one last', async () => {
    const times = (await page({ sort: 'arrival' })).items.map(({ arrival }) => arrival['34'].track);
    const known = times.filter((time) => time !== null);
    expect(known).toEqual([...known].sort());
    expect(times.slice(known.length)).toEqual(Array.from({ length: COUNT / 5 }, () => null));
  });

  test('come by class and by name as an English reader looks them up (UTS 10: letters first, then accents and case)', async () => {
    const classes = (await page({ sort: 'class' })).items.map((row) => row.class);
    expect([...new Set(classes)]).toEqual(['Bridge', 'école', 'substation']);
    const names = (await page({ sort: 'name' })).items.map(({ name }) => name);
    expect(names).toEqual([...names].sort(new Intl.Collator('en').compare));
  });

  test('of one class keep the order of all', async () => {
    const all = (await page({ sort: 'name' })).items.filter((row) => row.class === 'école');
    expect(await page({ sort: 'name', class: 'école' })).toEqual({ items: all, total: 233, offset: 0 });
  });

  test('beyond the last are none, and the total stays', async () => {
    expect(await page({ offset: 2 ** 53 - 1 })).toEqual({ items: [], total: COUNT, offset: 2 ** 53 - 1 });
  });
});

test('bytes of anything else are not opened', async () => {
  const { gzipSync } = await import('node:zlib');
  await expect(openAssets(gzipSync('PK\x03\x04 and more than eight bytes'))).rejects.toThrow('expected "LBA1"');
});
