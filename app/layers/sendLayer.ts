import type { z } from 'zod';
import type { LayerKind } from '../../lib/exposure';
import type { layerStoredSchema } from '../../lib/wire';
import { query, request } from '../http/request';

export type LayerStored = z.infer<typeof layerStoredSchema>;

const TYPES: Record<string, string> = { csv: 'text/csv', geojson: 'application/geo+json', json: 'application/geo+json' };

/** Brings a layer in: all of it, or nothing with the reasons. */
export async function sendLayer(eventId: string, kind: LayerKind, name: string, file: File): Promise<LayerStored> {
  const ending = file.name.slice(file.name.lastIndexOf('.') + 1).toLowerCase();
  const response = await request(`/events/${encodeURIComponent(eventId)}/layers${query({ kind, name })}`, {
    method: 'POST',
    body: file,
    contentType: TYPES[ending] ?? 'text/csv',
    headers: { 'x-file-name': encodeURIComponent(file.name) },
  });
  return (await response.json()) as LayerStored;
}
