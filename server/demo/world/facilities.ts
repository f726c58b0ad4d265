import { placeOf } from './frame';
import type { Km } from './frame';
import type { Land } from './land';
import type { Town } from './places';
import type { Cell } from './population';
import type { Random } from './random';
import type { Roads } from './roads';
import { drawer, near, nearestTown, numbered, spread, unique } from './spots';

/** A row of a layer of places. */
export interface Site {
  name: string;
  lat: number;
  lon: number;
  id: string;
  class: string;
}

const HOSPITALS = 45;
const SHELTERS = 160;
const BRIDGES = 24;
const DEPOTS = 14;
const HOSPITAL_KINDS = ['General Hospital', 'Infirmary', 'Community Hospital', 'Heart Clinic', 'Children’s Hospital', 'Rehabilitation Hospital'];
const SHELTER_KINDS = ['Secondary School', 'Primary School', 'Sports Hall', 'Town Hall', 'Community Hall', 'College', 'Market Hall', 'Library'];

interface World {
  towns: readonly Town[];
  cells: readonly Cell[];
  roads: Roads;
  land: Land;
  random: Random;
}

const site = (kind: string, letter: string, digits: number, index: number, name: string, { x, y }: Km): Site => ({ name, ...placeOf(x, y), id: numbered(letter, index, digits), class: kind });

export function makeHospitals({ towns, cells, land, random }: World): (Site & { beds: number; generatorHours: number })[] {
  const taken = new Set<string>();
  return spread(HOSPITALS, 3.2, drawer(cells, ({ people }) => people ** 0.9, random), land, random).map((spot, i) => {
    const town = nearestTown(towns, spot);
    const kind = HOSPITAL_KINDS.find((name) => !taken.has(`${town.name} ${name}`)) ?? 'Hospital';
    const beds = 5 * Math.round(random.around(kind === 'General Hospital' ? 36 + Math.sqrt(town.people) / 8 : 18, 0.35));
    return { ...site('hospital', 'H', 2, i, unique(taken, `${town.name} ${kind}`), spot), beds, generatorHours: random.pick([24, 48, 48, 72, 72, 96]) };
  });
}

export function makeShelters({ towns, cells, land, random }: World): (Site & { places: number; windRatingKt: number })[] {
  const taken = new Set<string>();
  return spread(SHELTERS, 1.6, drawer(cells, ({ people }) => people ** 0.8, random), land, random).map((spot, i) => ({
    ...site('shelter', 'S', 3, i, unique(taken, `${nearestTown(towns, spot).name} ${random.pick(SHELTER_KINDS)}`), spot),
    places: 10 * Math.round(random.around(52, 0.6)),
    windRatingKt: random.pick([80, 95, 95, 110, 110, 110, 125, 140]),
  }));
}

/** The longest crossings of the road net. Closing winds are those of the exercise: practice varies from bridge to bridge. */
export function makeBridges({ towns, roads, random }: World): (Site & { lengthM: number; closingWindKt: number })[] {
  const taken = new Set<string>();
  const longest = [...roads.crossings].sort((a, b) => b.lengthKm - a.lengthKm).slice(0, BRIDGES);
  return longest.map((crossing, i) => ({
    ...site('bridge', 'B', 2, i, unique(taken, `${nearestTown(towns, crossing).name} ${random.pick(['Bridge', 'Crossing', 'Causeway'])}`), crossing),
    lengthM: 10 * Math.round(crossing.lengthKm * 100),
    closingWindKt: random.pick([35, 35, 40, 40, 45]),
  }));
}

export function makeDepots({ towns, land, random }: World): (Site & { hostsCrews: number })[] {
  const taken = new Set<string>();
  return [...towns].filter(({ isle }) => !isle).sort((a, b) => b.people - a.people).slice(0, DEPOTS).map((town, i) => ({
    ...site('depot', 'D', 2, i, unique(taken, `${town.name} Depot`), near(town, land, random, 4)),
    hostsCrews: 5 * Math.round(random.around(7, 0.4)),
  }));
}
