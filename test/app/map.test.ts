import { WebMercatorViewport } from '@deck.gl/core';
import { readFileSync } from 'node:fs';
import { area, bboxClip, booleanPointInPolygon, multiPolygon } from '@turf/turf';
import type { FeatureCollection } from 'geojson';
import { feature } from 'topojson-client';
import type { GeometryCollection, Topology } from 'topojson-specification';
import { describe, expect, test } from 'vitest';
import { boundsOf, fitted, kmPerPixel, panned, project, unproject } from '../../app/map/mercator';
import { clipPolygons, withoutBox } from '../../app/map/clip';
import { graticule } from '../../app/map/graticule';
import { placeLabels } from '../../app/map/labels';
import { scaleLength } from '../../app/map/scaleBar';
import { thinLine } from '../../app/map/thinLine';
import { outlinesOf, polygonHolds, polygonsOf, runOnPolygon } from '../../app/map/shapes';

function naturalEarth() {
  const topology = JSON.parse(readFileSync(new URL('../../public/land/land-50m.json', import.meta.url), 'utf8')) as Topology<{ land: GeometryCollection }>;
  return (feature(topology, topology.objects.land) as FeatureCollection).features.flatMap((one) => polygonsOf(one.geometry));
}

const size = { width: 900, height: 600 };
const none = { top: 0, right: 0, bottom: 0, left: 0 };

describe('the map and the labels over it agree', () => {
  test.each([
    [-55.2, 25.1, 6.3],
    [0, -41.9, 2.1],
    [178.4, 19.7, 7.8],
  ])('a place is projected where deck.gl draws it (camera at %d, %d)', (lon, lat, zoom) => {
    const viewport = new WebMercatorViewport({ ...size, longitude: lon, latitude: lat, zoom });
    for (const [dLon, dLat] of [[0, 0], [0.4, 0.3], [-1.1, 0.7]]) {
      const [x, y] = project({ lon, lat, zoom }, size, lon + dLon, lat + dLat);
      const [deckX, deckY] = viewport.project([lon + dLon, lat + dLat]);
      expect(x).toBeCloseTo(deckX, 2);
      expect(y).toBeCloseTo(deckY, 2);
    }
  });

  test('a pixel names the place that is drawn there', () => {
    const camera = { lon: 179.5, lat: -17, zoom: 5 };
    const [x, y] = project(camera, size, -178.5, -16);
    const [lon, lat] = unproject(camera, size, x, y);
    expect(lon).toBeCloseTo(-178.5, 9);
    expect(lat).toBeCloseTo(-16, 9);
  });

  test('one pixel spans the published ground resolution at the equator: 78,271.5 m at zoom 0 of a 512 px world (OGC Two Dimensional Tile Matrix Set, WebMercatorQuad, on the 6378.137 km sphere)', () => {
    expect((kmPerPixel({ lon: 0, lat: 0, zoom: 0 }) * 1000 * 6378.137) / 6371.0088).toBeCloseTo(78_271.517, 1);
  });
});

describe('the view', () => {
  test('fits all of a box inside the padding', () => {
    const bounds = { west: -59, south: 22, east: -53, north: 27.5 };
    const camera = fitted(bounds, size, { top: 20, right: 30, bottom: 90, left: 40 }, 12);
    const [left, top] = project(camera, size, bounds.west, bounds.north);
    const [right, bottom] = project(camera, size, bounds.east, bounds.south);
    expect(left).toBeGreaterThanOrEqual(39.9);
    expect(right).toBeLessThanOrEqual(870.1);
    expect(top).toBeGreaterThanOrEqual(19.9);
    expect(bottom).toBeLessThanOrEqual(510.1);
    expect(Math.min(Math.abs(left - 40) + Math.abs(right - 870), Math.abs(top - 20) + Math.abs(bottom - 510))).toBeLessThan(0.5);
  });

  test('goes the short way round where places lie on both sides of the 180th meridian', () => {
    const bounds = boundsOf([[178, -18], [-179, -16]])!;
    expect(bounds.east - bounds.west).toBeCloseTo(3, 9);
    expect(fitted(bounds, size, none).lon).toBeCloseTo(179.5, 6);
  });

  test('panning by the width of the world comes back to the same place', () => {
    expect(panned({ lon: 10, lat: 0, zoom: 2 }, 512 * 4, 0).lon).toBeCloseTo(10, 9);
  });
});

test('graticule lines stand at least 110 px apart and are named by round degrees', () => {
  for (const zoom of [2, 4.4, 6, 7.3, 9]) {
    const lines = graticule({ lon: -55, lat: 25, zoom }, size);
    expect((lines.step * 512 * 2 ** zoom) / 360).toBeGreaterThanOrEqual(110);
    for (const lat of lines.lats) expect(Math.abs(lat / lines.step - Math.round(lat / lines.step))).toBeLessThan(1e-6);
  }
});

test('a scale bar of 100 km is 54 nmi long, as a nautical mile is 1.852 km', () => {
  const bar = scaleLength(1, 'km', 149);
  expect(bar).toEqual({ value: 100, px: 100 });
  const nautical = scaleLength(1, 'nmi', 149);
  expect(nautical.value).toBe(50);
  expect(nautical.px).toBeCloseTo(92.6, 6);
});

describe('labels', () => {
  const label = (id: string, x: number, y: number, priority = 0) => ({ id, x, y, text: 'Port Ansel', priority, size: 13, gap: 8 });

  test('never overlap; the more important one stays', () => {
    const placed = placeLabels(Array.from({ length: 30 }, (_, i) => label(String(i), 300 + i, 300, i)), size);
    expect(placed[0].id).toBe('29');
    const boxes = placed.map(({ textX, textY, anchor, text, size: height }) => {
      const width = text.length * height * 0.6;
      const left = anchor === 'start' ? textX : anchor === 'end' ? textX - width : textX - width / 2;
      return { left, right: left + width, top: textY - height / 2, bottom: textY + height / 2 };
    });
    boxes.forEach((a, i) => boxes.slice(i + 1).forEach((b) => expect(a.right < b.left || b.right < a.left || a.bottom < b.top || b.bottom < a.top).toBe(true)));
  });

  test('turn to the left of a point at the right edge of the map', () => {
    expect(placeLabels([label('a', 880, 300)], size)[0].anchor).toBe('end');
  });
});

describe('land around a view', () => {
  const bounds = { west: -90, east: -60, south: 20, north: 40 };
  const land = naturalEarth().map(runOnPolygon);

  test('is the land that turf clips to the same box', () => {
    const ours = area(multiPolygon(clipPolygons(land, bounds)));
    const turfs = land.reduce((sum, polygon) => sum + area(bboxClip({ type: 'Polygon', coordinates: polygon }, [-90, 20, -60, 40])), 0);
    expect(Math.abs(ours / turfs - 1)).toBeLessThan(1e-9);
  });

  test('reaches over the 180th meridian', () => {
    const fiji = clipPolygons(land, { west: 170, east: 190, south: -25, north: -10 });
    expect(fiji.flat(2).some(([lon]) => lon < 180)).toBe(true);
    expect(fiji.flat(2).some(([lon]) => lon > 180)).toBe(true);
  });

  test('has no shore where it was cut', () => {
    const lines = withoutBox(outlinesOf(clipPolygons(land, bounds)), bounds);
    for (const line of lines) for (let i = 1; i < line.length; i++) expect(line[i][0] === -90 && line[i - 1][0] === -90).toBe(false);
  });
});

describe('a line from afar', () => {
  const line = Array.from({ length: 1000 }, (_, i) => [i / 10_000, Math.sin(i / 50) / 500]);

  test('keeps its ends, and no point strays from it by two pixels', () => {
    const thin = thinLine(line, 7);
    expect(thin.length).toBeLessThan(line.length / 3);
    expect([thin[0], thin[thin.length - 1]]).toEqual([line[0], line[999]]);
    const camera = { lon: 0, lat: 0, zoom: 8 };
    for (const [lon, lat] of line) {
      const [x, y] = project(camera, size, lon, lat);
      expect(Math.min(...thin.map(([a, b]) => Math.hypot(project(camera, size, a, b)[0] - x, project(camera, size, a, b)[1] - y)))).toBeLessThan(2);
    }
  });

  test('is drawn whole when one is near', () => {
    expect(thinLine(line, 11)).toBe(line);
  });
});

describe('polygons', () => {
  const holed = [
    [[0, 0], [10, 0], [10, 10], [0, 10], [0, 0]],
    [[4, 4], [6, 4], [6, 6], [4, 6], [4, 4]],
  ];

  test('a place is inside a polygon exactly where turf says so', () => {
    for (let lon = -0.95; lon < 11; lon += 0.7)
      for (let lat = -0.95; lat < 11; lat += 0.7)
        expect(polygonHolds(holed, lon, lat), `${lon} ${lat}`).toBe(booleanPointInPolygon([lon, lat], { type: 'Polygon', coordinates: holed }));
  });

  test('no coast of Natural Earth jumps across the map, but for the one round the south pole', () => {
    const polygons = naturalEarth();
    const jumps = (all: typeof polygons) => all.filter((polygon) => polygon[0].some(([lon], i) => i > 0 && Math.abs(lon - polygon[0][i - 1][0]) > 180));
    expect(jumps(polygons).length).toBeGreaterThan(1);
    const left = jumps(polygons.map(runOnPolygon));
    expect(left).toHaveLength(1);
    expect(Math.max(...left[0][0].map(([, lat]) => lat))).toBeLessThan(-60);
    for (const [outer] of polygons.map(runOnPolygon)) expect(Math.abs((Math.min(...outer.map(([lon]) => lon)) + Math.max(...outer.map(([lon]) => lon))) / 2)).toBeLessThanOrEqual(180);
  });

  test('the cut at the 180th meridian is not drawn as an outline', () => {
    const half = [[[170, 0], [180, 0], [180, 5], [170, 5], [170, 0]]];
    expect(outlinesOf([half])).toEqual([[[170, 0], [180, 0]], [[180, 5], [170, 5], [170, 0]]]);
  });
});
