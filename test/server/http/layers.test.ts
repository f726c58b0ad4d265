import { afterAll, beforeAll, beforeEach, describe, expect, test } from 'vitest';
import type { Event, Layer } from '../../../lib/wire';
import { httpWorld, problemOf } from './world';
import type { World } from './world';

let world: World;
let event: Event;
beforeAll(async () => {
  world = await httpWorld();
});
afterAll(() => world.close());
beforeEach(async () => {
  event = await world.newEvent();
  world.requested.length = 0;
});

const HOSPITALS = 'id,name,lat,lon,class,beds\nh1,Hale Point Infirmary,25,-48.1,hospital,40\nh2,Sable General,25.1,-48.2,hospital,300\n';
const ZONES = JSON.stringify({
  type: 'FeatureCollection',
  features: [{ type: 'Feature', properties: { id: 'Z1', name: 'Saltmarsh', clearanceHours: 10 }, geometry: { type: 'Polygon', coordinates: [[[-48, 25], [-47.9, 25], [-47.9, 25.1], [-48, 25]]] } }],
});
const bring = (payload: string | Buffer, query: string, contentType = 'text/csv') => world.call({ method: 'POST', url: `/api/v1/events/${event.id}/layers${query}`, payload, headers: { 'content-type': contentType, 'x-file-name': 'hospitals.csv' } });
const list = async () => (await world.call({ url: `/api/v1/events/${event.id}/layers`, as: 'viewer' })).json<{ items: Layer[]; total: number }>();

describe('a layer', () => {
  test('is counted, stored and computed with', async () => {
    const answer = await bring(HOSPITALS, '?kind=assets&name=Hospitals');
    expect(answer.statusCode).toBe(201);
    expect(answer.json()).toMatchObject({ accepted: 2, rejected: [], layer: { kind: 'assets', name: 'Hospitals', version: 1, rows: 2, classes: [{ class: 'hospital', count: 2 }], receivedBy: 'the admin', receivedAt: '2031-09-19T09:30:00.000Z' } });
    expect(world.requested).toEqual([event.id]);
    expect((await list()).items.map(({ name }) => name)).toEqual(['Hospitals']);
  });

  test('brought in again is its next version', async () => {
    for (const version of [1, 2]) expect((await bring(ZONES, '?kind=zones&name=Zones', 'application/geo+json')).json<{ layer: Layer }>().layer.version).toBe(version);
  });

  test('is given back byte for byte, and kept by whoever asked', async () => {
    const { layer } = (await bring(ZONES, '?kind=zones&name=Zones', 'application/geo+json')).json<{ layer: Layer }>();
    const source = await world.call({ url: `/api/v1/events/${event.id}/layers/${layer.id}/source`, as: 'viewer' });
    expect(source.body).toBe(ZONES);
    expect(source.headers).toMatchObject({ 'content-type': 'application/geo+json', 'cache-control': 'private, max-age=31536000, immutable' });
  });
});

describe('a layer is refused, with its rows and columns, and nothing stored', () => {
  test.each<[string, string | Buffer, string, number, object]>([
    ['an empty file', '', '?kind=assets&name=n', 422, {}],
    ['a latitude of 95', 'name,lat,lon\nA,25,-48\nB,95,-48\n', '?kind=assets&name=n', 422, { line: 3, path: 'lat' }],
    ['a column that is missing', 'name,lat\nA,25\n', '?kind=assets&name=n', 422, { line: 1, path: 'lon' }],
    ['a table of zones', HOSPITALS, '?kind=zones&name=n', 422, { line: 1 }],
    ['a picture', Buffer.from([0x89, 0x50, 0x4e, 0x47, 13, 10, 26, 10, 0, 0]), '?kind=assets&name=n', 422, { line: 1 }],
    ['a kind that is none', HOSPITALS, '?kind=boats&name=n', 400, { path: 'kind' }],
    ['no name', HOSPITALS, '?kind=assets', 400, { path: 'name' }],
    ['a blank name', HOSPITALS, '?kind=assets&name=%20', 400, { path: 'name' }],
  ])('%s', async (_, payload, query, status, error) => {
    const answer = await bring(payload, query);
    expect(answer.statusCode).toBe(status);
    expect(problemOf(answer).errors?.[0]).toMatchObject(error);
    expect((await list()).total).toBe(0);
    expect(world.requested).toEqual([]);
  });

  test('a GeoTIFF, which this release does not read', async () => {
    const answer = await bring(Buffer.from([0x49, 0x49, 0x2a, 0]), '?kind=population&name=n', 'image/tiff');
    expect(answer.statusCode).toBe(415);
    expect(problemOf(answer).detail).toContain('application/geo+json');
  });
});
