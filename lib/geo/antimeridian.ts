import { booleanPointInPolygon, rewind } from '@turf/turf';
import type { MultiPolygon, Polygon, Position } from 'geojson';

type Rings = Position[][];

/**
 * The same area with every longitude in [-180, 180] and no edge across the antimeridian (RFC 7946, section 3.1.9), exterior
 * rings counterclockwise. Longitudes may come run on past 180, or jumping from one side to the other: an edge always takes the
 * shorter way round. A ring around a pole is closed over the pole.
 */
export function cutAtAntimeridian(area: Polygon | MultiPolygon): MultiPolygon {
  const polygons = area.type === 'Polygon' ? [area.coordinates] : area.coordinates;
  // Outlines are joined by their sense, so it is put right before the cut.
  const { coordinates } = rewind({ type: 'MultiPolygon', coordinates: polygons.map((rings) => alongside(rings.map(unwrapped))) } as MultiPolygon) as MultiPolygon;
  return { type: 'MultiPolygon', coordinates: coordinates.flatMap(intoTurns) };
}

/** The ring without jumps; closed over the pole where it goes round the globe. */
function unwrapped(ring: Position[]): Position[] {
  let shift = 0;
  const run = ring.map(([lon, lat], i): Position => {
    if (i > 0) shift -= 360 * Math.round((lon - ring[i - 1][0]) / 360);
    return [lon + shift, lat];
  });
  const [first] = run;
  const last = run[run.length - 1];
  if (run.length > 2 && Math.abs(last[0] - first[0]) > 180) {
    const pole = run.reduce((sum, [, lat]) => sum + lat, 0) > 0 ? 90 : -90;
    run.push([last[0], pole], [first[0], pole], [...first]);
  }
  return run;
}

/** Holes on the same turn of the globe as their exterior ring. */
function alongside(rings: Rings): Rings {
  const [west, east] = extent([rings[0]]);
  return rings.map((ring, i) => {
    if (i === 0) return ring;
    const [from, to] = extent([ring]);
    const shift = 360 * Math.round(((west + east) / 2 - (from + to) / 2) / 360);
    return ring.map(([lon, lat]): Position => [lon + shift, lat]);
  });
}

function extent(rings: Rings): [west: number, east: number] {
  let west = Infinity;
  let east = -Infinity;
  for (const ring of rings) {
    for (const [lon] of ring) {
      if (lon < west) west = lon;
      if (lon > east) east = lon;
    }
  }
  return [west, east];
}

/** Cuts a polygon on continuous longitudes at every odd multiple of 180 and turns each piece back. */
function intoTurns(rings: Rings): Rings[] {
  const [west, east] = extent(rings);
  const pieces: Rings[] = [];
  let rest = [rings];
  for (let turn = Math.floor((west + 180) / 360); rest.length > 0; turn++) {
    const edge = 180 + 360 * turn;
    const here = east > edge ? rest.flatMap((polygon) => half(polygon, edge, -1)) : rest;
    rest = east > edge ? rest.flatMap((polygon) => half(polygon, edge, 1)) : [];
    for (const polygon of here) pieces.push(polygon.map((ring) => ring.map(([lon, lat]): Position => [lon - 360 * turn, lat])));
  }
  return pieces;
}

/** A stretch of outline on one side of the cut, from where it enters to where it leaves. */
interface Chain {
  positions: Position[];
  enters: number;
  leaves: number;
}

/**
 * The part of a polygon west (`side` -1) or east (1) of a meridian. Outlines are cut into chains; the inside of the polygon lies
 * along the meridian between the first and second crossing, the third and fourth, and so on, which says how chains join.
 */
function half(rings: Rings, edge: number, side: -1 | 1): Rings[] {
  const inside = (lon: number): boolean => (side === 1 ? lon >= edge : lon < edge);
  const chains: Chain[] = [];
  const whole: Rings = [];
  for (const ring of rings) {
    const kept = ring.slice(0, -1);
    const start = kept.findIndex(([lon], i) => inside(lon) && !inside(kept[(i + kept.length - 1) % kept.length][0]));
    if (start < 0) {
      if (inside(kept[0][0])) whole.push(ring);
      continue;
    }
    let chain: Chain | null = null;
    for (let n = 0; n < kept.length; n++) {
      const here = kept[(start + n) % kept.length];
      const before = kept[(start + n + kept.length - 1) % kept.length];
      const next = kept[(start + n + 1) % kept.length];
      if (!inside(here[0])) continue;
      if (!inside(before[0])) {
        const enters = latAt(before, here, edge);
        chain = { positions: [[edge, enters]], enters, leaves: NaN };
        chains.push(chain);
      }
      chain!.positions.push(here);
      if (!inside(next[0])) {
        chain!.leaves = latAt(here, next, edge);
        chain!.positions.push([edge, chain!.leaves]);
      }
    }
  }
  return withHoles([...joined(chains)], whole, rings[0]);
}

const latAt = (a: Position, b: Position, lon: number): number => a[1] + ((b[1] - a[1]) * (lon - a[0])) / (b[0] - a[0]);

function* joined(chains: Chain[]): Generator<Position[]> {
  const ends = chains.flatMap((chain, i) => [{ i, lat: chain.enters, leaves: false }, { i, lat: chain.leaves, leaves: true }]).sort((a, b) => a.lat - b.lat);
  const entersAfter = new Map<number, number>();
  for (let k = 0; k + 1 < ends.length; k += 2) {
    // Where outlines touch on the meridian the order of equal latitudes is open: one leaves, one enters.
    if (ends[k].leaves === ends[k + 1].leaves && k + 2 < ends.length) [ends[k + 1], ends[k + 2]] = [ends[k + 2], ends[k + 1]];
    const [leaving, entering] = ends[k].leaves ? [ends[k], ends[k + 1]] : [ends[k + 1], ends[k]];
    entersAfter.set(leaving.i, entering.i);
  }
  const used = new Set<number>();
  for (let first = 0; first < chains.length; first++) {
    if (used.has(first)) continue;
    const ring: Position[] = [];
    for (let at: number | undefined = first; at !== undefined && !used.has(at); at = entersAfter.get(at)) {
      used.add(at);
      ring.push(...chains[at].positions);
    }
    ring.push([...ring[0]]);
    const tidy = ring.filter((position, i) => i === 0 || position[0] !== ring[i - 1][0] || position[1] !== ring[i - 1][1]);
    if (tidy.length >= 4) yield tidy;
  }
}

/** Rings the meridian did not touch: the exterior, or holes that belong to one of the new exteriors. */
function withHoles(exteriors: Rings, whole: Rings, exterior: Position[]): Rings[] {
  const polygons: Rings[] = (whole.includes(exterior) ? [exterior, ...exteriors] : exteriors).map((ring) => [ring]);
  for (const ring of whole) {
    if (ring === exterior) continue;
    const home = polygons.find((rings) => booleanPointInPolygon(ring[0], { type: 'Polygon', coordinates: [rings[0]] }));
    home?.push(ring);
  }
  return polygons;
}
