import { booleanPointInPolygon } from '@turf/turf';
import Flatbush from 'flatbush';
import type { Zone } from './model';

/** Which zone a position lies in: the first in the list where zones overlap, -1 for none. */
export function zoneIndex(zones: readonly Zone[]): (lat: number, lon: number) => number {
  if (zones.length === 0) return () => -1;
  const index = new Flatbush(zones.length);
  for (const { geometry } of zones) {
    const corners = geometry.type === 'Polygon' ? geometry.coordinates.flat() : geometry.coordinates.flat(2);
    const lons = corners.map(([lon]) => lon);
    const lats = corners.map(([, lat]) => lat);
    index.add(Math.min(...lons), Math.min(...lats), Math.max(...lons), Math.max(...lats));
  }
  index.finish();
  return (lat, lon) => {
    const candidates = index.search(lon, lat, lon, lat).sort((a, b) => a - b);
    return candidates.find((zone) => booleanPointInPolygon([lon, lat], zones[zone].geometry)) ?? -1;
  };
}
