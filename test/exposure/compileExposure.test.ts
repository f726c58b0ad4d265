import { booleanPointInPolygon } from '@turf/turf';
import fc from 'fast-check';
import { describe, expect, test } from 'vitest';
import { compileExposure, SURFACES } from '../../lib/exposure';
import type { Asset, Cells, Exposure, LayerData, Zone } from '../../lib/exposure';
import { place, polygon } from './shapes';
import { square } from './readings';

const open = (): 'open' => 'open';
const zone = (id: string, geometry: Zone['geometry'], people: number | null = null): Zone => ({ id, name: `Zone ${id}`, people, clearanceHours: 9, properties: {}, geometry });
const asset = (id: string, geometry: Asset['geometry'], more: Partial<Asset> = {}): Asset => ({ id, class: 'hospital', name: id, people: null, surface: null, properties: {}, geometry, ...more });
const zonesLayer = (...zones: Zone[]) => ({ layerId: 'zones', data: { kind: 'zones', zones } satisfies LayerData });
const assetsLayer = (...assets: Asset[]) => ({ layerId: 'assets', data: { kind: 'assets', assets } satisfies LayerData });
/** A cell: latitude, longitude, people. */
type Cell = readonly [number, number, number];
const cells = (rows: readonly Cell[]): Cells => ({
  count: rows.length,
  lat: Float64Array.from(rows, ([lat]) => lat),
  lon: Float64Array.from(rows, ([, lon]) => lon),
  people: Float64Array.from(rows, ([, , people]) => people),
});
const peopleLayer = (...rows: Cell[]) => ({ layerId: 'people', data: { kind: 'population', cells: cells(rows) } satisfies LayerData });
const peopleOf = ({ zones }: Exposure): Record<string, number> => Object.fromEntries(zones.map(({ id, people }) => [id, people]));

describe('people are counted', () => {
  const a = square(-49, 24);
  const b = square(-48, 24);

  test('from the cells in each zone', () => {
    const exposure = compileExposure([zonesLayer(zone('A', a), zone('B', b)), peopleLayer([24.5, -48.5, 10], [24.6, -48.4, 2.5], [24.5, -47.5, 7], [30, -40, 100])], open);
    expect(peopleOf(exposure)).toEqual({ A: 12.5, B: 7 });
    expect([exposure.peopleInZones, exposure.peopleTotal]).toEqual([19.5, 119.5]);
  });

  test('from the cells even where the zone states its own figure', () => {
    expect(peopleOf(compileExposure([zonesLayer(zone('A', a, 5000)), peopleLayer([24.5, -48.5, 10])], open))).toEqual({ A: 10 });
  });

  test('from the zone’s own figure where no cell lies in it, shared by places inside it, to the person', () => {
    const exposure = compileExposure([zonesLayer(zone('A', a, 5003), zone('B', b)), peopleLayer([24.5, -47.5, 10])], open);
    expect(peopleOf(exposure)).toEqual({ A: 5003, B: 10 });
    const { places } = exposure;
    const inA = Array.from(places.zone, (_, i) => i).filter((i) => places.zone[i] === 0);
    expect(inA.length).toBeGreaterThan(1000);
    expect(inA.reduce((sum, i) => sum + Math.round(places.people[i] * 1000), 0)).toBe(5_003_000);
    for (const i of inA) expect(booleanPointInPolygon([places.lon[i], places.lat[i]], a)).toBe(true);
  });

  test('in the first zone where two overlap, and once', () => {
    const exposure = compileExposure([zonesLayer(zone('A', square(-49, 24, 2)), zone('B', square(-48, 24, 2))), peopleLayer([24.5, -47.5, 10], [24.5, -46.5, 3])], open);
    expect(peopleOf(exposure)).toEqual({ A: 10, B: 3 });
    expect(exposure.peopleTotal).toBe(13);
  });

  test('as an independent library counts them, whatever the zones and cells: the total is the sum of the zones and of those outside', () => {
    const cell = fc.tuple(place, fc.double({ min: 0, max: 500, noNaN: true })).map(([[lon, lat], people]) => [lat, lon, people] as const);
    fc.assert(
      fc.property(fc.array(polygon, { minLength: 1, maxLength: 6 }), fc.array(cell, { minLength: 1, maxLength: 120 }), (shapes, rows) => {
        const exposure = compileExposure([zonesLayer(...shapes.map((shape, i) => zone(String(i), shape))), peopleLayer(...rows)], open);
        const expected = shapes.map(() => 0);
        let outside = 0;
        for (const [lat, lon, people] of rows) {
          const z = shapes.findIndex((shape) => booleanPointInPolygon([lon, lat], shape));
          if (z < 0) outside += people;
          else expected[z] += people;
        }
        exposure.zones.forEach(({ people }, z) => expect(Math.abs(people - expected[z])).toBeLessThan(0.0005 * rows.length + 1e-9));
        expect(Math.abs(exposure.peopleTotal - exposure.peopleInZones - outside)).toBeLessThan(0.0005 * rows.length + 1e-9);
      }),
      { numRuns: 150, seed: 41 },
    );
  });

  test('to the same totals when rows are shuffled, to the last bit', () => {
    const rows = fc.array(fc.tuple(place, fc.double({ min: 0, max: 500, noNaN: true })).map(([[lon, lat], people]) => [lat, lon, people] as const), { minLength: 2, maxLength: 80 });
    fc.assert(
      fc.property(polygon, rows.chain((list) => fc.tuple(fc.constant(list), fc.shuffledSubarray(list, { minLength: list.length }))), (shape, [list, shuffled]) => {
        const totals = (those: typeof list) => {
          const { zones, peopleTotal, peopleInZones } = compileExposure([zonesLayer(zone('A', shape)), peopleLayer(...those)], open);
          return { zones, peopleTotal, peopleInZones };
        };
        expect(totals(shuffled)).toEqual(totals(list));
      }),
      { numRuns: 100, seed: 13 },
    );
  });
});

describe('places', () => {
  const line: GeoJSON.LineString = { type: 'LineString', coordinates: [[-48, 25], [-47.9, 25]] };
  const { places, assets, classes } = compileExposure(
    [assetsLayer(asset('H1', { type: 'Point', coordinates: [-48.2, 25.1] }, { people: 120, surface: 'built-up' }), asset('F1', line, { class: 'feeder' })), { ...assetsLayer(asset('H1', { type: 'Point', coordinates: [-47, 25.1] })), layerId: 'others' }, peopleLayer([25.05, -48.1, 40])],
    (lat) => (lat > 25.07 ? 'marine' : 'open'),
  );

  test('of one asset are consecutive, and its run finds them', () => {
    expect(Array.from(assets.placeCount)).toEqual([1, 7, 1]);
    for (let a = 0; a < assets.count; a++) for (let i = 0; i < assets.placeCount[a]; i++) expect(places.asset[assets.firstPlace[a] + i]).toBe(a);
    expect(places.count).toBe(10);
  });

  test('hold people where people live, and none where assets stand', () => {
    const i = places.asset.indexOf(-1);
    expect([places.lat[i], places.lon[i], places.people[i], places.zone[i]]).toEqual([25.05, -48.1, 40, -1]);
    expect(places.people.reduce((sum, people) => sum + people, 0)).toBe(40);
  });

  test('take their own surface, else that of where they are', () => {
    const surfaceAt = (a: number): string => SURFACES[places.surface[assets.firstPlace[a]]];
    expect([0, 1, 2].map(surfaceAt)).toEqual(['built-up', 'open', 'marine']);
  });

  test('belong to assets of their layer, with their class, name and people', () => {
    expect([assets.layer, assets.id, assets.people]).toEqual([['assets', 'assets', 'others'], ['H1', 'F1', 'H1'], [120, null, null]]);
    expect(Array.from(assets.classIndex, (index) => classes[index])).toEqual(['hospital', 'feeder', 'hospital']);
    expect(assets.lon[1]).toBeCloseTo(-47.95, 1);
  });

  test('that follow one another are near one another: blocks of 64 are a fifth as tall as in the order of rows', () => {
    const rows = Array.from({ length: 4096 }, (_, i) => [24 + ((i * 0.754877) % 1), -48 + ((i * 0.569840) % 1), 1] as const);
    const tall = (lats: ArrayLike<number>): number => {
      let sum = 0;
      for (let from = 0; from < lats.length; from += 64) {
        const block = Array.from({ length: 64 }, (_, k) => lats[from + k]);
        sum += Math.max(...block) - Math.min(...block);
      }
      return sum;
    };
    expect(tall(compileExposure([peopleLayer(...rows)], open).places.lat)).toBeLessThan(0.2 * tall(rows.map(([lat]) => lat)));
  });
});

test('no layers are an exposure of nothing', () => {
  const { places, assets, zones, peopleTotal } = compileExposure([], open);
  expect([places.count, assets.count, zones.length, peopleTotal]).toEqual([0, 0, 0, 0]);
});
