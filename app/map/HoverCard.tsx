'use client';
import { useStore } from 'zustand';
import type { StoreApi } from 'zustand/vanilla';
import type { ZoneRow } from '../../lib/impact';
import { formatChance, formatCount, THRESHOLD_KEYS } from '../../lib/units';
import { useBulk, useFormats, useLive, useView } from '../live/EventContext';
import type { Formats } from '../prefs/format';
import { bandOf } from '../theme/bands';
import { words } from '../words';
import styles from './Map.module.css';
import type { MapState } from './mapState';

/** Chances, and when 34 kt comes: early over the members, else on the track. */
function Arrival({ of, formats }: { of: Pick<ZoneRow, 'chance' | 'arrival'>; formats: Formats }) {
  const { early, track } = of.arrival['34'];
  const chances = THRESHOLD_KEYS.filter((key) => of.chance[key] !== null).map((key) => words.map.chanceLine(`${key} kt`, formatChance(of.chance[key])));
  return (
    <>
      {chances.length > 0 && <p>{chances.join(', ')}</p>}
      {early ? <p>{words.map.early(formats.dayTime(early))}</p> : track ? <p>{words.map.arrives(formats.dayTime(track))}</p> : null}
    </>
  );
}

/** What lies under the pointer: an asset, and the zone it is in. */
export function HoverCard({ map }: { map: StoreApi<MapState> }) {
  const pointer = useStore(map, (state) => state.pointer);
  const size = useStore(map, (state) => state.size);
  const marks = useBulk((state) => state.marks);
  const mark = useView((state) => state.hoverMark);
  const zoneId = useView((state) => state.hoverZone);
  const impact = useLive((state) => state.impact);
  const rows = useBulk((state) => state.assets.byClass);
  const formats = useFormats();
  if (!pointer) return null;
  const zone = impact?.zones.find((row) => row.id === zoneId);
  const asset = mark !== null && marks ? { id: marks.id[mark], kind: marks.classes[marks.classIndex[mark]], kt: marks.maxWindKt[mark] } : null;
  if (!zone && !asset) return null;
  const row = asset ? rows[asset.kind]?.[asset.id] : undefined;
  const left = pointer.x > size.width - 260;
  const up = pointer.y > size.height - 190;
  return (
    <div className={styles.card} style={{ left: left ? undefined : pointer.x + 16, right: left ? size.width - pointer.x + 16 : undefined, top: up ? undefined : pointer.y + 14, bottom: up ? size.height - pointer.y + 14 : undefined }}>
      {asset && (
        <div>
          <strong>{row?.name ?? asset.kind}</strong> <span className="dim">{row ? asset.kind : asset.id}</span>
          <p>
            {bandOf(asset.kt) ? words.map.peak(formats.wind(asset.kt)) : words.map.notHit}
            {row && `, ${words.map.gust(formats.wind(row.gustKt))}`}
          </p>
          {row && row.people !== null && <p>{words.map.depend(formatCount(row.people))}</p>}
          {row && <Arrival of={row} formats={formats} />}
        </div>
      )}
      {zone && (
        <div>
          <strong>{zone.name}</strong>
          <p>{words.map.people(formatCount(zone.people))}</p>
          <p>
            {words.map.peak(formats.wind(zone.maxWindKt))}, {words.map.gust(formats.wind(zone.gustKt))}
          </p>
          <Arrival of={zone} formats={formats} />
        </div>
      )}
    </div>
  );
}
