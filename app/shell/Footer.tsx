'use client';
import { useLive } from '../live/EventContext';
import { words } from '../words';
import styles from './Footer.module.css';
import type { Tab } from './tabs';

/** How to read what is above, and the caution, on every page. */
export function Footer({ tab }: { tab: Tab }) {
  const stage = useLive((state) => state.impact?.stage ?? 'none');
  return (
    <footer className={styles.footer}>
      {tab === 'board' && <p>{words.howToRead[stage]}</p>}
      <p className={styles.caution}>{words.caution}</p>
    </footer>
  );
}
