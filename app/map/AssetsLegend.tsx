'use client';
import { useState } from 'react';
import { formatCount } from '../../lib/units';
import { useBulk } from '../live/EventContext';
import { Button } from '../ui/Button';
import { words } from '../words';
import { ClassToggles } from './ClassToggles';
import styles from './Map.module.css';

/** The classes of assets, folded where the map is small. */
export function AssetsLegend() {
  const count = useBulk((state) => state.marks?.id.length ?? 0);
  const [open, setOpen] = useState(() => window.matchMedia('(min-height: 851px) and (min-width: 1600px)').matches);
  if (count === 0) return null;
  return (
    <div>
      <Button className={styles.fold} aria-expanded={open} onPress={() => setOpen(!open)}>
        {words.map.legend.assets} {formatCount(count)} <span aria-hidden="true">{open ? '−' : '+'}</span>
      </Button>
      {open && <ClassToggles />}
    </div>
  );
}
