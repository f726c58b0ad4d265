import type { LayerKind, RowError } from '../../lib/exposure';
import type { Layer } from '../../lib/wire';
import type { Services } from '../services';
import type { Source } from '../store';

export interface ReceivedLayer {
  eventId: string;
  kind: LayerKind;
  /** Of the layer, and the class of assets that name none. The same name and kind again is the layer's next version. */
  name: string;
  source: Source;
  /** Name of whoever sent it. */
  by: string;
}

export type AcceptedLayer = { ok: true; layer: Layer; rejected: RowError[] } | { ok: false; errors: RowError[] };

type Needed = Pick<Services, 'store' | 'runs' | 'clock' | 'inspectLayer'>;

/** The one way in for layers: read on a compute thread, on disk, asked to be computed with. Nothing is stored of one that cannot be read. */
export async function acceptLayer({ store, runs, clock, inspectLayer }: Needed, { eventId, kind, name, source, by }: ReceivedLayer): Promise<AcceptedLayer> {
  const inspection = await inspectLayer({ kind, assetClass: name, bytes: source.bytes });
  if (!inspection.ok) return inspection;
  const { rows, classes, rejected } = inspection;
  const layer = await store.layers.add({ eventId, kind, name, rows, classes, source, receivedAt: new Date(clock.nowMs()).toISOString(), receivedBy: by });
  runs.request(eventId);
  return { ok: true, layer, rejected };
}
