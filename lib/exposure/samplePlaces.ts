import { booleanPointInPolygon } from '@turf/turf';
import type { MultiPolygon, Polygon, Position } from 'geojson';
import { bearingDeg, destination, distanceKm } from '../geo';
import type { Asset } from './model';

/** Lines are looked at this often, and areas on a grid this fine. */
export const SAMPLE_KM = 2;

/** Positions at which an asset's wind is asked for: a point itself, a line every two kilometres, an area on a grid and its corners. */
export function assetPlaces(geometry: Asset['geometry']): Position[] {
  switch (geometry.type) {
    case 'Point':
      return [geometry.coordinates];
    case 'LineString':
      return alongLine(geometry.coordinates);
    case 'MultiLineString':
      return geometry.coordinates.flatMap(alongLine);
    case 'Polygon':
      return [...geometry.coordinates[0].slice(0, -1), ...insideArea(geometry)];
    case 'MultiPolygon':
      return [...geometry.coordinates.flatMap(([outer]) => outer.slice(0, -1)), ...insideArea(geometry)];
  }
}

function alongLine(line: Position[]): Position[] {
  const places: Position[] = [line[0]];
  for (let i = 1; i < line.length; i++) {
    const [[lonA, latA], [lonB, latB]] = [line[i - 1], line[i]];
    const lengthKm = distanceKm(latA, lonA, latB, lonB);
    const parts = Math.max(1, Math.ceil(lengthKm / SAMPLE_KM));
    const bearing = bearingDeg(latA, lonA, latB, lonB);
    for (let k = 1; k < parts; k++) {
      const { lat, lon } = destination(latA, lonA, bearing, (lengthKm * k) / parts);
      places.push([lon, lat]);
    }
    places.push(line[i]);
  }
  return places;
}

/** A grid of positions inside an area; its first corner where the area is too small to hold any. */
export function insideArea(area: Polygon | MultiPolygon): Position[] {
  const corners = area.type === 'Polygon' ? area.coordinates.flat() : area.coordinates.flat(2);
  const lons = corners.map(([lon]) => lon);
  const lats = corners.map(([, lat]) => lat);
  const [west, east, south, north] = [Math.min(...lons), Math.max(...lons), Math.min(...lats), Math.max(...lats)];
  const stepLat = SAMPLE_KM / 111.2;
  const stepLon = stepLat / Math.max(0.1, Math.cos((((south + north) / 2) * Math.PI) / 180));
  const places: Position[] = [];
  for (let lat = south + stepLat / 2; lat < north; lat += stepLat) {
    for (let lon = west + stepLon / 2; lon < east; lon += stepLon) if (booleanPointInPolygon([lon, lat], area)) places.push([lon, lat]);
  }
  return places.length > 0 ? places : [corners[0]];
}
