import type { Position } from 'geojson';
import { worldX, worldY } from './mercator';

const STEP_PX = 2;
/** From here on lines are drawn as they are. */
const WHOLE_FROM_LEVEL = 11;

/** A line without the points that at a zoom level lie within a pixel or so of the one before; first and last stay. */
export function thinLine(line: Position[], level: number): Position[] {
  if (level >= WHOLE_FROM_LEVEL || line.length < 3) return line;
  const zoom = level + 1;
  const kept = [line[0]];
  let [x, y] = [worldX(line[0][0], zoom), worldY(line[0][1], zoom)];
  for (let i = 1; i < line.length - 1; i++) {
    const [nextX, nextY] = [worldX(line[i][0], zoom), worldY(line[i][1], zoom)];
    if ((nextX - x) ** 2 + (nextY - y) ** 2 < STEP_PX ** 2) continue;
    kept.push(line[i]);
    [x, y] = [nextX, nextY];
  }
  kept.push(line[line.length - 1]);
  return kept;
}

/** Remembers what was made of an object at each zoom level, for as long as the object lives. */
export function byLevel<K extends object, V>(make: (of: K, level: number) => V): (of: K, level: number) => V {
  const cache = new WeakMap<K, Map<number, V>>();
  return (of, level) => {
    const held = cache.get(of) ?? new Map<number, V>();
    cache.set(of, held);
    const known = held.get(level);
    if (known !== undefined) return known;
    const made = make(of, level);
    held.set(level, made);
    return made;
  };
}

export type Segment = [Position, Position];

/** Lines as pieces of two points: for hairlines, which show no joints, far cheaper to draw than paths. */
export const segmentsOf = (lines: readonly Position[][]): Segment[] => lines.flatMap((line) => line.slice(1).map((place, i): Segment => [line[i], place]));
