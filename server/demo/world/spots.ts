import type { Km } from './frame';
import type { Land } from './land';
import { SAFE_KM } from './places';
import type { Town } from './places';
import type { Cell } from './population';
import type { Random } from './random';
import { squared } from './shapes';

/** Half the width of a population cell. */
const HALF_CELL_KM = 0.42;

/** A place in or beside a cell, on land. */
export function near(cell: Km, land: Land, random: Random, reachKm = HALF_CELL_KM): Km {
  for (let k = 0; k < 40; k++) {
    const x = cell.x + random.between(-reachKm, reachKm);
    const y = cell.y + random.between(-reachKm, reachKm);
    if (land.inlandKm(x, y) >= SAFE_KM) return { x, y };
  }
  return cell;
}

/** Draws cells in proportion to a weight. */
export function drawer(cells: readonly Cell[], weight: (cell: Cell) => number, random: Random): () => Cell {
  let sum = 0;
  const running = Float64Array.from(cells, (cell) => (sum += weight(cell)));
  return () => cells[random.weighted(running)];
}

/** Places drawn by weight, no two nearer than `apartKm`, so that services spread as they do. */
export function spread(count: number, apartKm: number, draw: () => Cell, land: Land, random: Random): Km[] {
  const spots: Km[] = [];
  for (let tries = 0; spots.length < count; tries++) {
    if (tries > count * 2000) throw new Error(`Only ${spots.length} of ${count} places lie ${apartKm} km apart.`);
    const spot = near(draw(), land, random);
    if (!spots.some((other) => squared(other, spot) < apartKm ** 2)) spots.push(spot);
  }
  return spots;
}

export const nearestTown = (towns: readonly Town[], spot: Km): Town => towns.reduce((best, town) => (squared(town, spot) < squared(best, spot) ? town : best));

/** Index of the nearest of some places. */
export function nearestIndex(places: readonly Km[], spot: Km): number {
  let best = 0;
  for (let i = 1; i < places.length; i++) if (squared(places[i], spot) < squared(places[best], spot)) best = i;
  return best;
}

/** The name as it is, or with a number when it is taken. */
export function unique(taken: Set<string>, name: string): string {
  let free = name;
  for (let k = 2; taken.has(free); k++) free = `${name} ${k}`;
  taken.add(free);
  return free;
}

export const numbered = (letter: string, index: number, digits: number): string => `${letter}${String(index + 1).padStart(digits, '0')}`;
