import type { Feature, FeatureCollection, LineString } from 'geojson';
import type { Site } from './facilities';
import { placeOf } from './frame';
import type { Km } from './frame';
import type { Land } from './land';
import type { Cell } from './population';
import type { Random } from './random';
import { drawer, near, nearestIndex, numbered, spread } from './spots';

const SUBSTATIONS = 420;
const FEEDERS = 3000;
const PEOPLE_PER_CUSTOMER = 2.3;
const POLES_PER_KM = 21;
/** Poles of side lines, by customer. */
const SERVICE_POLES = 0.11;
const LEAST_FEEDERS = 3;

export interface Substation extends Site {
  /** Customers served. */
  people: number;
}

export type Feeder = Feature<LineString, { id: string; name: string; class: 'feeder'; people: number; poles: number; substation: string }>;

/** Substations where people are, and the feeders that leave each for the cells it serves. */
export function makeNetwork(cells: readonly Cell[], names: Iterator<string, never>, land: Land, random: Random): { substations: Substation[]; feeders: FeatureCollection<LineString, Feeder['properties']> } {
  const spots = spread(SUBSTATIONS, 1.3, drawer(cells, ({ people }) => people ** 0.72, random), land, random);
  const served: Cell[][] = spots.map(() => []);
  for (const cell of cells) served[nearestIndex(spots, cell)].push(cell);
  const counts = feederCounts(served.map(customersOf));
  const features: Feeder[] = [];
  const substations = spots.map((spot, i): Substation => {
    const id = numbered('U', i, 3);
    const name = names.next().value;
    const lines = sectors(spot, served[i], counts[i]).map((sector) => feederOf(spot, sector, land, random));
    lines.forEach(({ geometry, ...load }, k) => features.push({ type: 'Feature', properties: { id: numbered('F', features.length, 4), name: `${name} feeder ${k + 1}`, class: 'feeder', ...load, substation: id }, geometry }));
    return { name: `${name} Substation`, ...placeOf(spot.x, spot.y), id, class: 'substation', people: lines.reduce((sum, { people }) => sum + people, 0) };
  });
  return { substations, feeders: { type: 'FeatureCollection', features } };
}

const customersOf = (cells: readonly Cell[]): number => Math.max(1, Math.round(cells.reduce((sum, { people }) => sum + people, 0) / PEOPLE_PER_CUSTOMER));

/** Feeders by substation, in proportion to the square root of its customers, adding up to the total (largest remainders). */
function feederCounts(customers: readonly number[]): number[] {
  const weights = customers.map(Math.sqrt);
  const sum = weights.reduce((total, weight) => total + weight, 0);
  const exact = weights.map((weight) => LEAST_FEEDERS + ((FEEDERS - LEAST_FEEDERS * customers.length) * weight) / sum);
  const counts = exact.map(Math.floor);
  const left = FEEDERS - counts.reduce((total, count) => total + count, 0);
  const byRemainder = exact.map((value, i) => ({ i, remainder: value - Math.floor(value) })).sort((a, b) => b.remainder - a.remainder || a.i - b.i);
  for (const { i } of byRemainder.slice(0, left)) counts[i]++;
  return counts;
}

/** A feeder's cells, and its share of them where there are fewer cells than feeders. */
interface Sector {
  cells: Cell[];
  share: number;
}

/** Cuts the cells around a substation into wedges of about equal people. */
function sectors(spot: Km, cells: readonly Cell[], count: number): Sector[] {
  const round = [...cells].sort((a, b) => Math.atan2(a.y - spot.y, a.x - spot.x) - Math.atan2(b.y - spot.y, b.x - spot.x));
  if (round.length < count) return Array.from({ length: count }, (_, k) => shared(round, k, count, spot));
  const total = round.reduce((sum, { people }) => sum + people, 0);
  const wedges: Sector[] = Array.from({ length: count }, () => ({ cells: [], share: 1 }));
  let sum = 0;
  round.forEach((cell, i) => {
    const byPeople = Math.floor((count * (sum + cell.people / 2)) / total);
    // Each wedge keeps at least one cell.
    const wedge = Math.max(count - (round.length - i), Math.min(byPeople, i));
    wedges[Math.min(count - 1, wedge)].cells.push(cell);
    sum += cell.people;
  });
  return wedges.map((wedge, k) => (wedge.cells.length > 0 ? wedge : shared(round, k, count, spot)));
}

function shared(round: readonly Cell[], k: number, count: number, spot: Km): Sector {
  if (round.length === 0) return { cells: [{ ...spot, people: 0 }], share: 1 };
  return { cells: [round[k % round.length]], share: round.length / count };
}

/** A line from the substation outward through its wedge, its customers and its poles. */
function feederOf(spot: Km, { cells, share }: Sector, land: Land, random: Random): { people: number; poles: number; geometry: LineString } {
  const outward = [...cells].sort((a, b) => away(spot, a) - away(spot, b));
  const stops = Math.min(7, Math.max(2, outward.length));
  const line: Km[] = [spot];
  for (let stop = 0; stop < stops; stop++) {
    const from = Math.floor((stop * outward.length) / stops);
    line.push(near(middleOf(outward.slice(from, Math.max(from + 1, Math.floor(((stop + 1) * outward.length) / stops)))), land, random));
  }
  const lengthKm = line.slice(1).reduce((sum, to, i) => sum + away(line[i], to), 0);
  const people = Math.max(1, Math.round(customersOf(cells) * share));
  const coordinates = line.map(({ x, y }) => placeOf(x, y)).map(({ lat, lon }) => [lon, lat]);
  return { people, poles: Math.max(8, Math.round(lengthKm * POLES_PER_KM + people * SERVICE_POLES)), geometry: { type: 'LineString', coordinates } };
}

/** The cell nearest to the middle of some: a line through these runs down its wedge instead of from side to side. */
function middleOf(cells: readonly Cell[]): Cell {
  const middle = { x: cells.reduce((sum, { x }) => sum + x, 0) / cells.length, y: cells.reduce((sum, { y }) => sum + y, 0) / cells.length };
  return cells[nearestIndex(cells, middle)];
}

const away = (a: Km, b: Km): number => Math.hypot(a.x - b.x, a.y - b.y);
