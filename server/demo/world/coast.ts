import { contours } from 'd3-contour';
import type { Feature, FeatureCollection, MultiPolygon, Polygon, Position } from 'geojson';
import { makeLandMask } from '../../../lib/geo';
import type { LandMask } from '../../../lib/geo';
import { gridOf, latOf, lonOf, round4, sampleGrid } from './frame';
import type { Grid } from './frame';
import { ringAreaKm2, thinned } from './rings';
import type { Terrain } from './terrain';

const STEP_KM = 0.4;
/** Islands and lakes smaller than this are left out. */
const LEAST_ISLAND_KM2 = 0.5;
const LEAST_LAKE_KM2 = 3;
/** Corners closer than this to the line without them are left out. */
const TOLERANCE_KM = 0.07;

export const BOUNDS = { west: -52, south: 23, east: -45, north: 27.5 };

/** The country's coast, largest island first; lakes are holes. */
export function makeCoast(terrain: Terrain): FeatureCollection<Polygon> {
  const offshore = distanceFromBody(terrain);
  const grid = gridOf(STEP_KM);
  const field = sampleGrid(grid, (x, y) => {
    const land = terrain.land(x, y);
    return land > 0 ? land : Math.max(land, terrain.barrier(x, y, -offshore.coastDistanceKm(latOf(y), lonOf(x))));
  });
  const polygons = contourKm(grid, field, 0)
    .map((rings) => rings.map((ring) => thinned(ring, TOLERANCE_KM)))
    .map(([outer, ...lakes]) => [outer, ...lakes.filter((lake) => Math.abs(ringAreaKm2(lake)) >= LEAST_LAKE_KM2)])
    .filter(([outer]) => Math.abs(ringAreaKm2(outer)) >= LEAST_ISLAND_KM2)
    .sort(([a], [b]) => Math.abs(ringAreaKm2(b)) - Math.abs(ringAreaKm2(a)));
  return { type: 'FeatureCollection', features: polygons.map((rings): Feature<Polygon> => ({ type: 'Feature', properties: {}, geometry: { type: 'Polygon', coordinates: rings.map(inDegrees) } })) };
}

/** Polygons where a field is above a level, in km; outer ring first. */
export function contourKm({ west, south, stepKm, columns, rows }: Grid, field: Float64Array, level: number): Position[][][] {
  const { coordinates } = contours().size([columns, rows]).contour(field as unknown as number[], level);
  // A sample stands for a pixel half a step across in d3-contour.
  return coordinates.map((rings) => rings.map((ring) => ring.map(([column, row]) => [west + (column - 0.5) * stepKm, south + (row - 0.5) * stepKm])));
}

export const inDegrees = (ring: Position[]): Position[] => ring.map(([x, y]) => [round4(lonOf(x)), round4(latOf(y))]);

export const landMaskOf = (coast: FeatureCollection<Polygon>, cellKm: number): LandMask => makeLandMask(multi(coast.features.map(({ geometry }) => geometry.coordinates)), BOUNDS, cellKm);

const multi = (coordinates: Position[][][]): MultiPolygon => ({ type: 'MultiPolygon', coordinates });

function distanceFromBody(terrain: Terrain): LandMask {
  const grid = gridOf(1);
  const rings = contourKm(grid, sampleGrid(grid, terrain.body), 0);
  return makeLandMask(multi(rings.map((polygon) => polygon.map(inDegrees))), BOUNDS, 1);
}
