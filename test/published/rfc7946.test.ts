import { describe, expect, test } from 'vitest';
import { compileExposure, readLayer } from '../../lib/exposure';

// RFC 7946, The GeoJSON Format (Butler et al., 2016).
describe('RFC 7946', () => {
  const holed = [
    [[100, 0], [101, 0], [101, 1], [100, 1], [100, 0]],
    [[100.8, 0.8], [100.8, 0.2], [100.2, 0.2], [100.2, 0.8], [100.8, 0.8]],
  ];

  test('the example of section 1.5: a point, a line and a polygon with their properties', () => {
    const text = `{
      "type": "FeatureCollection",
      "features": [{
        "type": "Feature", "geometry": { "type": "Point", "coordinates": [102.0, 0.5] }, "properties": { "prop0": "value0" }
      }, {
        "type": "Feature", "geometry": { "type": "LineString", "coordinates": [[102.0, 0.0], [103.0, 1.0], [104.0, 0.0], [105.0, 1.0]] },
        "properties": { "prop0": "value0", "prop1": 0.0 }
      }, {
        "type": "Feature", "geometry": { "type": "Polygon", "coordinates": [[[100.0, 0.0], [101.0, 0.0], [101.0, 1.0], [100.0, 1.0], [100.0, 0.0]]] },
        "properties": { "prop0": "value0", "prop1": { "this": "that" } }
      }]
    }`;
    const reading = readLayer(text, { kind: 'assets' });
    if (!reading.ok || reading.data.kind !== 'assets') throw new Error('not read');
    expect(reading.data.assets.map(({ geometry, properties }) => [geometry.type, properties])).toEqual([
      ['Point', { prop0: 'value0' }],
      ['LineString', { prop0: 'value0', prop1: 0 }],
      ['Polygon', { prop0: 'value0', prop1: { this: 'that' } }],
    ]);
  });

  const zonesOf = (...geometries: object[]) => {
    const reading = readLayer(JSON.stringify({ type: 'FeatureCollection', features: geometries.map((geometry) => ({ type: 'Feature', properties: {}, geometry })) }), { kind: 'zones' });
    if (!reading.ok) throw new Error(JSON.stringify(reading.errors));
    return { layerId: 'zones', data: reading.data };
  };
  const peopleAt = (...places: [lat: number, lon: number][]) => {
    const reading = readLayer(`lat,lon,people\n${places.map(([lat, lon]) => `${lat},${lon},1`).join('\n')}`, { kind: 'population' });
    if (!reading.ok) throw new Error(JSON.stringify(reading.errors));
    return { layerId: 'people', data: reading.data };
  };

  test('appendix A.3: the second ring is a hole, and who lives in it lives outside', () => {
    const { zones, peopleTotal } = compileExposure([zonesOf({ type: 'Polygon', coordinates: holed }), peopleAt([0.1, 100.1], [0.5, 100.5], [0.9, 100.5])], () => 'open');
    expect([zones[0].people, peopleTotal]).toEqual([2, 3]);
  });

  test('appendix A.6: a polygon of two parts, one with a hole', () => {
    const parts = { type: 'MultiPolygon', coordinates: [[[[102, 2], [103, 2], [103, 3], [102, 3], [102, 2]]], holed] };
    const { zones } = compileExposure([zonesOf(parts), peopleAt([2.5, 102.5], [0.1, 100.1], [0.5, 100.5], [2.5, 101.5])], () => 'open');
    expect(zones[0].people).toBe(2);
  });

  test('section 3.1.9: a rectangle across the 180th meridian, cut in two as shown there, holds the people on both sides', () => {
    const cut = { type: 'MultiPolygon', coordinates: [[[[180, 40], [180, 50], [170, 50], [170, 40], [180, 40]]], [[[-170, 40], [-170, 50], [-180, 50], [-180, 40], [-170, 40]]]] };
    const { zones } = compileExposure([zonesOf(cut), peopleAt([45, 175], [45, -175], [45, 0], [45, 165])], () => 'open');
    expect(zones[0].people).toBe(2);
  });

  test('section 3.1.9: a line cut in two there is one asset', () => {
    const line = { type: 'MultiLineString', coordinates: [[[170, 45], [180, 45]], [[-180, 45], [-170, 45]]] };
    const reading = readLayer(JSON.stringify({ type: 'Feature', properties: {}, geometry: line }), { kind: 'assets' });
    if (!reading.ok) throw new Error(JSON.stringify(reading.errors));
    const { assets, places } = compileExposure([{ layerId: 'lines', data: reading.data }], () => 'open');
    expect(assets.count).toBe(1);
    expect(Math.max(...Array.from(places.lon, (lon) => 180 - Math.abs(lon)))).toBeLessThanOrEqual(10);
  });

  test('section 3.1.6: a ring has four positions or more, and its last is its first', () => {
    const read = (ring: number[][]) => readLayer(JSON.stringify({ type: 'Feature', properties: {}, geometry: { type: 'Polygon', coordinates: [ring] } }), { kind: 'zones' }).ok;
    expect([read(holed[0]), read(holed[0].slice(0, 4)), read([[0, 0], [1, 0], [0, 0]])]).toEqual([true, false, false]);
  });
});
