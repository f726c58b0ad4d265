import { mkdtempSync, rmSync, writeFileSync } from 'node:fs';
import { tmpdir } from 'node:os';
import { join } from 'node:path';
import { afterAll, expect, test } from 'vitest';
import { readAdvisory } from '../../lib/advisory';
import { readLayer } from '../../lib/exposure';
import { newEventSchema } from '../../lib/wire';
import { readScenario } from '../../server/demo';
import { folder, textOf } from './shipped';

const scenario = readScenario(folder);
const broken = mkdtempSync(join(tmpdir(), 'leeboard-demo-'));
afterAll(() => rmSync(broken, { recursive: true, force: true }));

test('the scenario makes an event', () => {
  expect(newEventSchema.parse({ name: scenario.eventName, timeZone: scenario.timeZone, exercise: true }).timeZone).toBe('Etc/GMT+3');
});

test('every layer reads under its kind and name', () => {
  expect(scenario.layers.map(({ fileName }) => fileName)).toEqual(['zones.geojson', 'population.csv', 'hospitals.csv', 'shelters.csv', 'bridges.csv', 'substations.csv', 'feeders.geojson', 'depots.csv', 'properties.csv']);
  for (const { bytes, ...options } of scenario.layers) expect(readLayer(new TextDecoder().decode(bytes), options).ok, options.name).toBe(true);
});

test('advisories come in order', () => {
  const numbers = scenario.advisories.map(({ bytes }) => {
    const reading = readAdvisory(new TextDecoder().decode(bytes));
    return reading.ok ? reading.advisory.number : reading.errors;
  });
  expect(numbers).toEqual(['1', '2', '3', '4', '5', '6', '7', '8']);
});

test('the coast lies where the scenario says', () => {
  expect(scenario.coastFile).toBe(join(folder, 'coast.geojson'));
  expect(textOf('coast.geojson')).toContain('FeatureCollection');
});

test('a folder without the demo is said, with its path', () => {
  expect(() => readScenario(broken)).toThrow(`${join(broken, 'world.json')} cannot be read`);
});

test('a world that lacks its time zone is said, with the way to mend it', () => {
  writeFileSync(join(broken, 'world.json'), JSON.stringify({ eventName: 'Quillon', layers: [] }));
  expect(() => readScenario(broken)).toThrow(/timeZone[\s\S]*npm run demo:make/);
});
