import { useEffect, useRef } from 'react';
import type { RefObject } from 'react';
import type { StoreApi } from 'zustand/vanilla';
import type { Layer } from '@deck.gl/core';
import { createDeck } from './createDeck';
import type { DeckMap } from './createDeck';
import type { MapState } from './mapState';

const TOGETHER_MS = 200;

/** Mounts the one deck.gl into `parent`, keeps its camera and size in the map's state, and hands it the layers. */
export function useDeck(parent: RefObject<HTMLDivElement | null>, map: StoreApi<MapState>, layers: Layer[]): void {
  const deck = useRef<DeckMap | null>(null);
  const newest = useRef(layers);
  useEffect(() => {
    const element = parent.current;
    if (!element) return;
    let made: DeckMap | null = null;
    try {
      made = createDeck(element, {
        onMove: (camera) => map.setState({ camera, moved: true }),
        onReady: () => map.setState({ drawing: 'ready' }),
        onFailed: () => map.getState().drawing === 'starting' && map.setState({ drawing: 'impossible' }),
      });
    } catch {
      map.setState({ drawing: 'impossible' });
    }
    deck.current = made;
    made?.setCamera(map.getState().camera);
    made?.setLayers(newest.current);
    const stop = map.subscribe((now, before) => {
      if (now.camera !== before.camera) made?.setCamera(now.camera);
    });
    const measure = new ResizeObserver(([entry]) => {
      const { width, height } = entry.contentRect;
      if (width > 0 && height > 0) map.setState({ size: { width, height } });
    });
    measure.observe(element);
    return () => {
      stop();
      measure.disconnect();
      deck.current = null;
      made?.destroy();
    };
  }, [parent, map]);
  useEffect(() => {
    newest.current = layers;
    // A new revision comes in parts (areas, marks, zones): they are drawn together, after the figures.
    const timer = setTimeout(() => deck.current?.setLayers(layers), TOGETHER_MS);
    return () => clearTimeout(timer);
  }, [layers]);
}
