'use client';
import { useStore } from 'zustand';
import type { StoreApi } from 'zustand/vanilla';
import { prefsStore } from '../prefs/prefs';
import { GraticuleLabels } from './GraticuleLabels';
import { LitZones } from './LitZones';
import styles from './Map.module.css';
import type { MapState } from './mapState';
import { PlaceLabels } from './PlaceLabels';
import { ScaleBar } from './ScaleBar';
import { TrackLine } from './TrackLine';
import { usePlaces } from './usePlaces';
import { useTrack } from './useTrack';

/** What is text or thin line over the map. It takes no pointer. */
export function MapOverlay({ map }: { map: StoreApi<MapState> }) {
  const camera = useStore(map, (state) => state.camera);
  const size = useStore(map, (state) => state.size);
  const legend = useStore(map, (state) => state.legend);
  const distance = useStore(prefsStore, (state) => state.distance);
  const track = useTrack();
  const places = usePlaces();
  if (size.width === 0) return null;
  return (
    <svg className={styles.overlay} width={size.width} height={size.height} aria-hidden="true">
      <LitZones camera={camera} size={size} />
      <GraticuleLabels camera={camera} size={size} below={legend.height} />
      {track && <TrackLine track={track} camera={camera} size={size} />}
      <PlaceLabels track={track} places={places} camera={camera} size={size} legend={legend} />
      <ScaleBar camera={camera} size={size} unit={distance} />
    </svg>
  );
}
