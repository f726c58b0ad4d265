import type { EventRecord, Store } from '../store/model';
import type { ExposureHandle } from './exposureHandle';
import type { Pool } from './pool';

/** Exposures of events, compiled again only when the event's layers have changed. */
export interface Exposures {
  of(event: EventRecord): Promise<ExposureHandle>;
  coastFile(event: EventRecord): string | null;
}

export function openExposures(store: Store, pool: Pool, demoCoastFile: string): Exposures {
  const held = new Map<string, ExposureHandle>();
  const coastFile = (event: EventRecord): string | null => (event.demo ? demoCoastFile : null);
  return {
    coastFile,
    async of(event) {
      const layers = await store.layers.current(event.id);
      const key = [event.id, ...layers.map((layer) => layer.id)].join(' ');
      const kept = held.get(event.id);
      if (kept?.key === key) return kept;
      const inputs = await Promise.all(
        layers.map(async ({ id, kind, name }) => {
          const source = await store.layers.source(event.id, id);
          if (!source) throw new Error(`Layer ${id} has no source.`);
          return { id, kind, name, ...source };
        }),
      );
      const handle = await pool.compile({ key, layers: inputs, coastFile: coastFile(event) });
      held.set(event.id, handle);
      return handle;
    },
  };
}
