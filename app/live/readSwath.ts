import type { FeatureCollection } from 'geojson';
import { polygonsOf } from '../map/shapes';
import type { Area, ZoneShape } from './bulk';

/** Areas of a swath, weakest first, so that stronger ones are drawn over them. */
export function readSwath(collection: FeatureCollection): Area[] {
  return collection.features
    .map((feature): Area => {
      const chance: unknown = feature.properties?.['chance'];
      return { thresholdKt: Number(feature.properties?.['thresholdKt']), chance: typeof chance === 'number' ? chance : null, polygons: polygonsOf(feature.geometry) };
    })
    .filter((area) => area.polygons.length > 0)
    .sort((a, b) => a.thresholdKt - b.thresholdKt || (a.chance ?? 0) - (b.chance ?? 0));
}

/** Zone outlines by the id their rows carry. */
export function readZones(collection: FeatureCollection): ZoneShape[] {
  return collection.features.map((feature, i) => {
    const { id, name } = (feature.properties ?? {}) as { id?: unknown; name?: unknown };
    const key = String(id ?? feature.id ?? i + 1);
    return { id: key, name: String(name ?? key), polygons: polygonsOf(feature.geometry) };
  });
}
