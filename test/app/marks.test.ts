import { describe, expect, test } from 'vitest';
import { markClasses, markColumns, thinned } from '../../app/map/marks';
import { markAt, zoneAt } from '../../app/map/pick';
import { palette } from '../../app/map/palette';
import type { Marks } from '../../app/http/api';

const marks: Marks = {
  id: ['a', 'b', 'c'],
  lon: [-48.5, -48.50001, -48.3],
  lat: [25, 25, 25],
  classes: ['hospital', 'property'],
  classIndex: [0, 1, 1],
  maxWindKt: [20, 70, 40],
};
const paint = palette('day', () => '#102030');

describe('marks', () => {
  test('of one spot are drawn once, as the strongest wind there, until one comes near', () => {
    expect(thinned(marks, [0, 1, 2], 6)).toEqual([1, 2]);
    expect(thinned(marks, [0, 1, 2], 11)).toEqual([0, 1, 2]);
  });

  test('lie with the strongest wind on top', () => {
    expect([...markColumns(marks, [1, 2, 0], paint).index]).toEqual([0, 2, 1]);
  });

  test('carry their band as four bytes, and a quiet one the colour of no band', () => {
    const { colours } = markColumns(marks, [0, 1], paint);
    expect([...colours.subarray(4, 7)]).toEqual(paint.band['64'].fill.slice(0, 3));
    expect(colours[3]).toBeLessThan(255);
  });

  test('of a class with thousands are dots', () => {
    const many: Marks = { ...marks, classIndex: Array.from({ length: 2000 }, () => 1) };
    expect(markClasses(many)).toEqual([{ name: 'property', count: 2000, glyph: 'dot' }]);
    expect(markClasses(marks).map((one) => one.glyph)).toContain('cross');
  });
});

describe('pointing', () => {
  const camera = { lon: -48.5, lat: 25, zoom: 8 };
  test('finds the nearest mark within reach, and none of a hidden class', () => {
    expect(markAt(marks, new Set(), camera, -48.5, 25, 9)).toBe(0);
    expect(markAt(marks, new Set(['hospital']), camera, -48.5, 25, 9)).toBe(1);
    expect(markAt(marks, new Set(), camera, -48.4, 25.2, 9)).toBeNull();
  });

  test('finds a hospital among thousands of dots', () => {
    const many = 3000;
    const crowd: Marks = { id: Array.from({ length: many + 1 }, (_, i) => String(i)), lon: Array.from({ length: many + 1 }, () => -48.5), lat: Array.from({ length: many + 1 }, (_, i) => (i === 0 ? 25.01 : 25)), classes: marks.classes, classIndex: [0, ...Array.from({ length: many }, () => 1)], maxWindKt: Array.from({ length: many + 1 }, () => 40) };
    expect(markAt(crowd, new Set(), camera, -48.5, 25, 9)).toBe(0);
    expect(markAt(crowd, new Set(['hospital']), camera, -48.5, 25, 9)).toBeGreaterThan(0);
  });

  test('finds marks beyond the 180th meridian', () => {
    const far: Marks = { ...marks, lon: [179.999, 0, 0] };
    expect(markAt(far, new Set(), { ...camera, lon: -179.999 }, -179.9995, 25, 9)).toBe(0);
  });

  test('finds the zone a place lies in', () => {
    const zones = [{ id: 'z', name: 'Z', polygons: [[[[0, 0], [1, 0], [1, 1], [0, 1], [0, 0]]]] }];
    expect(zoneAt(zones, 0.5, 0.5)).toBe('z');
    expect(zoneAt(zones, 1.5, 0.5)).toBeNull();
  });
});
