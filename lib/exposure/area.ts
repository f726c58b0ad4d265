import type { MultiPolygon, Polygon, Position } from 'geojson';

/** A polygon or several, ready to be asked; degrees, edges straight in longitude and latitude (RFC 7946, 3.1.1). */
export interface Area {
  west: number;
  south: number;
  east: number;
  north: number;
  /** Even-odd rule. A place on a border that two areas share lies in exactly one of them, the one to its east or north. */
  contains(lat: number, lon: number): boolean;
  /** Longitudes at which a parallel enters and leaves the area, in order, as pairs. */
  chordsAt(lat: number): number[];
}

const EDGES_PER_BAND = 4;

/**
 * Edges lie in bands of latitude, so that a question looks only at those near its parallel: `edges` holds four numbers an edge
 * (lower end, then upper end, so that neighbours cut a parallel at the same longitude), and `inBand[first[b] .. first[b + 1])`
 * lists the edges that touch band b.
 */
export function makeArea(geometry: Polygon | MultiPolygon): Area {
  const rings = geometry.type === 'Polygon' ? geometry.coordinates : geometry.coordinates.flat();
  const edges = edgesOf(rings);
  const count = edges.length / 4;
  let [west, south, east, north] = [Infinity, Infinity, -Infinity, -Infinity];
  for (const ring of rings) {
    for (const [lon, lat] of ring) {
      if (lon < west) west = lon;
      if (lon > east) east = lon;
      if (lat < south) south = lat;
      if (lat > north) north = lat;
    }
  }
  const bands = Math.max(1, Math.ceil(count / EDGES_PER_BAND));
  const bandOf = (lat: number): number => Math.min(bands - 1, Math.max(0, Math.floor(((lat - south) / (north - south)) * bands)));
  const first = new Uint32Array(bands + 1);
  for (let e = 0; e < count; e++) for (let b = bandOf(edges[4 * e + 1]); b <= bandOf(edges[4 * e + 3]); b++) first[b + 1]++;
  for (let b = 0; b < bands; b++) first[b + 1] += first[b];
  const next = first.slice();
  const inBand = new Uint32Array(first[bands]);
  for (let e = 0; e < count; e++) for (let b = bandOf(edges[4 * e + 1]); b <= bandOf(edges[4 * e + 3]); b++) inBand[next[b]++] = e;

  const cutAt = (e: number, lat: number): number => {
    const [x0, y0, x1, y1] = [edges[4 * e], edges[4 * e + 1], edges[4 * e + 2], edges[4 * e + 3]];
    return x0 + ((x1 - x0) * (lat - y0)) / (y1 - y0);
  };
  return {
    west,
    south,
    east,
    north,
    contains(lat, lon) {
      if (lon < west || lon > east || lat < south || lat > north) return false;
      let inside = false;
      const band = bandOf(lat);
      for (let k = first[band]; k < first[band + 1]; k++) {
        const e = inBand[k];
        if (edges[4 * e + 1] <= lat && lat < edges[4 * e + 3] && lon < cutAt(e, lat)) inside = !inside;
      }
      return inside;
    },
    chordsAt(lat) {
      const cuts: number[] = [];
      const band = bandOf(lat);
      for (let k = first[band]; k < first[band + 1]; k++) {
        const e = inBand[k];
        if (edges[4 * e + 1] <= lat && lat < edges[4 * e + 3]) cuts.push(cutAt(e, lat));
      }
      return cuts.sort((a, b) => a - b);
    },
  };
}

/** Edges from their southern to their northern end; those along a parallel never count. */
function edgesOf(rings: readonly Position[][]): Float64Array {
  const ends: number[] = [];
  for (const ring of rings) {
    for (let i = 1; i < ring.length; i++) {
      const [a, b] = ring[i - 1][1] < ring[i][1] ? [ring[i - 1], ring[i]] : [ring[i], ring[i - 1]];
      if (a[1] < b[1]) ends.push(a[0], a[1], b[0], b[1]);
    }
  }
  return Float64Array.from(ends);
}
