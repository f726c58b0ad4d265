'use client';
import { useStore } from 'zustand';
import type { StoreApi } from 'zustand/vanilla';
import { formatChance, formatCount, THRESHOLD_KEYS } from '../../lib/units';
import { useBulk, useFormats, useLive, useView } from '../live/EventContext';
import { bandOf } from '../theme/bands';
import { words } from '../words';
import styles from './Map.module.css';
import type { MapState } from './mapState';

/** What lies under the pointer: an asset, else a zone. */
export function HoverCard({ map }: { map: StoreApi<MapState> }) {
  const pointer = useStore(map, (state) => state.pointer);
  const size = useStore(map, (state) => state.size);
  const marks = useBulk((state) => state.marks);
  const mark = useView((state) => state.hoverMark);
  const zoneId = useView((state) => state.hoverZone);
  const impact = useLive((state) => state.impact);
  const formats = useFormats();
  if (!pointer) return null;
  const zone = impact?.zones.find((row) => row.id === zoneId);
  const asset = mark !== null && marks ? { id: marks.id[mark], kind: marks.classes[marks.classIndex[mark]], kt: marks.maxWindKt[mark] } : null;
  if (!zone && !asset) return null;
  const left = pointer.x > size.width - 260;
  const up = pointer.y > size.height - 190;
  return (
    <div className={styles.card} style={{ left: left ? undefined : pointer.x + 16, right: left ? size.width - pointer.x + 16 : undefined, top: up ? undefined : pointer.y + 14, bottom: up ? size.height - pointer.y + 14 : undefined }}>
      {asset && (
        <div>
          <strong>{asset.kind}</strong> <span className="dim">{asset.id}</span>
          <p>{bandOf(asset.kt) ? words.map.peak(formats.wind(asset.kt)) : words.map.notHit}</p>
        </div>
      )}
      {zone && (
        <div>
          <strong>{zone.name}</strong>
          <p>{words.map.people(formatCount(zone.people))}</p>
          <p>
            {words.map.peak(formats.wind(zone.maxWindKt))}, {words.map.gust(formats.wind(zone.gustKt))}
          </p>
          {impact?.stage === 'members' && <p>{THRESHOLD_KEYS.map((key) => words.map.chanceLine(`${key} kt`, formatChance(zone.chance[key]))).join(', ')}</p>}
          {zone.arrival['34'].early && <p>{words.map.early(formats.dayTime(zone.arrival['34'].early))}</p>}
          {!zone.arrival['34'].early && zone.arrival['34'].track && <p>{words.map.arrives(formats.dayTime(zone.arrival['34'].track))}</p>}
        </div>
      )}
    </div>
  );
}
