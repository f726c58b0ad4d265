import { area, bbox, booleanClockwise, booleanPointInPolygon, booleanValid, featureCollection, intersect, kinks, polygon } from '@turf/turf';
import { describe, expect, test } from 'vitest';
import { cellsOf, coast, zoneFeatures } from './shipped';

const zones = zoneFeatures.features.map((zone) => ({ zone, box: bbox(zone), name: String(zone.properties.name) }));
const polygonsOf = ({ zone }: (typeof zones)[number]) => (zone.geometry.type === 'Polygon' ? [zone.geometry.coordinates] : zone.geometry.coordinates);
const touch = (a: readonly number[], b: readonly number[]): boolean => a[0] <= b[2] && b[0] <= a[2] && a[1] <= b[3] && b[1] <= a[3];

describe('zones', () => {
  test.each(zones.map((entry) => [entry.name, entry] as const))('%s is a valid polygon that does not cross itself', (_, entry) => {
    expect(polygonsOf(entry).length).toBeGreaterThan(0);
    for (const rings of polygonsOf(entry)) {
      const piece = polygon(rings);
      expect(booleanValid(piece)).toBe(true);
      expect(kinks(piece).features).toEqual([]);
      expect(area(piece)).toBeGreaterThan(1e5);
      rings.forEach((ring, i) => expect(booleanClockwise(ring)).toBe(i > 0));
    }
  });

  test('do not overlap, but for what rounding to four decimals leaves', () => {
    const shared = zones.flatMap((a, i) =>
      zones.slice(i + 1).filter((b) => touch(a.box, b.box)).map((b) => {
        const both = intersect(featureCollection([a.zone, b.zone]));
        return { pair: `${a.name}, ${b.name}`, m2: both ? area(both) : 0, ofSmaller: Math.min(area(a.zone), area(b.zone)) };
      }),
    );
    expect(shared.length).toBeGreaterThan(60);
    expect(shared.filter(({ m2, ofSmaller }) => m2 > ofSmaller * 1e-4)).toEqual([]);
  }, 60_000);

  test('lie on land', () => {
    for (const { zone, name } of zones) {
      const dry = coast.features.reduce((sum, island) => {
        const both = touch(bbox(island), bbox(zone)) ? intersect(featureCollection([zone, island])) : null;
        return sum + (both ? area(both) : 0);
      }, 0);
      expect(Math.abs(dry / area(zone) - 1), name).toBeLessThan(0.002);
    }
  }, 60_000);

  test('are not rectangles: each has the corners of a coast', () => {
    for (const entry of zones) expect(polygonsOf(entry).flat(2).length, entry.name).toBeGreaterThan(15);
  });

  test('hold more than half of the people, and every zone some', () => {
    const { count, lat, lon, people } = cellsOf();
    const inside = new Map(zones.map(({ name }) => [name, 0]));
    let total = 0;
    for (let i = 0; i < count; i++) {
      total += people[i];
      const found = zones.find(({ zone, box }) => lon[i] >= box[0] && lon[i] <= box[2] && lat[i] >= box[1] && lat[i] <= box[3] && booleanPointInPolygon([lon[i], lat[i]], zone));
      if (found) inside.set(found.name, inside.get(found.name)! + people[i]);
    }
    expect([...inside.values()].reduce((sum, value) => sum + value, 0)).toBeGreaterThan(total / 2);
    for (const [name, value] of inside) expect(value, name).toBeGreaterThan(100);
  }, 60_000);
});
