'use client';
import { useMemo, useRef, useState } from 'react';
import type { KeyboardEvent, PointerEvent } from 'react';
import { useStore } from 'zustand';
import { useHold } from '../live/EventContext';
import { words } from '../words';
import { HoverCard } from './HoverCard';
import { Legend } from './Legend';
import styles from './Map.module.css';
import { MapButtons } from './MapButtons';
import { createMapState } from './mapState';
import { panned, unproject, zoomed } from './mercator';
import { MapOverlay } from './MapOverlay';
import { markAt, zoneAt } from './pick';
import { useDeck } from './useDeck';
import { useFit } from './useFit';
import { useLayers } from './useLayers';

const PAN_PX = 90;
const REACH_PX = 9;

/** The map: deck.gl below, labels and track as crisp text and lines above it, legend and buttons. */
export function LiveMap() {
  const { view, bulk } = useHold();
  const [map] = useState(createMapState);
  const parent = useRef<HTMLDivElement>(null);
  const layers = useLayers(map);
  const fit = useFit(map);
  const drawing = useStore(map, (state) => state.drawing);
  useDeck(parent, map, layers);

  const keys = useMemo(() => {
    const move = (dx: number, dy: number) => () => map.setState(({ camera }) => ({ camera: panned(camera, dx, dy), moved: true }));
    const zoom = (by: number) => () => map.setState(({ camera }) => ({ camera: zoomed(camera, by), moved: true }));
    return {
      ArrowLeft: move(-PAN_PX, 0),
      ArrowRight: move(PAN_PX, 0),
      ArrowUp: move(0, -PAN_PX),
      ArrowDown: move(0, PAN_PX),
      '+': zoom(0.5),
      '=': zoom(0.5),
      '-': zoom(-0.5),
      '0': fit,
      Escape: () => view.setState({ selectedZone: null, hoverZone: null }),
    } as Record<string, () => void>;
  }, [map, fit, view]);

  const pressed = (event: KeyboardEvent): void => {
    const act = event.ctrlKey || event.metaKey || event.altKey ? undefined : keys[event.key];
    if (!act || event.target !== event.currentTarget) return;
    event.preventDefault();
    act();
  };
  const pointed = (event: PointerEvent): void => {
    if (event.buttons !== 0 && event.pointerType === 'mouse') return;
    const box = event.currentTarget.getBoundingClientRect();
    const [x, y] = [event.clientX - box.left, event.clientY - box.top];
    const { camera, size } = map.getState();
    const [lon, lat] = unproject(camera, size, x, y);
    const { marks, zones } = bulk.getState();
    map.setState({ pointer: { x, y } });
    view.setState({ hoverZone: zoneAt(zones, lon, lat), hoverMark: marks ? markAt(marks, view.getState().hiddenClasses, camera, lon, lat, REACH_PX) : null });
  };
  const left = (): void => {
    map.setState({ pointer: null });
    view.setState({ hoverZone: null, hoverMark: null });
  };
  const clicked = (): void => view.setState(({ hoverZone, selectedZone }) => ({ selectedZone: hoverZone === selectedZone ? null : hoverZone }));

  return (
    <>
      <div className={styles.surface} role="application" aria-label={words.map.label} tabIndex={0} onKeyDown={pressed} onPointerMove={pointed} onPointerLeave={left} onClick={clicked} data-drawing={drawing}>
        <div ref={parent} className={styles.canvas} />
        <MapOverlay map={map} />
      </div>
      {drawing === 'impossible' && (
        <p className={styles.wait} role="status">
          {words.map.noDrawing}
        </p>
      )}
      <HoverCard map={map} />
      <MapButtons onZoom={(by) => keys[by > 0 ? '+' : '-']()} onFit={fit} />
      <Legend map={map} />
    </>
  );
}
