import type { Km } from './frame';
import { mix } from './noise';

/** A line whose width changes along it: `[x, y, half width]` in km at each bend. */
export type Stroke = readonly (readonly [number, number, number])[];

/** Km inside the stroke, negative outside: the greatest over its straight pieces. */
export function insideStroke(stroke: Stroke, x: number, y: number): number {
  let best = -Infinity;
  for (let i = 1; i < stroke.length; i++) {
    const [ax, ay, aw] = stroke[i - 1];
    const [bx, by, bw] = stroke[i];
    const dx = bx - ax;
    const dy = by - ay;
    const t = Math.min(1, Math.max(0, ((x - ax) * dx + (y - ay) * dy) / (dx * dx + dy * dy)));
    best = Math.max(best, mix(aw, bw, t) - Math.hypot(x - ax - t * dx, y - ay - t * dy));
  }
  return best;
}

/** The greater of two fields with the crease between them filled over `reach` km. */
export function join(a: number, b: number, reach: number): number {
  const overlap = Math.max(0, reach - Math.abs(a - b)) / reach;
  return Math.max(a, b) + (overlap * overlap * reach) / 4;
}

export const cut = (a: number, b: number, reach: number): number => -join(-a, b, reach);

export const squared = (a: Km, b: Km): number => (a.x - b.x) ** 2 + (a.y - b.y) ** 2;
