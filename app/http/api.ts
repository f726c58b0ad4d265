import type { FeatureCollection } from 'geojson';
import type { Event, Identity, Layer, LogEntry, StoredAdvisory } from '../../lib/wire';
import type { AssetRow } from '../../lib/impact';
import { getJson, query } from './request';
import type { Product } from '../live/view';

interface Listed<T> {
  items: T[];
  total: number;
  offset: number;
}

/** What the map draws of the assets: one entry an asset, in step. */
export interface Marks {
  id: string[];
  lon: number[];
  lat: number[];
  classes: string[];
  classIndex: number[];
  maxWindKt: number[];
}

const event = (eventId: string): string => `/events/${encodeURIComponent(eventId)}`;

export const fetchMe = (signal?: AbortSignal): Promise<Identity> => getJson('/me', signal);
export const fetchEvents = async (signal?: AbortSignal): Promise<Event[]> => (await getJson<Listed<Event>>(`/events${query({ limit: 200 })}`, signal)).items;
export const fetchEvent = (eventId: string, signal?: AbortSignal): Promise<Event> => getJson(event(eventId), signal);
export const fetchAdvisories = async (eventId: string, signal?: AbortSignal): Promise<StoredAdvisory[]> =>
  (await getJson<Listed<StoredAdvisory>>(`${event(eventId)}/advisories${query({ limit: 200 })}`, signal)).items;
export const fetchSwath = (eventId: string, revision: number, product: Product, signal?: AbortSignal): Promise<FeatureCollection> =>
  getJson(`${event(eventId)}/swath${query({ revision, product })}`, signal);
export const fetchMarks = (eventId: string, revision: number, signal?: AbortSignal): Promise<Marks> => getJson(`${event(eventId)}/impact/marks${query({ revision })}`, signal);
export const fetchAssets = async (eventId: string, parameters: Record<string, string | number>, signal?: AbortSignal): Promise<AssetRow[]> =>
  (await getJson<Listed<AssetRow>>(`${event(eventId)}/impact/assets${query(parameters)}`, signal)).items;
/** The newest version of each layer; the list holds all of them, newest first. */
export const fetchLayers = async (eventId: string, signal?: AbortSignal): Promise<Layer[]> => {
  const { items } = await getJson<Listed<Layer>>(`${event(eventId)}/layers${query({ limit: 1000 })}`, signal);
  const newest = new Map<string, Layer>();
  for (const layer of items) if (!((newest.get(`${layer.kind} ${layer.name}`)?.version ?? 0) > layer.version)) newest.set(`${layer.kind} ${layer.name}`, layer);
  return [...newest.values()];
};
export const fetchLayerSource = (eventId: string, layerId: string, signal?: AbortSignal): Promise<FeatureCollection> =>
  getJson(`${event(eventId)}/layers/${encodeURIComponent(layerId)}/source`, signal);
export const fetchLog = async (eventId: string, signal?: AbortSignal): Promise<LogEntry[]> => (await getJson<Listed<LogEntry>>(`${event(eventId)}/log${query({ limit: 500 })}`, signal)).items;
/** Files to take away, made for one revision. */
export const EXPORTS = ['zones.csv', 'assets.csv', 'swath.geojson'] as const;
export const exportUrl = (eventId: string, name: (typeof EXPORTS)[number], revision: number): string => `/api/v1${event(eventId)}/exports/${name}${query({ revision })}`;

export const advisorySourceUrl = (eventId: string, advisoryId: string): string => `/api/v1${event(eventId)}/advisories/${encodeURIComponent(advisoryId)}/source`;
