import type { Position } from 'geojson';
import type { Asset } from './model';

/** What is wrong with a shape that is well formed: it crosses the 180th meridian uncut (RFC 7946, 3.1.9), or a ring encloses nothing. */
export function areaFault(geometry: Asset['geometry']): string | null {
  switch (geometry.type) {
    case 'Point':
      return null;
    case 'LineString':
      return crossing(geometry.coordinates);
    case 'MultiLineString':
      return firstOf(geometry.coordinates, crossing);
    case 'Polygon':
      return firstOf(geometry.coordinates, ringFault);
    case 'MultiPolygon':
      return firstOf(geometry.coordinates.flat(), ringFault);
  }
}

function firstOf(lines: readonly Position[][], faultOf: (line: Position[]) => string | null): string | null {
  for (const line of lines) {
    const fault = faultOf(line);
    if (fault) return fault;
  }
  return null;
}

const ringFault = (ring: Position[]): string | null => crossing(ring) ?? (doubleArea(ring) === 0 ? `the ring that starts at [${ring[0].join(', ')}] encloses nothing` : null);

function crossing(line: Position[]): string | null {
  const i = line.findIndex(([lon], k) => k > 0 && Math.abs(lon - line[k - 1][0]) > 180);
  return i < 0 ? null : `goes from longitude ${line[i - 1][0]} to ${line[i][0]}: cut it in two at the 180th meridian (RFC 7946, section 3.1.9)`;
}

/** Twice the area in the plane, from the first corner so that small rings do not cancel. */
function doubleArea(ring: Position[]): number {
  const [west, south] = ring[0];
  let sum = 0;
  for (let i = 1; i < ring.length; i++) sum += (ring[i - 1][0] - west) * (ring[i][1] - south) - (ring[i][0] - west) * (ring[i - 1][1] - south);
  return sum;
}
