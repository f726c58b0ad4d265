import { describe, expect, test } from 'vitest';
import { codes, errorsOf, read } from './fixtures';

type Json = Record<string, unknown>;
const pointFeature = (lon: number, lat: number, properties: Json): Json => ({ type: 'Feature', geometry: { type: 'Point', coordinates: [lon, lat] }, properties });
const FIRST = pointFeature(-55.2, 24.1, { validAt: '2031-09-19T09:00:00Z', maxWindKt: 70 });
const SECOND = pointFeature(-56.2, 24.9, { validAt: '2031-09-19T18:00:00Z', maxWindKt: 80 });
const collection = (features: Json[], members: Json = {}): string => JSON.stringify({ type: 'FeatureCollection', ...members, features }, null, 1);
const line = (properties: Json): string => JSON.stringify({ type: 'Feature', geometry: { type: 'LineString', coordinates: [[-55.2, 24.1], [-56.2, 24.9]] }, properties }, null, 1);
const TIMES = ['2031-09-19T09:00:00Z', '2031-09-19T18:00:00Z'];
const POINTS = [
  { validAt: '2031-09-19T09:00:00Z', lat: 24.1, lon: -55.2, maxWindKt: 70 },
  { validAt: '2031-09-19T18:00:00Z', lat: 24.9, lon: -56.2, maxWindKt: 80 },
];

describe('points', () => {
  test('take their place from the geometry and the rest from the properties', () => {
    expect(read(collection([FIRST, SECOND])).advisory.points).toEqual(POINTS);
  });

  test('may repeat the place in the properties, which is not read', () => {
    const again = pointFeature(-55.2, 24.1, { validAt: '2031-09-19T09:00:00Z', maxWindKt: 70, latitude: 1, lon: 2 });
    expect(read(collection([again, SECOND])).advisory.points).toEqual(POINTS);
  });

  test('may have radii as an advisory writes them, or spread out, in nautical miles or kilometres', () => {
    const ring = (properties: Json): unknown => read(collection([pointFeature(-55.2, 24.1, { time: TIMES[0], maxWindKt: 70, ...properties })])).advisory.points[0]!.radiiNm;
    const expected = { '34': { ne: 100, se: 50, sw: 0, nw: 25 } };
    expect(ring({ radiiNm: { '34': { ne: 100, se: 50, sw: 0, nw: 25 } } })).toEqual(expected);
    expect(ring({ radiiKm: { '34': { ne: 185.2, se: 92.6, sw: 0, nw: 46.3 } } })).toEqual(expected);
    expect(ring({ r34NeNm: 100, r34SeNm: 50, r34SwNm: 0, r34NwNm: 25 })).toEqual(expected);
  });

  test('may be a single Feature', () => {
    expect(read(JSON.stringify(FIRST)).advisory.points).toEqual([POINTS[0]]);
  });

  test('may have a height, which is not read', () => {
    const high = { ...FIRST, geometry: { type: 'Point', coordinates: [-55.2, 24.1, 10] } };
    expect(read(collection([high])).advisory.points).toEqual([POINTS[0]]);
  });
});

describe('a line with times', () => {
  test('reads as the same points', () => {
    expect(read(line({ times: TIMES, maxWindKt: [70, 80] })).advisory.points).toEqual(POINTS);
  });

  test('may stand in a collection', () => {
    expect(read(collection([JSON.parse(line({ times: TIMES, maxWindKt: [70, 80] })) as Json])).advisory.points).toEqual(POINTS);
  });

  test('may not know a value everywhere', () => {
    expect(read(line({ times: TIMES, maxWindKt: [70, 80], gustKt: [85, null] })).advisory.points).toEqual([{ ...POINTS[0], gustKt: 85 }, POINTS[1]]);
  });

  test('needs one value for each position', () => {
    expect(errorsOf(line({ times: TIMES.slice(1), maxWindKt: [70, 80] }))[0]).toMatchObject({ line: 17, message: 'times has 1 values for 2 positions: give one for each' });
  });

  test('needs lists at all', () => {
    expect(errorsOf(line({ time: TIMES[0], maxWindKt: 70 }))[0]!.message).toContain('a line needs lists');
  });
});

describe('what is said of the whole advisory', () => {
  const expected = { storm: { id: 'AL092031', name: 'Maro' }, number: '5', centre: 'Some Centre', issuedAt: '2031-09-19T09:00:00Z', averaging: '10-min' };
  const flat = { stormId: 'AL092031', stormName: 'Maro', number: 5, centre: 'Some Centre', issuedAt: '2031-09-19T09:00:00Z', averaging: '10-min' };

  test('may stand in the properties of any point', () => {
    expect(read(collection([{ ...FIRST, properties: { ...(FIRST.properties as Json), ...flat } }, SECOND])).advisory).toMatchObject(expected);
  });

  test('may stand in properties of the collection', () => {
    const { advisory, warnings } = read(collection([FIRST, SECOND], { properties: flat }));
    expect(advisory).toMatchObject(expected);
    expect(warnings).toEqual([]);
  });

  test('may stand beside the features, named as in an advisory', () => {
    expect(read(collection([FIRST, SECOND], { ...expected })).advisory).toMatchObject(expected);
  });

  test('may stand beside the lists of a line', () => {
    expect(read(line({ times: TIMES, maxWindKt: [70, 80], ...flat })).advisory).toMatchObject(expected);
  });

  test('the name of a layer is not the name of the storm', () => {
    const { advisory, warnings } = read(collection([FIRST], { name: 'track_points' }));
    expect(advisory.storm.name).toBe('Unnamed');
    expect(codes(warnings)).toContain('column-unknown');
  });

  test('markup in a name stays text', () => {
    expect(read(collection([FIRST], { properties: { stormName: '<img src=x onerror=alert(1)>' } })).advisory.storm.name).toBe('<img src=x onerror=alert(1)>');
  });
});

describe('what cannot be read is named by line and column', () => {
  test('a text that breaks off', () => {
    expect(errorsOf('{"type": "FeatureCollection",\n "features": [{"type": "Feature"')[0]).toEqual({ line: 2, column: 33, message: 'expected a comma or }, but found the end of the file' });
  });

  test('a polygon', () => {
    const polygon = { type: 'Feature', geometry: { type: 'Polygon', coordinates: [] }, properties: {} };
    expect(errorsOf(collection([polygon]))[0]).toMatchObject({ path: 'features[0].geometry.type', line: 7, message: expect.stringContaining('expected a Point or a LineString') as string });
  });

  test('a geometry without properties', () => {
    expect(errorsOf('{"type":"LineString","coordinates":[[1,2],[3,4]]}')[0]!.message).toContain('holds no features');
  });

  test('a collection of nothing', () => {
    expect(errorsOf(collection([]))[0]).toMatchObject({ path: 'features', message: expect.stringContaining('no feature is given') as string });
  });

  test('lines among points', () => {
    expect(errorsOf(collection([FIRST, JSON.parse(line({ times: TIMES })) as Json]))[0]!.message).toContain('found 1 lines among 2 features');
  });

  test('latitude and longitude the wrong way round, where that shows', () => {
    expect(errorsOf(collection([pointFeature(24.1, -155.2, { validAt: TIMES[0], maxWindKt: 70 })]))[0]).toMatchObject({ path: 'points[0].lat', line: 6, message: 'latitude lies between -90 and 90; found -155.2' });
  });

  test('a wind of -5 kt', () => {
    expect(errorsOf(collection([pointFeature(-55.2, 24.1, { validAt: TIMES[0], maxWindKt: -5 })]))[0]).toMatchObject({ path: 'points[0].maxWindKt', line: 15, message: 'wind cannot be negative; found -5' });
  });

  test('a wind that is text', () => {
    expect(errorsOf(collection([pointFeature(-55.2, 24.1, { validAt: TIMES[0], maxWindKt: 'strong' })]))[0]).toMatchObject({ line: 15, message: expect.stringContaining('"strong" is not a number') as string });
  });

  test('no wind', () => {
    expect(errorsOf(collection([pointFeature(-55.2, 24.1, { validAt: TIMES[0] })]))[0]!.message).toBe('no property gives the maximum sustained wind: name one maxWindKt, maxWindMs, maxWindKmh or maxWindMph');
  });

  test('two points at one time', () => {
    expect(errorsOf(collection([FIRST, FIRST]))[0]).toMatchObject({ path: 'points[1].validAt', message: expect.stringContaining('two points at') as string });
  });

  test('times that go back', () => {
    expect(errorsOf(collection([SECOND, FIRST]))[0]).toMatchObject({ path: 'points[1].validAt', message: expect.stringContaining('in order of time') as string });
  });
});
