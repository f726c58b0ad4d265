'use client';
import { useCallback } from 'react';
import { useStore } from 'zustand';
import type { StoreApi } from 'zustand/vanilla';
import { formatChance, formatCount, THRESHOLD_KEYS } from '../../lib/units';
import { useBulk, useFormats, useHold, useLive, useView } from '../live/EventContext';
import { PRODUCTS } from '../live/view';
import { themeStore } from '../prefs/theme';
import { chanceColour } from '../theme/bands';
import { Choice } from '../ui/Choice';
import { words } from '../words';
import { AssetsLegend } from './AssetsLegend';
import styles from './Map.module.css';
import type { MapState } from './mapState';

const CHANCES = [0.05, 0.2, 0.4, 0.6, 0.8];
const text = words.map.legend;

/** What the colours mean, of which revision, over which time and averaging; and what to show. */
export function Legend({ map }: { map: StoreApi<MapState> }) {
  const measured = useMeasured(map);
  const { view } = useHold();
  const product = useView((state) => state.product);
  const preview = useView((state) => state.preview !== null);
  const swath = useBulk((state) => state.swath);
  const trouble = useBulk((state) => state.trouble);
  const stage = useLive((state) => state.impact?.stage ?? null);
  const members = useLive((state) => state.impact?.members ?? 0);
  const advisory = useLive((state) => (state.impact ? state.advisories[state.impact.advisoryId] : undefined));
  const theme = useStore(themeStore, (state) => state.theme);
  const formats = useFormats();
  if (preview) return <div className={styles.legend} ref={measured}><strong>{text.preview}</strong></div>;
  if (!swath || !advisory) return null;
  const last = advisory.points[advisory.points.length - 1].validAt;
  const chance = swath.product === 'peak' ? null : swath.product.slice('chance'.length);
  const onTrack = chance === null;
  return (
    <div className={styles.legend} ref={measured}>
      <strong>{chance ? text.chance(`${chance} kt`) : text.peak(formats.dayTime(last))}</strong>
      {chance === null ? (
        <ul className={styles.swatches}>
          {THRESHOLD_KEYS.map((key) => (
            <li key={key}>
              <i data-band={key} />
              {key === '34' ? text.above(`${key} kt`) : `${key} kt`}
            </li>
          ))}
        </ul>
      ) : (
        <ul className={styles.swatches}>
          {CHANCES.map((share) => (
            <li key={share}>
              <i style={{ background: chanceColour(theme, share), borderColor: 'var(--control)' }} />
              {formatChance(share)}
            </li>
          ))}
        </ul>
      )}
      <p>
        {trouble ?? text.note(advisory.averaging === '10-min' ? text.convertedFrom10 : '', advisory.number, swath.revision, onTrack || stage === 'track' ? text.onTrack : text.members(formatCount(members)))}
      </p>
      <Choice quiet label={words.map.productsLabel} value={product} onChange={(next) => view.setState({ product: next })} options={PRODUCTS.map((value) => ({ value, text: words.map.products[value] }))} />
      <AssetsLegend />
    </div>
  );
}

/** Tells the map how much room the legend takes over it, so that no label is written under it. */
function useMeasured(map: StoreApi<MapState>): (element: HTMLDivElement | null) => (() => void) | undefined {
  return useCallback(
    (element) => {
      if (!element) return undefined;
      const measure = new ResizeObserver(() => {
        const over = getComputedStyle(element).position === 'absolute';
        map.setState({ legend: over ? { width: element.offsetWidth + 14, height: element.offsetHeight + 14 } : { width: 0, height: 0 } });
      });
      measure.observe(element);
      return () => measure.disconnect();
    },
    [map],
  );
}
