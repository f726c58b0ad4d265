import { coordAll } from '@turf/turf';
import type { Position } from 'geojson';
import type { LayerData } from './model';

/** Every position a layer names. */
export function cornersOf(data: LayerData): Position[] {
  switch (data.kind) {
    case 'zones':
      return data.zones.flatMap(({ geometry }) => coordAll(geometry));
    case 'assets':
      return data.assets.flatMap(({ geometry }) => coordAll(geometry));
    case 'population':
      return Array.from(data.cells.lon, (lon, i) => [lon, data.cells.lat[i]]);
  }
}
