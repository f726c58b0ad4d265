import { createStore } from 'zustand/vanilla';
import type { StoreApi } from 'zustand/vanilla';
import type { Camera, Size } from './mercator';

export interface MapState {
  camera: Camera;
  size: Size;
  /** The reader has moved the map: it is not fitted by itself any more. */
  moved: boolean;
  /** Where the pointer is, for the hover card. */
  pointer: { x: number; y: number } | null;
  /** Room the legend takes at the bottom left. */
  legend: Size;
  drawing: 'starting' | 'ready' | 'impossible';
}

export const createMapState = (): StoreApi<MapState> =>
  createStore<MapState>(() => ({ camera: { lon: 0, lat: 20, zoom: 2 }, size: { width: 0, height: 0 }, moved: false, pointer: null, legend: { width: 0, height: 0 }, drawing: 'starting' }));
