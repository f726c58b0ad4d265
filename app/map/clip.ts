import type { Position } from 'geojson';
import { nearestTurn } from './mercator';
import type { Bounds } from './mercator';
import type { Polygon } from './shapes';

type Inside = (place: Position) => boolean;
type Crossing = (a: Position, b: Position) => Position;

/** One side of the box after another (Sutherland and Hodgman, 1974, Commun. ACM 17, 32-42); edges along the box may double up. */
function clipRing(ring: Position[], { west, east, south, north }: Bounds): Position[] {
  const atLon = (lon: number): Crossing => ([ax, ay], [bx, by]) => [lon, ay + ((by - ay) * (lon - ax)) / (bx - ax)];
  const atLat = (lat: number): Crossing => ([ax, ay], [bx, by]) => [ax + ((bx - ax) * (lat - ay)) / (by - ay), lat];
  const sides: [Inside, Crossing][] = [
    [([lon]) => lon >= west, atLon(west)],
    [([lon]) => lon <= east, atLon(east)],
    [([, lat]) => lat >= south, atLat(south)],
    [([, lat]) => lat <= north, atLat(north)],
  ];
  return sides.reduce((open, [inside, crossing]) => {
    const kept: Position[] = [];
    open.forEach((place, i) => {
      const before = open[(i + open.length - 1) % open.length];
      if (inside(place) !== inside(before)) kept.push(crossing(before, place));
      if (inside(place)) kept.push(place);
    });
    return kept;
  }, ring.slice(0, -1));
}

/** The parts of polygons inside a box, on the turn of the globe nearest to it. Rings left with no area are dropped. */
export function clipPolygons(polygons: readonly Polygon[], bounds: Bounds): Polygon[] {
  const centre = (bounds.west + bounds.east) / 2;
  return polygons.flatMap((polygon) => {
    const shift = nearestTurn(polygon[0][0][0], centre) - polygon[0][0][0];
    // A ring wider than half the globe may reach the box on its neighbouring turn as well.
    const turns = [shift, shift - 360, shift + 360];
    return turns.flatMap((turn): Polygon[] => {
      const rings = polygon.map((ring) => clipRing(turn === 0 ? ring : ring.map(([lon, lat]) => [lon + turn, lat]), bounds));
      if (rings[0].length < 3) return [];
      return [rings.filter((ring) => ring.length >= 3).map((ring) => [...ring, ring[0]])];
    });
  });
}

/** Outlines without the edges that lie on the box: they are where it was cut, not shore. */
export function withoutBox(lines: readonly Position[][], { west, east, south, north }: Bounds): Position[][] {
  const onSide = (a: Position, b: Position): boolean =>
    (a[0] === b[0] && (a[0] === west || a[0] === east)) || (a[1] === b[1] && (a[1] === south || a[1] === north));
  return lines.flatMap((line) => {
    const parts: Position[][] = [[line[0]]];
    for (let i = 1; i < line.length; i++) {
      if (onSide(line[i - 1], line[i])) parts.push([line[i]]);
      else parts[parts.length - 1].push(line[i]);
    }
    return parts.filter((part) => part.length > 1);
  });
}
