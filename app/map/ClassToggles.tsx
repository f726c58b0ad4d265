'use client';
import { useMemo } from 'react';
import { ToggleButton } from 'react-aria-components/ToggleButton';
import { formatCount } from '../../lib/units';
import { useBulk, useHold, useView } from '../live/EventContext';
import { words } from '../words';
import { glyphPath } from './glyphAtlas';
import styles from './Map.module.css';
import { markClasses } from './marks';

/** The asset classes with their shape and count; pressing one hides or shows it. */
export function ClassToggles() {
  const { view } = useHold();
  const marks = useBulk((state) => state.marks);
  const hidden = useView((state) => state.hiddenClasses);
  const classes = useMemo(() => (marks ? markClasses(marks) : []), [marks]);
  if (classes.length === 0) return null;
  const set = (name: string, shown: boolean): void => {
    const next = new Set(hidden);
    if (shown) next.delete(name);
    else next.add(name);
    view.setState({ hiddenClasses: next, hoverMark: null });
  };
  return (
    <div className={styles.classes} role="group" aria-label={words.map.legend.assets}>
      {classes.map(({ name, count, glyph }) => (
        <ToggleButton key={name} className={styles.classToggle} isSelected={!hidden.has(name)} onChange={(shown) => set(name, shown)}>
          <svg width="14" height="14" viewBox="-7 -7 14 14" aria-hidden="true">
            {glyph === 'dot' ? <circle r="1.8" fill="currentColor" /> : <path d={glyphPath(glyph, 5)} fill="none" stroke="currentColor" strokeWidth="1.4" />}
          </svg>
          {name} <span>{formatCount(count)}</span>
        </ToggleButton>
      ))}
    </div>
  );
}
