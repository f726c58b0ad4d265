import { bbox, booleanPointInPolygon } from '@turf/turf';
import type { Feature, FeatureCollection, MultiPolygon, Polygon } from 'geojson';
import { placeOf } from './frame';
import type { Km } from './frame';
import type { Land } from './land';
import type { Cell } from './population';
import type { Town } from './places';
import { squared } from './shapes';
import type { Terrain } from './terrain';
import { lowLand, shareOut } from './zoneShapes';

const ZONES = 60;

export type ZoneFeature = Feature<Polygon | MultiPolygon, { id: string; name: string; clearanceHours: number; clearanceSource: string }>;

/** The city has more zones than towns: its docks and its north. */
const QUARTERS: readonly (Km & { name: string })[] = [
  { name: 'Ansel Docks', x: -7, y: -38 },
  { name: 'Port Ansel N', x: -13, y: -8 },
];

/** Evacuation zones over the coastal and low land, each around a town or a village. */
export function makeZones(terrain: Terrain, land: Land, coast: FeatureCollection<Polygon>, towns: readonly Town[], cells: readonly Cell[], names: Iterator<string, never>, seed: number): FeatureCollection<Polygon | MultiPolygon, ZoneFeature['properties']> {
  const low = cells.filter(({ x, y }) => terrain.heightM(x, y, land.inlandKm(x, y)) < 18);
  const seeds = seedsOf(towns, low, names);
  const shapes = shareOut(lowLand(terrain, land, coast), seeds, seed);
  return {
    type: 'FeatureCollection',
    features: shapes.map((geometry, i): ZoneFeature => {
      const { name } = seeds[i];
      return { type: 'Feature', properties: { id: `Z${String(i + 1).padStart(2, '0')}`, name, ...clearance(peopleIn(geometry, cells), wayOut(seeds[i], towns)) }, geometry };
    }),
  };
}

/** Towns near low ground, then the low place farthest from all so far, nearer ones counting more where people are dense. */
function seedsOf(towns: readonly Town[], low: readonly Cell[], names: Iterator<string, never>): (Km & { name: string })[] {
  const seeds: (Km & { name: string })[] = [...towns.filter((town) => low.some((cell) => squared(cell, town) < 9)), ...QUARTERS];
  // A small island is one zone.
  const away = low.map((cell) => (onIsle(cell, towns) ? 0 : Math.min(...seeds.map((other) => squared(cell, other)))));
  while (seeds.length < ZONES) {
    let best = 0;
    for (let i = 1; i < low.length; i++) if (away[i] * (low[i].people + 20) > away[best] * (low[best].people + 20)) best = i;
    const { x, y } = low[best];
    seeds.push({ name: names.next().value, x, y });
    low.forEach((cell, i) => (away[i] = Math.min(away[i], squared(cell, low[best]))));
  }
  return seeds;
}

function peopleIn(geometry: Polygon | MultiPolygon, cells: readonly Cell[]): number {
  const [west, south, east, north] = bbox(geometry);
  return cells.reduce((sum, { x, y, people }) => {
    const { lat, lon } = placeOf(x, y);
    return lon >= west && lon <= east && lat >= south && lat <= north && booleanPointInPolygon([lon, lat], geometry) ? sum + people : sum;
  }, 0);
}

const onIsle = (place: Km, towns: readonly Town[]): boolean => towns.some((town) => town.isle && squared(town, place) < 27 ** 2);

type WayOut = 'ferry' | 'causeway' | 'road';

/** Towns that one low road leads out of. */
const CAUSEWAYS = ['Orrin Bar', 'Culver Sands', 'Brackwater', 'Saltmarsh'];

const wayOut = (seed: Km & { name: string }, towns: readonly Town[]): WayOut => (onIsle(seed, towns) ? 'ferry' : CAUSEWAYS.includes(seed.name) ? 'causeway' : 'road');

/** Hours to start moving, then queues: 600 vehicles an hour a lane were seen in real evacuations (TRB 90th annual meeting, 2011, paper 11-4115). */
function clearance(people: number, way: WayOut): { clearanceHours: number; clearanceSource: string } {
  const start = people < 10_000 ? 2.5 : 4;
  const lanes = way === 'causeway' ? 2 : 2 + Math.floor(people / 26_000);
  const hours = start + (people * 0.7) / 2.5 / (600 * lanes) + (way === 'ferry' ? 7 : 0);
  const by = way === 'ferry' ? 'and 7 h for ferries' : `${lanes} lanes out${way === 'causeway' ? ' by causeway' : ''}`;
  return {
    clearanceHours: Math.min(18, Math.max(3, Math.round(hours * 2) / 2)),
    clearanceSource: `Exercise plan: ${start} h to start, 70 % leave, 2.5 to a vehicle, 600 vehicles an hour a lane, ${by}`,
  };
}
