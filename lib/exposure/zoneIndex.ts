import Flatbush from 'flatbush';
import { makeArea } from './area';
import type { Zone } from './model';

/** Which zone a position lies in: the first in the list where zones overlap, -1 for none. */
export function zoneIndex(zones: readonly Zone[]): (lat: number, lon: number) => number {
  if (zones.length === 0) return () => -1;
  const areas = zones.map(({ geometry }) => makeArea(geometry));
  const index = new Flatbush(zones.length);
  for (const { west, south, east, north } of areas) index.add(west, south, east, north);
  index.finish();
  return (lat, lon) => {
    let first = -1;
    for (const zone of index.search(lon, lat, lon, lat)) if ((first < 0 || zone < first) && areas[zone].contains(lat, lon)) first = zone;
    return first;
  };
}
