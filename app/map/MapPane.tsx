'use client';
import dynamic from 'next/dynamic';
import { words } from '../words';
import styles from './Map.module.css';

/** The drawing comes after the words: tables are read while the map's code is still on its way. */
const LiveMap = dynamic(() => import('./LiveMap').then((module) => module.LiveMap), { ssr: false, loading: () => <p className={styles.wait}>{words.map.loading}</p> });

/** The place of the map in every page of an event. Hidden pages keep it, so that its graphics context is made once. */
export function MapPane({ hidden }: { hidden: boolean }) {
  return (
    <div className={styles.pane} data-hidden={hidden} inert={hidden}>
      <LiveMap />
    </div>
  );
}
