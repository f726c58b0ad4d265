import { Deck, MapView } from '@deck.gl/core';
import type { Layer } from '@deck.gl/core';
import type { Camera } from './mercator';
import { ZOOM_RANGE } from './mercator';

export interface DeckMap {
  setLayers(layers: Layer[]): void;
  setCamera(camera: Camera): void;
  destroy(): void;
}

interface ViewState {
  longitude: number;
  latitude: number;
  zoom: number;
}

/** One deck.gl for the life of the page, its canvas inside `parent`. `onMove` tells where the reader dragged or zoomed to. */
export function createDeck(parent: HTMLDivElement, { onMove, onReady, onFailed }: { onMove: (camera: Camera) => void; onReady: () => void; onFailed: (error: Error) => void }): DeckMap {
  let destroyed = false;
  const deck = new Deck({
    parent,
    style: { position: 'absolute', inset: '0' },
    views: new MapView({ id: 'map', repeat: true }),
    controller: { dragRotate: false, touchRotate: false, keyboard: false, doubleClickZoom: true, scrollZoom: { speed: 0.008, smooth: false } },
    viewState: { longitude: 0, latitude: 20, zoom: 2 },
    layers: [],
    deviceProps: { type: 'webgl', webgl: { preserveDrawingBuffer: false } },
    useDevicePixels: Math.min(2, window.devicePixelRatio || 1),
    // Places are picked on the processor (see pick.ts): no read-back from the graphics card.
    _pickable: false,
    onViewStateChange: ({ viewState, interactionState }) => {
      // deck.gl also calls this to hold the view inside the world; only the reader moves the map.
      if (!Object.values(interactionState).some(Boolean)) return;
      const { longitude, latitude, zoom } = viewState as ViewState;
      onMove({ lon: longitude, lat: latitude, zoom });
    },
    onLoad: onReady,
    onError: (error) => {
      if (!destroyed) onFailed(error);
    },
    getCursor: ({ isDragging }) => (isDragging ? 'grabbing' : 'default'),
  });
  return {
    setLayers: (layers) => deck.setProps({ layers }),
    setCamera: ({ lon, lat, zoom }) => deck.setProps({ viewState: { longitude: lon, latitude: lat, zoom, minZoom: ZOOM_RANGE.least, maxZoom: ZOOM_RANGE.most, pitch: 0, bearing: 0 } }),
    destroy: () => {
      destroyed = true;
      deck.finalize();
    },
  };
}
