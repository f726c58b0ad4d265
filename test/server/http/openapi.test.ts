import { Validator } from '@seriousme/openapi-schema-validator';
import { afterAll, beforeAll, describe, expect, test } from 'vitest';
import { httpWorld } from './world';
import type { World } from './world';

interface Operation {
  summary?: string;
  security?: object[];
  parameters?: { name: string; in: string }[];
  requestBody?: { content: Record<string, { schema: object }> };
  responses: Record<string, { content?: Record<string, { schema: object }> }>;
}
interface Description {
  openapi: string;
  paths: Record<string, Record<string, Operation>>;
  components: { schemas: Record<string, { properties?: Record<string, unknown>; required?: string[] }> };
}

let world: World;
let api: Description;
beforeAll(async () => {
  world = await httpWorld();
  api = (await world.call({ url: '/api/v1/openapi.json', as: null })).json<Description>();
});
afterAll(() => world.close());

test("the description is valid by the OpenAPI Initiative's own schema for 3.1", async () => {
  const validator = new Validator();
  expect(await validator.validate({ ...structuredClone(api) })).toMatchObject({ valid: true });
  expect(validator.version).toBe('3.1');
  expect(api.openapi).toBe('3.1.0');
});

test('every reference leads somewhere', () => {
  const names = Array.from(JSON.stringify(api).matchAll(/"#\/components\/schemas\/([^"]+)"/g), ([, name]) => name);
  expect(names.length).toBeGreaterThan(10);
  expect(names.filter((name) => !(name in api.components.schemas))).toEqual([]);
});

describe('the names of the contract', () => {
  test.each([
    ['get', '/api/v1/health'],
    ['post', '/api/v1/events'],
    ['get', '/api/v1/events'],
    ['get', '/api/v1/events/{id}'],
    ['post', '/api/v1/events/{id}/advisories'],
    ['get', '/api/v1/events/{id}/advisories'],
    ['get', '/api/v1/events/{id}/advisories/{advisoryId}'],
    ['get', '/api/v1/events/{id}/advisories/{advisoryId}/source'],
    ['post', '/api/v1/events/{id}/layers'],
    ['get', '/api/v1/events/{id}/layers'],
    ['get', '/api/v1/events/{id}/impact'],
    ['get', '/api/v1/events/{id}/impact/assets'],
    ['get', '/api/v1/events/{id}/swath'],
    ['get', '/api/v1/events/{id}/exports/{name}'],
    ['post', '/api/v1/events/{id}/log'],
    ['get', '/api/v1/events/{id}/log'],
  ])('%s %s', (method, path) => {
    expect(api.paths[path]?.[method]).toBeDefined();
  });

  test.each([
    ['Advisory', ['storm', 'number', 'centre', 'issuedAt', 'nextDueAt', 'averaging', 'points']],
    ['Impact', ['eventId', 'revision', 'advisoryId', 'stage', 'members', 'seed', 'computedAt', 'totals', 'zones', 'classes', 'evacuation', 'restoration', 'claims', 'change']],
    ['ZoneRow', ['id', 'name', 'people', 'maxWindKt', 'gustKt', 'rainMm', 'chance', 'peopleAtOrAbove', 'arrival', 'end', 'clearanceHours', 'startBy', 'slackHours', 'change']],
    ['AssetRow', ['id', 'layer', 'class', 'name', 'lon', 'lat', 'maxWindKt', 'gustKt', 'rainMm', 'chance', 'arrival', 'end']],
    ['Problem', ['type', 'title', 'status', 'detail', 'instance', 'errors']],
  ])('of %s', (schema, names) => {
    expect(Object.keys(api.components.schemas[schema]?.properties ?? {})).toEqual(expect.arrayContaining(names));
  });

  test.each([
    ['post', '/api/v1/events/{id}/advisories', ['format', 'technique', 'cycle', 'dryRun']],
    ['post', '/api/v1/events/{id}/layers', ['kind', 'name']],
    ['get', '/api/v1/events/{id}/impact/assets', ['layer', 'class', 'sort', 'offset', 'limit', 'revision']],
    ['get', '/api/v1/events/{id}/swath', ['revision', 'product']],
  ])('in the query of %s %s', (method, path, names) => {
    expect(api.paths[path][method].parameters?.filter((one) => one.in === 'query').map(({ name }) => name)).toEqual(expect.arrayContaining(names));
  });

  test('of what an advisory may be sent as', () => {
    const { content } = api.paths['/api/v1/events/{id}/advisories'].post.requestBody!;
    expect(Object.keys(content)).toEqual(['application/json', 'text/plain', 'text/csv', 'application/geo+json', 'application/octet-stream']);
    expect(content['application/json'].schema).toEqual({ $ref: '#/components/schemas/Advisory' });
  });
});

test('every call says in words what it does, who may make it, and that it may answer a problem document', () => {
  for (const [path, methods] of Object.entries(api.paths)) {
    for (const [method, operation] of Object.entries(methods)) {
      expect(operation.summary, `${method} ${path}`).toBeTruthy();
      expect(operation.security, `${method} ${path}`).toBeDefined();
      if (path !== '/api/v1/health') expect(operation.responses.default?.content, `${method} ${path}`).toHaveProperty(['application/problem+json']);
    }
  }
});

test('what is answered is what is described', async () => {
  const event = await world.newEvent();
  const advisory = await world.issue(event.id);
  await world.publish(advisory);
  for (const [url, schema] of [[`/api/v1/events/${event.id}/impact`, 'Impact'], [`/api/v1/events/${event.id}`, 'Event'], [`/api/v1/events/${event.id}/advisories/${advisory.id}`, 'StoredAdvisory']]) {
    const body = (await world.call({ url })).json<object>();
    expect(Object.keys(body).sort(), schema).toEqual(expect.arrayContaining([...(api.components.schemas[schema].required ?? [])].sort()));
  }
});
