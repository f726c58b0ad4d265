import { describe, expect, test } from 'vitest';
import { assetsOf, cellsOf, feederFeatures, zonesOf } from './shipped';

describe('the exercise holds what its brief asks for', () => {
  test.each([
    ['hospitals.csv', 'hospital', 45],
    ['shelters.csv', 'shelter', 160],
    ['bridges.csv', 'bridge', 24],
    ['substations.csv', 'substation', 420],
    ['feeders.geojson', 'feeder', 3000],
    ['depots.csv', 'depot', 14],
    ['properties.csv', 'property', 50_000],
  ])('%s: class %s, %i of them', (file, name, count) => {
    const assets = assetsOf(file);
    expect(assets).toHaveLength(count);
    expect(new Set(assets.map((asset) => asset.class))).toEqual(new Set([name]));
    expect(new Set(assets.map(({ id }) => id)).size).toBe(count);
  });

  test('sixty zones, each with clearance hours and where they come from', () => {
    const zones = zonesOf();
    expect(zones).toHaveLength(60);
    expect(new Set(zones.map(({ name }) => name)).size).toBe(60);
    for (const zone of zones) {
      expect(zone.clearanceHours).toBeGreaterThanOrEqual(3);
      expect(zone.clearanceHours).toBeLessThanOrEqual(18);
      expect(zone.people).toBeNull();
      expect(zone.properties.clearanceSource).toMatch(/^Exercise plan/);
    }
  });

  test('about 2.4 million people in some 40,000 cells', () => {
    const { count, people } = cellsOf();
    expect(Math.abs(count - 40_000)).toBeLessThan(2_000);
    expect(Math.abs(people.reduce((sum, value) => sum + value, 0) - 2_400_000)).toBeLessThan(1_000);
  });

  test('zones hold the towns that a map of them names', () => {
    const names = zonesOf().map(({ name }) => name);
    expect(names).toEqual(expect.arrayContaining(['Saltmarsh', 'Orrin Bar', 'Port Ansel E', 'Port Ansel W', 'Brackwater', 'Hale Point', 'Tarn Valley', 'Westering', 'Outer Lamb', 'Fell Head']));
  });
});

describe('what assets say of themselves', () => {
  const positive = (file: string, column: string): void => {
    for (const asset of assetsOf(file)) expect(Number(asset.properties[column]), `${asset.id} ${column}`).toBeGreaterThan(0);
  };
  test.each([
    ['hospitals.csv', 'beds'],
    ['hospitals.csv', 'generatorHours'],
    ['shelters.csv', 'places'],
    ['shelters.csv', 'windRatingKt'],
    ['bridges.csv', 'closingWindKt'],
    ['depots.csv', 'hostsCrews'],
    ['feeders.geojson', 'poles'],
    ['properties.csv', 'value'],
  ])('%s: %s', positive);

  test('a deductible is less than the value it is taken from', () => {
    for (const { properties } of assetsOf('properties.csv')) expect(Number(properties.deductible)).toBeLessThan(Number(properties.value));
  });

  test('feeders belong to substations, and their customers add up to its own', () => {
    const served = new Map(assetsOf('substations.csv').map(({ id, people }) => [id, people!]));
    const byStation = new Map<string, number>();
    for (const { properties } of feederFeatures.features) byStation.set(String(properties.substation), (byStation.get(String(properties.substation)) ?? 0) + Number(properties.people));
    expect(byStation.size).toBe(served.size);
    for (const [id, people] of byStation) expect(people, id).toBe(served.get(id));
  });
});
