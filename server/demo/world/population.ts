import KDBush from 'kdbush';
import { gridOf, sampleGrid } from './frame';
import type { Km } from './frame';
import type { Land } from './land';
import { makeNoise, octaves, ramp } from './noise';
import { SAFE_KM } from './places';
import type { Town } from './places';
import type { Roads } from './roads';
import type { Terrain } from './terrain';

export interface Cell extends Km {
  people: number;
}

const STEP_KM = 0.84;
const TOTAL_PEOPLE = 2_400_000;
/** How the people are shared out: in towns, along roads between them, and thinly over the rest. */
const SHARES = { towns: 0.8, roads: 0.13, country: 0.07 };

/** People by cell of about 0.84 km: only where somebody lives. */
export function makePopulation(terrain: Terrain, land: Land, towns: readonly Town[], roads: Roads, seed: number): Cell[] {
  const grid = gridOf(STEP_KM);
  const patch = octaves(makeNoise(seed), 5, 0.7);
  const nearRoad = nearestRoad(roads);
  const kinds: Km[] = [];
  const shares = { towns: [] as number[], roads: [] as number[], country: [] as number[] };
  sampleGrid(grid, (x, y) => {
    const inland = land.inlandKm(x, y);
    if (inland < SAFE_KM) return 0;
    const height = terrain.heightM(x, y, inland);
    const texture = Math.exp(1.1 * patch(x / 9, y / 9));
    const flat = ramp(460, 40, height);
    kinds.push({ x, y });
    shares.towns.push(townPeople(towns, x + 1.3 * patch(x / 7 + 30, y / 7), y + 1.3 * patch(x / 7, y / 7 + 30)) * texture);
    shares.roads.push((0.08 + flat) * texture * Math.exp(-nearRoad(x, y) / 1.6));
    shares.country.push(texture ** 2.6 * (0.02 + flat) * (1 + 2 * Math.exp(-inland / 2.5)));
    return 0;
  });
  const scale = (values: number[], share: number): number => (share * TOTAL_PEOPLE) / values.reduce((sum, value) => sum + value, 0);
  const [town, road, country] = [scale(shares.towns, SHARES.towns), scale(shares.roads, SHARES.roads), scale(shares.country, SHARES.country)];
  return kinds
    .map((km, i) => ({ ...km, people: Math.round(town * shares.towns[i] + road * shares.roads[i] + country * shares.country[i]) }))
    .filter(({ people }) => people > 0);
}

/** People per square km: a dense heart and wide suburbs, both wider in a larger town. */
function townPeople(towns: readonly Town[], x: number, y: number): number {
  let sum = 0;
  for (const town of towns) {
    const away = Math.hypot(x - town.x, y - town.y);
    const widthKm = 0.9 * (town.people / 10_000) ** 0.36;
    if (away > 14 * widthKm) continue;
    sum += (town.people / widthKm ** 2) * (0.75 * Math.exp(-away / widthKm) + 0.06 * Math.exp(-away / (2.6 * widthKm)));
  }
  return sum;
}

function nearestRoad({ lines }: Roads): (x: number, y: number) => number {
  const points = lines.flat();
  const index = new KDBush(points.length);
  for (const { x, y } of points) index.add(x, y);
  index.finish();
  return (x, y) => index.within(x, y, 8).reduce((least, i) => Math.min(least, Math.hypot(points[i].x - x, points[i].y - y)), 8);
}
