import { describe, expect, test } from 'vitest';
import { columnOf } from '../../lib/advisory/columns';

/** What one unit of a column is in the model's unit. */
const factor = (name: string): number => {
  const column = columnOf(name);
  if (column?.kind !== 'quantity' && column?.kind !== 'radius') throw new Error(`${name} is no quantity`);
  return column.toModel(1);
};

describe('units in names are exact (NIST SP 811, appendix B.8)', () => {
  test.each([
    ['maxWindKt', 1],
    ['maxWindMs', 3600 / 1852],
    ['maxWindKmh', 1 / 1.852],
    ['maxWindMph', (0.44704 * 3600) / 1852],
    ['gustMs', 3600 / 1852],
    ['minPressureHpa', 1],
    ['minPressureMb', 1],
    ['radiusMaxWindNm', 1],
    ['radiusMaxWindKm', 1 / 1.852],
    ['eyeDiameterMi', 1.609344 / 1.852],
    ['r34NeNm', 1],
    ['r50SwKm', 1 / 1.852],
    ['r64NwMi', 1.609344 / 1.852],
  ])('one %s is %f', (name, expected) => expect(factor(name)).toBeCloseTo(expected, 12));
});

describe('names', () => {
  test('are the same in any case and with any separators', () => {
    for (const name of ['maxWindKt', 'max_wind_kt', 'Max Wind (kt)', 'MAX-WIND-KT']) expect(columnOf(name)).toMatchObject({ kind: 'quantity', field: 'maxWindKt' });
  });

  test('of time and place have their usual variants', () => {
    expect(['validAt', 'time', 'datetime'].map((name) => columnOf(name)?.kind)).toEqual(['time', 'time', 'time']);
    expect(['lat', 'latitude'].map((name) => columnOf(name)?.kind)).toEqual(['lat', 'lat']);
    expect(['lon', 'lng', 'long', 'longitude'].map((name) => columnOf(name)?.kind)).toEqual(['lon', 'lon', 'lon', 'lon']);
  });

  test('of radii give threshold and quadrant', () => {
    expect(columnOf('r50SeNm')).toMatchObject({ kind: 'radius', threshold: '50', quadrant: 'se' });
  });

  test('of the whole advisory', () => {
    expect(['stormName', 'stormId', 'number', 'centre', 'center', 'issuedAt', 'nextDueAt', 'averaging'].map((name) => columnOf(name)?.kind)).toEqual(Array(8).fill('about'));
  });

  test.each(['maxWind', 'gust', 'pressure', 'rmw', 'r34ne'])('%s lacks its unit', (name) => expect(columnOf(name)?.kind).toBe('unit-missing'));
  test.each(['maxWindFurlongs', 'r35NeNm', 'r34NneNm', 'category', 'constructor', '__proto__', ''])('"%s" is not one of ours', (name) => expect(columnOf(name)).toBeNull());
});
