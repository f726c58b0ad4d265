import type { Position } from 'geojson';

/** Area in the square of the unit, positive counter-clockwise. */
export function ringAreaKm2(ring: readonly Position[]): number {
  let twice = 0;
  for (let i = 1; i < ring.length; i++) twice += ring[i - 1][0] * ring[i][1] - ring[i][0] * ring[i - 1][1];
  return twice / 2;
}

/** A closed ring with corners left out that lie within `tolerance` of the line without them (Douglas and Peucker, 1973). */
export function thinned(ring: readonly Position[], tolerance: number): Position[] {
  const kept = new Uint8Array(ring.length);
  // Halves of the ring are thinned apart: its ends are one place.
  const half = ring.length >> 1;
  kept[0] = kept[half] = kept[ring.length - 1] = 1;
  const spans: [number, number][] = [[0, half], [half, ring.length - 1]];
  for (let span = spans.pop(); span; span = spans.pop()) {
    const [from, to] = span;
    let farthest = -1;
    let most = tolerance;
    for (let i = from + 1; i < to; i++) {
      const away = fromLine(ring[i], ring[from], ring[to]);
      if (away > most) [most, farthest] = [away, i];
    }
    if (farthest < 0) continue;
    kept[farthest] = 1;
    spans.push([from, farthest], [farthest, to]);
  }
  return ring.filter((_, i) => kept[i]);
}

function fromLine(p: Position, a: Position, b: Position): number {
  const dx = b[0] - a[0];
  const dy = b[1] - a[1];
  const length2 = dx * dx + dy * dy;
  const t = length2 === 0 ? 0 : Math.min(1, Math.max(0, ((p[0] - a[0]) * dx + (p[1] - a[1]) * dy) / length2));
  return Math.hypot(p[0] - a[0] - t * dx, p[1] - a[1] - t * dy);
}

/** How far apart along a ring two sides may be that rounding alone has made to cross. */
const TANGLE_REACH = 6;

/** A closed ring without the small loops that rounding can make: the corners between two sides that cross are left out. */
export function untangled(ring: readonly Position[]): Position[] {
  const corners = ring.slice(0, -1);
  for (let i = 0; i < corners.length; i++) {
    for (let reach = 2; reach <= TANGLE_REACH && reach < corners.length - 1; reach++) {
      const n = corners.length;
      if (!cross(corners[i], corners[(i + 1) % n], corners[(i + reach) % n], corners[(i + reach + 1) % n])) continue;
      const loop = new Set(Array.from({ length: reach }, (_, k) => (i + 1 + k) % n));
      return untangled(closed(corners.filter((_, k) => !loop.has(k))));
    }
  }
  return closed(corners);
}

/** A closed ring that passes no corner twice: a narrow neck whose sides rounding has brought together stays open. */
export function withoutTouches(ring: readonly Position[]): Position[] {
  const seen = new Set<string>();
  return closed(ring.slice(0, -1).filter(([x, y]) => !seen.has(`${x},${y}`) && seen.add(`${x},${y}`)));
}

const closed = (corners: Position[]): Position[] => [...corners, corners[0]];

const side = (a: Position, b: Position, p: Position): number => Math.sign((b[0] - a[0]) * (p[1] - a[1]) - (b[1] - a[1]) * (p[0] - a[0]));

/** Whether two sides meet at all, in their ends too. */
const cross = (a: Position, b: Position, c: Position, d: Position): boolean => side(a, b, c) * side(a, b, d) <= 0 && side(c, d, a) * side(c, d, b) <= 0;
