import { bbox, feature, featureCollection, intersect, point, polygon, voronoi } from '@turf/turf';
import type { Feature, FeatureCollection, MultiPolygon, Polygon, Position } from 'geojson';
import { contourKm, inDegrees } from './coast';
import { gridOf, round4, sampleGrid } from './frame';
import type { Km } from './frame';
import type { Land } from './land';
import { makeNoise } from './noise';
import { ringAreaKm2, thinned, untangled } from './rings';
import type { Terrain } from './terrain';

/** Ground that lies lower is in a zone. */
const LOW_M = 21;
/** Pieces smaller than this are nobody's: rounding alone could make them cross a neighbour. */
const LEAST_PIECE_DEG2 = 2e-5;
const LEAST_PATCH_KM2 = 40;

/** The low land of the country, island by island: what the zones share out. */
export function lowLand(terrain: Terrain, land: Land, coast: FeatureCollection<Polygon>): Feature<Polygon | MultiPolygon>[] {
  const grid = gridOf(0.8);
  const lowness = sampleGrid(grid, (x, y) => {
    const inland = land.inlandKm(x, y);
    return inland <= 0 ? LOW_M : LOW_M - terrain.heightM(x, y, inland);
  });
  const patches = contourKm(grid, lowness, 0)
    .filter(([outer]) => Math.abs(ringAreaKm2(outer)) > LEAST_PATCH_KM2)
    .map((rings) => rings.filter((ring) => Math.abs(ringAreaKm2(ring)) > LEAST_PATCH_KM2).map((ring) => inDegrees(thinned(ring, 0.2))));
  const low = feature<MultiPolygon>({ type: 'MultiPolygon', coordinates: patches });
  return coast.features.flatMap((island) => intersect(featureCollection<Polygon | MultiPolygon>([island, low])) ?? []);
}

/** Shares low land out by the nearest seed, its borders bent as rivers and lanes bend them. One shape a seed, none over another. */
export function shareOut(low: readonly Feature<Polygon | MultiPolygon>[], seeds: readonly Km[], seed: number): (Polygon | MultiPolygon)[] {
  const cells = voronoi(featureCollection(seeds.map(({ x, y }) => point([x, y]))), { bbox: [-240, -150, 240, 150] });
  const bend = bending(seed);
  return cells.features.map(({ geometry }) => {
    const cell = polygon([inDegrees(bend(geometry.coordinates[0]))]);
    const pieces = low.filter((part) => overlap(bbox(cell), bbox(part))).flatMap((part) => piecesOf(intersect(featureCollection<Polygon | MultiPolygon>([cell, part]))));
    const kept = pieces.map((rings) => rings.map(tidy)).filter(([outer]) => Math.abs(ringAreaKm2(outer)) > LEAST_PIECE_DEG2);
    return kept.length === 1 ? { type: 'Polygon', coordinates: kept[0] } : { type: 'MultiPolygon', coordinates: kept };
  });
}

const piecesOf = (shape: Feature<Polygon | MultiPolygon> | null): Position[][][] =>
  shape === null ? [] : shape.geometry.type === 'Polygon' ? [shape.geometry.coordinates] : shape.geometry.coordinates;

/** Four decimals, no corner twice in a row, and no loops that rounding has made. */
const tidy = (ring: Position[]): Position[] =>
  untangled(ring.map(([lon, lat]) => [round4(lon), round4(lat)]).filter(([lon, lat], i, all) => i === 0 || lon !== all[i - 1][0] || lat !== all[i - 1][1]));

const overlap = (a: readonly number[], b: readonly number[]): boolean => a[0] <= b[2] && b[0] <= a[2] && a[1] <= b[3] && b[1] <= a[3];

/** Bends a ring by a smooth shift of the plane, which keeps neighbours neighbours; an edge gets the same corners from either side. */
function bending(seed: number): (ring: readonly Position[]) => Position[] {
  const shiftX = makeNoise(seed);
  const shiftY = makeNoise(seed + 1);
  const shifted = (x: number, y: number): Position => [
    x + 2 * shiftX(x / 11, y / 11) + 0.5 * shiftX(x / 3, y / 3 + 60),
    y + 2 * shiftY(x / 11, y / 11) + 0.5 * shiftY(x / 3, y / 3 + 60),
  ];
  return (ring) => {
    const bent = ring.slice(1).flatMap((to, i) => {
      const from = ring[i];
      const forward = from[0] < to[0] || (from[0] === to[0] && from[1] < to[1]);
      const [a, b] = forward ? [from, to] : [to, from];
      const parts = Math.max(1, Math.round(Math.hypot(b[0] - a[0], b[1] - a[1]) / 0.8));
      const corners = Array.from({ length: parts + 1 }, (_, k) => shifted(a[0] + ((b[0] - a[0]) * k) / parts, a[1] + ((b[1] - a[1]) * k) / parts));
      return (forward ? corners : corners.reverse()).slice(0, -1);
    });
    return [...bent, bent[0]];
  };
}
