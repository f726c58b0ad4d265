'use client';
import { useBulk, useView } from '../live/EventContext';
import styles from './Map.module.css';
import type { Camera, Size } from './mercator';
import { project } from './mercator';

/** The zone under the pointer and the one selected, outlined over the map: no redraw of the map below. */
export function LitZones({ camera, size }: { camera: Camera; size: Size }) {
  const zones = useBulk((state) => state.zones);
  const hover = useView((state) => state.hoverZone);
  const selected = useView((state) => state.selectedZone);
  return zones
    .filter((zone) => zone.id === hover || zone.id === selected)
    .map((zone) => {
      const path = zone.polygons
        .flat()
        .map((ring) => `M${ring.map(([lon, lat]) => project(camera, size, lon, lat).map((px) => px.toFixed(1)).join(' ')).join('L')}Z`)
        .join('');
      return (
        <g key={zone.id}>
          <path d={path} className={styles.litUnder} />
          <path d={path} className={styles.lit} fillRule="evenodd" data-selected={zone.id === selected} />
        </g>
      );
    });
}
