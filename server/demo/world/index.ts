import type { FeatureCollection, LineString, MultiPolygon, Polygon } from 'geojson';
import { landOf, makeCoast } from './coast';
import { makeBridges, makeDepots, makeHospitals, makeShelters } from './facilities';
import type { Site } from './facilities';
import { makeNetwork } from './network';
import type { Feeder, Substation } from './network';
import { inventedNames, townsOf } from './places';
import type { Town } from './places';
import { makePopulation } from './population';
import type { Cell } from './population';
import { makeProperties } from './properties';
import type { Property } from './properties';
import { makeRandom } from './random';
import { makeRoads } from './roads';
import { makeTerrain } from './terrain';
import { makeZones } from './zones';
import type { ZoneFeature } from './zones';

export { placeOf } from './frame';

/** An invented country and all that stands in it. */
export interface World {
  coast: FeatureCollection<Polygon>;
  towns: Town[];
  cells: Cell[];
  zones: FeatureCollection<Polygon | MultiPolygon, ZoneFeature['properties']>;
  hospitals: Site[];
  shelters: Site[];
  bridges: Site[];
  depots: Site[];
  substations: Substation[];
  feeders: FeatureCollection<LineString, Feeder['properties']>;
  properties: Property[];
}

/** Nobody lives on marsh islets and skerries. */
const LEAST_LIVED_KM2 = 15;

/** The country of a seed. Each part has a stream of chance of its own, so that a change in one leaves the others as they were. */
export function makeWorld(seed: number): World {
  const terrain = makeTerrain(seed);
  const coast = makeCoast(terrain);
  const land = landOf(coast);
  const lived = landOf(coast, LEAST_LIVED_KM2);
  const towns = townsOf(land);
  const roads = makeRoads(terrain, land, towns);
  const cells = makePopulation(terrain, lived, towns, roads, seed + 1);
  const names = inventedNames();
  const zones = makeZones(terrain, land, coast, towns, cells, names, seed + 2);
  const partOf = (step: number) => ({ towns, cells, roads, land, random: makeRandom(seed + step) });
  return {
    coast,
    towns,
    cells,
    zones,
    hospitals: makeHospitals(partOf(10)),
    shelters: makeShelters(partOf(11)),
    bridges: makeBridges(partOf(12)),
    depots: makeDepots(partOf(13)),
    ...makeNetwork(cells, names, land, makeRandom(seed + 14)),
    properties: makeProperties(towns, cells, land, makeRandom(seed + 15)),
  };
}
