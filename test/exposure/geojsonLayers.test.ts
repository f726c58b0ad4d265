import { describe, expect, test } from 'vitest';
import { assetsIn, cellsIn, collection, errorsIn, feature, point, square, zonesIn } from './readings';

describe('a GeoJSON of zones', () => {
  test('is polygons with people and clearance hours', () => {
    const [zone] = zonesIn(collection(feature(square(-49, 24), { id: 'Z01', name: 'Saltmarsh', people: 21_000, clearanceHours: 14.5, clearanceSource: 'Exercise plan' })));
    expect(zone).toMatchObject({ id: 'Z01', name: 'Saltmarsh', people: 21_000, clearanceHours: 14.5, properties: { clearanceSource: 'Exercise plan' } });
    expect(zone.geometry).toEqual(square(-49, 24));
  });

  test.each(['clearance_hours', 'Clearance Hours', 'clearance-time', 'CLEARANCE'])('says its clearance hours as %s', (name) => {
    expect(zonesIn(collection(feature(square(-49, 24), { [name]: '9' })))[0].clearanceHours).toBe(9);
  });

  test('says nothing where it knows nothing: people and hours are null, not 0', () => {
    expect(zonesIn(collection(feature(square(-49, 24))))[0]).toMatchObject({ id: 'row-1', name: 'row-1', people: null, clearanceHours: null });
  });

  test('may be in several parts and have holes', () => {
    const parts = { type: 'MultiPolygon', coordinates: [square(-49, 24).coordinates, [...square(-47, 24).coordinates, ...square(-46.6, 24.4, 0.2).coordinates]] };
    expect(zonesIn(collection(feature(parts)))[0].geometry).toEqual(parts);
  });

  test('refuses points and lines', () => {
    expect(errorsIn(collection(feature(point(-48, 25))), 'zones')).toEqual([{ row: 1, column: 'geometry', message: 'found a Point, expected a Polygon or a MultiPolygon' }]);
  });
});

describe('a GeoJSON of assets', () => {
  const line = { type: 'LineString', coordinates: [[-48, 25], [-48.1, 25.1]] };

  test('is points, lines and areas', () => {
    const shapes = [point(-48, 25), line, { type: 'MultiLineString', coordinates: [line.coordinates, [[-47, 25], [-47, 25.1]]] }, square(-48, 25, 0.01)];
    expect(assetsIn(collection(...shapes.map((shape) => feature(shape)))).map(({ geometry }) => geometry)).toEqual(shapes);
  });

  test('may be a single feature, with its id beside its properties', () => {
    expect(assetsIn(JSON.stringify(feature(line, { name: 'Feeder 1', class: 'feeder', poles: 44 }, { id: 17 })))[0]).toMatchObject({ id: '17', name: 'Feeder 1', class: 'feeder', properties: { poles: 44 } });
  });

  test('may have properties that are null', () => {
    expect(assetsIn(collection(feature(point(-48, 25), null)))).toHaveLength(1);
  });

  test('may have heights, which are not looked at', () => {
    expect(assetsIn(collection(feature({ type: 'Point', coordinates: [-48, 25, 12] })))[0].geometry).toEqual({ type: 'Point', coordinates: [-48, 25, 12] });
  });
});

test('a GeoJSON of population is points with people', () => {
  expect([...cellsIn(collection(feature(point(-48, 25), { people: 12 }), feature(point(-48, 26), { population: '3.5' }))).people]).toEqual([12, 3.5]);
  expect(errorsIn(collection(feature(square(-48, 25), { people: 3 })), 'population')[0]).toMatchObject({ row: 1, message: expect.stringContaining('found a Polygon, expected a Point') });
});

describe('a GeoJSON with a fault is refused whole, and every feature with one is named', () => {
  test('positions', () => {
    const errors = errorsIn(collection(feature(point(-48, 25)), feature(point(-48, 95)), feature(point(200, 25)), feature(point('x', 25)), feature({ type: 'Point', coordinates: [-48] }), feature(point(null, 25))));
    expect(errors).toEqual([
      { row: 2, column: 'geometry.coordinates.1', message: 'found 95, expected a latitude from -90 to 90 (positions are [longitude, latitude] in degrees)' },
      { row: 3, column: 'geometry.coordinates.0', message: expect.stringContaining('found 200, expected a longitude from -180 to 180') },
      { row: 4, column: 'geometry.coordinates.0', message: expect.stringContaining('found "x"') },
      { row: 5, column: 'geometry.coordinates.1', message: expect.stringContaining('found nothing, expected a latitude') },
      { row: 6, column: 'geometry.coordinates.0', message: expect.stringContaining('found null') },
    ]);
  });

  test.each([
    ['a ring that stays open', { type: 'Polygon', coordinates: [[[0, 0], [1, 0], [1, 1], [0, 1]]] }, 'repeat its first position at its end'],
    ['a ring of three positions', { type: 'Polygon', coordinates: [[[0, 0], [1, 0], [0, 0]]] }, 'a ring of four positions or more'],
    ['a ring that encloses nothing', { type: 'Polygon', coordinates: [[[0, 0], [1, 1], [2, 2], [0, 0]]] }, 'encloses nothing'],
    ['a polygon without rings', { type: 'Polygon', coordinates: [] }, 'at least one ring'],
    ['a line of one position', { type: 'LineString', coordinates: [[0, 0]] }, 'two positions or more'],
    ['a shape that is several', { type: 'GeometryCollection', geometries: [] }, 'found a "GeometryCollection", expected a Point'],
    ['several points', { type: 'MultiPoint', coordinates: [[0, 0]] }, 'give each part its own feature'],
    ['no geometry', null, 'this feature has no geometry'],
    ['an uncut crossing of the 180th meridian', { type: 'Polygon', coordinates: [[[179, 0], [-179, 0], [-179, 1], [179, 1], [179, 0]]] }, 'cut it in two at the 180th meridian'],
    ['a line that crosses it', { type: 'LineString', coordinates: [[179, 0], [-179, 0]] }, 'cut it in two at the 180th meridian'],
  ])('%s', (_, geometry, message) => {
    expect(errorsIn(collection(feature(point(-48, 25)), feature(geometry)))).toEqual([expect.objectContaining({ row: 2, message: expect.stringContaining(message) })]);
  });

  test('an infinite coordinate, which JSON can spell as 1e999', () => {
    expect(errorsIn('{"type":"Feature","properties":{},"geometry":{"type":"Point","coordinates":[1e999,25]}}')[0].column).toBe('geometry.coordinates.0');
  });

  test('values that are neither words nor numbers', () => {
    expect(errorsIn(collection(feature(point(-48, 25), { name: { en: 'Inn' }, people: [5] })))).toEqual([
      { row: 1, column: 'name', message: 'found {"en":"Inn"}, expected words' },
      { row: 1, column: 'people', message: 'found [5], expected a number' },
    ]);
  });

  test('a duplicate id', () => {
    expect(errorsIn(collection(feature(square(-48, 25), {}, { id: 'Z1' }), feature(square(-46, 25), {}, { id: 'Z1' })), 'zones')[0]).toMatchObject({ row: 2, column: 'id' });
  });
});

test.each([
  ['JSON that breaks off', '{"type":"FeatureCollection","features":[', 'this is not JSON'],
  ['JSON of another kind', '{"hello":1}', 'expected a GeoJSON FeatureCollection'],
  ['a list', '[1,2]', 'expected a GeoJSON FeatureCollection'],
  ['an empty collection', '{"type":"FeatureCollection","features":[]}', 'holds no features'],
  ['a collection of numbers', '{"type":"FeatureCollection","features":[3]}', 'expected a GeoJSON Feature'],
])('%s', (_, text, message) => {
  expect(errorsIn(text)[0].message).toContain(message);
});
