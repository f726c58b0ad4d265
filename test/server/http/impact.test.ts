import { gunzipSync } from 'node:zlib';
import { parse } from 'csv-parse/sync';
import { afterAll, beforeAll, describe, expect, test } from 'vitest';
import type { AssetRow, Impact, ZoneRow } from '../../../lib/impact';
import type { Event, StoredAdvisory } from '../../../lib/wire';
import { NAMES } from './impact';
import { httpWorld, problemOf } from './world';
import type { World } from './world';

let world: World;
let event: Event;
let advisory: StoredAdvisory;
let track: Impact;
let members: Impact;
beforeAll(async () => {
  world = await httpWorld();
  event = await world.newEvent({ name: 'Quillon, "=drill"', exercise: true });
  advisory = await world.issue(event.id);
  track = await world.publish(advisory, 'track');
  members = await world.publish(advisory, 'members');
});
afterAll(() => world.close());

const get = (path: string, headers: Record<string, string> = {}) => world.call({ url: `/api/v1/events/${event.id}${path}`, as: 'viewer', headers });

describe('the impact', () => {
  test('is the newest unless a revision is named', async () => {
    expect((await get('/impact')).json()).toEqual(members);
    expect((await get('/impact?revision=1')).json()).toEqual(track);
  });

  test('of a named revision is kept for ever by whoever asked (RFC 8246), the newest is asked for again', async () => {
    expect((await get('/impact?revision=2')).headers['cache-control']).toBe('private, max-age=31536000, immutable');
    expect((await get('/impact')).headers['cache-control']).toBe('private, no-cache');
  });

  test('of a revision that is not there says which is', async () => {
    expect(problemOf(await get('/impact?revision=9'))).toMatchObject({ status: 404, detail: 'There is no revision 9: this event is at revision 2.' });
    expect(problemOf(await get('/impact?revision=latest'))).toMatchObject({ status: 400 });
  });

  test('of an event without one is not computed, rather than nothing', async () => {
    const other = await world.newEvent();
    expect(problemOf(await world.call({ url: `/api/v1/events/${other.id}/impact` }))).toMatchObject({ status: 404, type: 'urn:leeboard:problem:not-computed' });
  });

  test('is packed for whoever takes that', async () => {
    const packed = await get('/impact?revision=2', { 'accept-encoding': 'gzip' });
    expect(packed.headers['content-encoding']).toBe('gzip');
    expect(JSON.parse(gunzipSync(packed.rawPayload).toString())).toEqual(members);
  });
});

describe('asset rows', () => {
  const page = async (query: string) => (await get(`/impact/assets${query}`)).json<{ items: AssetRow[]; total: number; offset: number }>();

  test('come a page at a time, strongest wind first', async () => {
    const { items, total } = await page('?limit=1');
    expect(total).toBe(2);
    expect(items.map(({ id }) => id)).toEqual(['h1']);
    expect((await page('?limit=1&offset=1')).items.map(({ id }) => id)).toEqual(['f1']);
  });

  test('are chosen by layer and by class, and sorted', async () => {
    expect((await page('?class=feeder')).items.map(({ id }) => id)).toEqual(['f1']);
    expect((await page('?layer=L1')).items.map(({ id }) => id)).toEqual(['h1']);
    expect((await page('?class=yacht')).total).toBe(0);
    expect((await page('?sort=class')).items.map((row) => row.class)).toEqual(['feeder', 'hospital']);
  });

  test.each(['?limit=0', '?limit=1001', '?offset=-1', '?sort=colour'])('%s is refused', async (query) => {
    expect((await get(`/impact/assets${query}`)).statusCode).toBe(400);
  });

  test('of a named revision are kept for ever', async () => {
    expect((await get('/impact/assets?revision=1')).headers['cache-control']).toContain('immutable');
  });
});

describe('areas and marks', () => {
  test('come packed as they are kept, or plain', async () => {
    const packed = await get('/swath?product=peak', { 'accept-encoding': 'br, gzip;q=0.5' });
    const plain = await get('/swath');
    expect(packed.headers['content-encoding']).toBe('gzip');
    expect(plain.headers['content-encoding']).toBeUndefined();
    expect(gunzipSync(packed.rawPayload).equals(plain.rawPayload)).toBe(true);
    expect(plain.headers['content-type']).toBe('application/geo+json');
    expect(plain.headers.vary).toContain('accept-encoding');
    expect(plain.json()).toMatchObject({ type: 'FeatureCollection', features: [{ properties: { thresholdKt: 34 } }] });
  });

  test.each(['gzip;q=0', 'identity', 'br', ''])('come plain where Accept-Encoding is "%s"', async (encoding) => {
    expect((await get('/swath', { 'accept-encoding': encoding })).headers['content-encoding']).toBeUndefined();
  });

  test('of chances come with the members', async () => {
    expect((await get('/swath?product=chance34&revision=2')).statusCode).toBe(200);
    expect(problemOf(await get('/swath?product=chance34&revision=1')).detail).toContain('chances come with the members');
  });

  test('of rain are not computed in this release, and no rain is not read as dry', async () => {
    expect(problemOf(await get('/swath?product=rain'))).toMatchObject({ status: 404, type: 'urn:leeboard:problem:not-computed' });
  });

  test('of a product that is none are refused', async () => {
    expect(problemOf(await get('/swath?product=hail')).detail).toContain('product');
  });

  test('mark every asset', async () => {
    expect((await get('/impact/marks')).json()).toMatchObject({ id: ['h1', 'f1'], classes: ['hospital', 'feeder'], classIndex: [0, 1] });
  });
});

describe('exports', () => {
  const rows = (text: string): Record<string, string>[] => parse(text, { columns: true, comment: '#', comment_no_infix: true, record_delimiter: '\r\n' });
  const comments = (text: string): string[] => text.split('\r\n').filter((line) => line.startsWith('#'));

  test('zones.csv holds every zone as RFC 4180 has it', async () => {
    const { body, headers } = await get('/exports/zones.csv');
    expect(headers['content-type']).toBe('text/csv; charset=utf-8');
    expect(headers['content-disposition']).toContain(`filename="EXERCISE-Quillon-drill-advisory-5-revision-2-zones.csv"`);
    const read = rows(body);
    expect(read.map((row) => row.id)).toEqual(members.zones.map(({ id }) => id));
    const [first] = read;
    const zone = members.zones[0] as ZoneRow;
    expect(Number(first.maxWindKt)).toBe(zone.maxWindKt);
    expect(Number(first.peopleAtOrAbove34Kt_track)).toBe(zone.peopleAtOrAbove['34'].track);
    expect(first.arrival64Kt_track_utc).toBe(zone.arrival['64'].track ?? '');
    expect(first.startBy_utc).toBe(zone.startBy);
    expect(first.rainMm).toBe('');
  });

  test('no name is run as a formula (OWASP, CSV Injection), and none breaks the table', async () => {
    const zones = rows((await get('/exports/zones.csv')).body).map((row) => row.name);
    expect(zones).toEqual([`'${NAMES.formula}`, NAMES.parted]);
    expect(rows((await get('/exports/assets.csv')).body).map((row) => row.name)).toEqual(["'-Hale Point", 'Feeder 1']);
  });

  test('a longitude west keeps its sign: numbers are not text', async () => {
    const [first] = rows((await get('/exports/assets.csv')).body);
    expect(Number(first.lon)).toBeCloseTo(-48.1, 6);
  });

  test.each(['zones.csv', 'assets.csv'])('%s says what it is, of which advisory and revision, and who comes first', async (name) => {
    const head = comments((await get(`/exports/${name}?revision=1`)).body).join('\n');
    expect(head).toMatch(/EXERCISE/);
    expect(head).toMatch(/Official forecasts and warnings and local authorities come first/);
    expect(head).toMatch(/Advisory 5 of Test centre issued at 2031-09-19T09:00:00Z/);
    expect(head).toMatch(/Made at 2031-09-19T11:00:00\.000Z by the clock of the event: 2\.0 h after/);
    expect(head).toMatch(/Revision 1: forecast track only/);
    for (const line of head.split('\n')) expect(line, 'one cell in every spreadsheet').not.toMatch(/[",;\t]/);
  });

  test('swath.geojson carries its heading as a foreign member (RFC 7946, 6.1)', async () => {
    const { headers, ...answer } = await get('/exports/swath.geojson');
    expect(headers['content-type']).toBe('application/geo+json');
    const file = JSON.parse(answer.body) as { type: string; about: { exercise: boolean; revision: number; note: string[] }; features: unknown[] };
    expect(file).toMatchObject({ type: 'FeatureCollection', about: { exercise: true, revision: 2, advisoryId: advisory.id } });
    expect(file.about.note.join(' ')).toContain('Planning aid');
    expect(file.features).toHaveLength(1);
  });

  test('of an event with a long name are named by whole letters (RFC 8187) and still say the revision', async () => {
    const long = await world.newEvent({ name: '\u{20000}'.repeat(60), exercise: true });
    await world.publish(await world.issue(long.id));
    const answer = await world.call({ url: `/api/v1/events/${long.id}/exports/zones.csv` });
    expect(answer.statusCode).toBe(200);
    expect(decodeURIComponent(/filename\*=UTF-8''(\S+)/.exec(String(answer.headers['content-disposition']))![1])).toMatch(/^EXERCISE-\u{20000}{40}-advisory-5-revision-1-zones\.csv$/u);
  });

  test.each(['report.pdf', 'impact.xlsx', 'alert.cap.xml', 'zones'])('%s is not made in this release, and the answer says what is', async (name) => {
    expect(problemOf(await get(`/exports/${name}`)).detail).toContain('zones.csv, assets.csv, swath.geojson');
  });
});
