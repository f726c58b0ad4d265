import { gridOf } from './frame';
import type { Km } from './frame';
import type { Land } from './land';
import { mix } from './noise';
import { SAFE_KM } from './places';
import type { Town } from './places';
import type { Terrain } from './terrain';

/** A water crossing: its bank on the side of the larger town, and how far the other bank is. */
export interface Crossing extends Km {
  lengthKm: number;
}

export interface Roads {
  lines: Km[][];
  crossings: Crossing[];
}

const STEP_KM = 1;
const WATER_COST = 4;
/** Two roads over one water share its bridge. */
const APART_KM = 2.5;
const STEPS = [[1, 0], [-1, 0], [0, 1], [0, -1], [1, 1], [1, -1], [-1, 1], [-1, -1]] as const;

/** Roads between towns: each to its nearest that the net does not hold yet, and cross-links where the way round is long. */
export function makeRoads(terrain: Terrain, land: Land, towns: readonly Town[]): Roads {
  const grid = gridOf(STEP_KM);
  const inland = new Float64Array(grid.columns * grid.rows);
  const cost = new Float64Array(grid.columns * grid.rows);
  for (let i = 0; i < cost.length; i++) {
    const { x, y } = kmAt(i);
    inland[i] = land.inlandKm(x, y);
    cost[i] = inland[i] > 0 ? 1 + terrain.heightM(x, y, inland[i]) / 70 : WATER_COST;
  }
  const lines: Km[][] = [];
  const crossings: Crossing[] = [];
  for (const [a, b] of links(towns.filter(({ isle }) => !isle))) {
    const cells = cheapestWay(cellOf(a), cellOf(b));
    for (const cell of cells) cost[cell] = Math.min(cost[cell], 0.45 * (inland[cell] > 0 ? 1 : WATER_COST));
    const line = cells.map(kmAt);
    lines.push(line);
    for (const found of crossingsOf(land, line)) if (!crossings.some((other) => Math.hypot(other.x - found.x, other.y - found.y) < APART_KM)) crossings.push(found);
  }
  return { lines, crossings };

  function kmAt(i: number): Km {
    return { x: grid.west + (i % grid.columns) * STEP_KM, y: grid.south + Math.floor(i / grid.columns) * STEP_KM };
  }
  function cellOf({ x, y }: Km): number {
    return Math.round((y - grid.south) / STEP_KM) * grid.columns + Math.round((x - grid.west) / STEP_KM);
  }
  /** Dijkstra (1959) over the grid, with the nearest open cells kept in buckets of cost. */
  function cheapestWay(from: number, to: number): number[] {
    const spent = new Float64Array(cost.length).fill(Infinity);
    const back = new Int32Array(cost.length).fill(-1);
    const buckets: number[][] = [[from]];
    spent[from] = 0;
    for (let b = 0; b < buckets.length; b++) {
      for (const i of buckets[b] ?? []) {
        if (i === to) return wayBack(back, to);
        if (Math.floor(spent[i] * 4) !== b) continue;
        for (const [dx, dy] of STEPS) {
          const j = i + dx + dy * grid.columns;
          if (j < 0 || j >= cost.length) continue;
          const reached = spent[i] + 0.5 * (cost[i] + cost[j]) * (dx !== 0 && dy !== 0 ? Math.SQRT2 : 1);
          if (reached >= spent[j]) continue;
          spent[j] = reached;
          back[j] = i;
          (buckets[Math.floor(reached * 4)] ??= []).push(j);
        }
      }
    }
    throw new Error('No way between two towns.');
  }
}

/** Where a road leaves land and comes ashore again, asked every quarter of a km. */
function crossingsOf(land: Land, line: readonly Km[]): Crossing[] {
  const found: Crossing[] = [];
  let bank: Km | null = null;
  let wet = false;
  for (let k = 1; k < line.length; k++) {
    for (let part = 0; part < 1; part += 0.25) {
      const here = { x: mix(line[k - 1].x, line[k].x, part), y: mix(line[k - 1].y, line[k].y, part) };
      if (land.inlandKm(here.x, here.y) < SAFE_KM) {
        wet = true;
        continue;
      }
      if (wet && bank) found.push({ ...bank, lengthKm: Math.hypot(here.x - bank.x, here.y - bank.y) });
      wet = false;
      bank = here;
    }
  }
  return found;
}

function wayBack(back: Int32Array, to: number): number[] {
  const way = [to];
  while (back[way[way.length - 1]] >= 0) way.push(back[way[way.length - 1]]);
  return way.reverse();
}

/** A spanning tree of the towns, then each pair close together that no third town lies between (Gabriel and Sokal, 1969). */
function links(towns: readonly Town[]): [Town, Town][] {
  const far = (a: Town, b: Town): number => Math.hypot(a.x - b.x, a.y - b.y);
  const pairs = towns.flatMap((a, i) => towns.slice(i + 1).map((b): [Town, Town] => [a, b])).sort(([a, b], [c, d]) => far(a, b) - far(c, d));
  const group = new Map(towns.map((town, i) => [town, i]));
  return pairs.filter(([a, b]) => {
    const [ga, gb] = [group.get(a)!, group.get(b)!];
    if (ga === gb) return far(a, b) < 95 && !towns.some((c) => c !== a && c !== b && far(a, c) ** 2 + far(b, c) ** 2 < far(a, b) ** 2);
    for (const [town, g] of group) if (g === gb) group.set(town, ga);
    return true;
  });
}
