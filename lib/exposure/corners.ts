import type { Position } from 'geojson';
import type { Asset, LayerData } from './model';

/** Every position a layer names. */
export function cornersOf(data: LayerData): Position[] {
  switch (data.kind) {
    case 'zones':
      return data.zones.flatMap(({ geometry }) => positionsOf(geometry));
    case 'assets':
      return data.assets.flatMap(({ geometry }) => positionsOf(geometry));
    case 'population':
      return Array.from(data.cells.lon, (lon, i) => [lon, data.cells.lat[i]]);
  }
}

function positionsOf(geometry: Asset['geometry']): Position[] {
  switch (geometry.type) {
    case 'Point':
      return [geometry.coordinates];
    case 'LineString':
      return geometry.coordinates;
    case 'MultiLineString':
    case 'Polygon':
      return geometry.coordinates.flat();
    case 'MultiPolygon':
      return geometry.coordinates.flat(2);
  }
}
