import { createStore } from 'zustand/vanilla';
import type { StoreApi } from 'zustand/vanilla';
import type { AssetRow } from '../../lib/impact';
import type { Layer, StoredAdvisory } from '../../lib/wire';
import type { Marks } from '../http/api';
import type { Polygon } from '../map/shapes';
import type { Product } from './view';

export interface ZoneShape {
  id: string;
  name: string;
  polygons: Polygon[];
}

/** One drawn area: a wind threshold, or a chance of one. */
export interface Area {
  thresholdKt: number;
  chance: number | null;
  polygons: Polygon[];
}

export interface Swath {
  revision: number;
  advisoryId: string;
  product: Product;
  areas: Area[];
}

/** What is too large for the socket: fetched by revision over HTTP and kept until a newer one is whole. */
export interface Bulk {
  swath: Swath | null;
  marks: Marks | null;
  /** Whole rows of the classes that were pointed at, by asset id; of one revision. */
  assets: { revision: number; byClass: Readonly<Record<string, Readonly<Record<string, AssetRow>>>> };
  layers: Layer[];
  zones: ZoneShape[];
  /** Oldest first. */
  history: StoredAdvisory[];
  /** What could not be fetched, in words. */
  trouble: string | null;
}

export const createBulk = (): StoreApi<Bulk> => createStore<Bulk>(() => ({ swath: null, marks: null, assets: { revision: 0, byClass: {} }, layers: [], zones: [], history: [], trouble: null }));
