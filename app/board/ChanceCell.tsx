'use client';
import { useStore } from 'zustand';
import { themeStore } from '../prefs/theme';
import { chanceColour } from '../theme/bands';
import styles from './ChanceCell.module.css';

/** A chance as a number over a short line as long as it is likely. */
export function ChanceCell({ chance, text }: { chance: number | null; text: string }) {
  const theme = useStore(themeStore, (state) => state.theme);
  return (
    <span className={styles.chance}>
      {text}
      {chance !== null && <i style={{ width: `${chance * 100}%`, background: chanceColour(theme, chance) }} aria-hidden="true" />}
    </span>
  );
}
