import { createStore } from 'zustand/vanilla';
import type { StoreApi } from 'zustand/vanilla';
import type { Advisory } from '../../lib/advisory';
import { DEFAULT_SORT } from '../board/zoneView';
import type { ZoneSort } from '../board/zoneView';

export const PRODUCTS = ['peak', 'chance34', 'chance50', 'chance64'] as const;
export type Product = (typeof PRODUCTS)[number];

/** What this reader looks at: shared by map, table and strip, never sent anywhere. */
export interface View {
  /** Zone under the pointer or the keyboard, in whichever of the three. */
  hoverZone: string | null;
  selectedZone: string | null;
  /** Index of the asset under the pointer. */
  hoverMark: number | null;
  product: Product;
  hiddenClasses: ReadonlySet<string>;
  sort: ZoneSort;
  /** First row in sight, shared by table and strip; may lie between two rows. */
  firstRow: number;
  /** The list whose scrolling the other follows. */
  leader: 'table' | 'strip';
  /** An advisory that is read but not issued, drawn on the map. */
  preview: Advisory | null;
}

export const createView = (): StoreApi<View> =>
  createStore<View>(() => ({
    hoverZone: null,
    selectedZone: null,
    hoverMark: null,
    product: 'peak',
    hiddenClasses: new Set(),
    sort: DEFAULT_SORT,
    firstRow: 0,
    leader: 'table',
    preview: null,
  }));
