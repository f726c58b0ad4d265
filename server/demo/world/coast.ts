import { contours } from 'd3-contour';
import type { Feature, FeatureCollection, Polygon, Position } from 'geojson';
import { gridOf, kmOf, latOf, lonOf, round4, sampleGrid } from './frame';
import type { Grid } from './frame';
import { makeLand } from './land';
import type { Land } from './land';
import { mix } from './noise';
import { ringAreaKm2, thinned, withoutTouches } from './rings';
import type { Terrain } from './terrain';

const STEP_KM = 0.4;
/** Islands and lakes smaller than this are left out. */
const LEAST_ISLAND_KM2 = 0.5;
const LEAST_LAKE_KM2 = 3;
/** Corners closer than this to the line without them are left out. */
const TOLERANCE_KM = 0.07;

/** The country’s coast, largest island first; lakes are holes. Outer rings turn counter-clockwise (RFC 7946); contours come the other way. */
export function makeCoast(terrain: Terrain): FeatureCollection<Polygon> {
  const offshoreKm = offshoreOf(terrain);
  const grid = gridOf(STEP_KM);
  const field = sampleGrid(grid, (x, y) => {
    const land = terrain.land(x, y);
    return land > 0 ? land : Math.max(land, terrain.barrier(x, y, offshoreKm(x, y)));
  });
  const polygons = contourKm(grid, field, 0)
    .map((rings) => rings.map((ring) => thinned(ring, TOLERANCE_KM)))
    .map(([outer, ...lakes]) => [outer, ...lakes.filter((lake) => Math.abs(ringAreaKm2(lake)) >= LEAST_LAKE_KM2)])
    .filter(([outer]) => Math.abs(ringAreaKm2(outer)) >= LEAST_ISLAND_KM2)
    .sort(([a], [b]) => Math.abs(ringAreaKm2(b)) - Math.abs(ringAreaKm2(a)));
  return { type: 'FeatureCollection', features: polygons.map((rings): Feature<Polygon> => ({ type: 'Feature', properties: {}, geometry: { type: 'Polygon', coordinates: rings.map((ring) => withoutTouches(inDegrees(ring)).reverse()) } })) };
}

/** Polygons where a field is above a level, in km; outer ring first. */
export function contourKm({ west, south, stepKm, columns, rows }: Grid, field: Float64Array, level: number): Position[][][] {
  const { coordinates } = contours().size([columns, rows]).contour(field as unknown as number[], level);
  // A sample stands for a pixel half a step across in d3-contour.
  return coordinates.map((rings) => rings.map((ring) => ring.map(([column, row]) => [west + (column - 0.5) * stepKm, south + (row - 0.5) * stepKm])));
}

export const inDegrees = (ring: Position[]): Position[] => ring.map(([x, y]) => [round4(lonOf(x)), round4(latOf(y))]);

/** The land of a coast in degrees, as it ships; islets smaller than `leastKm2` are left out. */
export function landOf(coast: FeatureCollection<Polygon>, leastKm2 = 0): Land {
  const islands = coast.features.map(({ geometry }) => geometry.coordinates.map((ring) => ring.map(([lon, lat]) => [kmOf(lat, lon).x, kmOf(lat, lon).y])));
  return makeLand(islands.filter(([outer]) => ringAreaKm2(outer) >= leastKm2));
}

/** How far (km) a place is from the body of the main island: from samples a km apart, since the barrier coast asks everywhere. */
function offshoreOf(terrain: Terrain): (x: number, y: number) => number {
  const grid = gridOf(1);
  const body = makeLand(contourKm(grid, sampleGrid(grid, terrain.body), 0));
  const samples = sampleGrid(grid, (x, y) => -body.inlandKm(x, y));
  return (x, y) => {
    const column = Math.min(grid.columns - 2, Math.floor((x - grid.west) / grid.stepKm));
    const row = Math.min(grid.rows - 2, Math.floor((y - grid.south) / grid.stepKm));
    const fx = (x - grid.west) / grid.stepKm - column;
    const i = row * grid.columns + column;
    return mix(mix(samples[i], samples[i + 1], fx), mix(samples[i + grid.columns], samples[i + grid.columns + 1], fx), (y - grid.south) / grid.stepKm - row);
  };
}
