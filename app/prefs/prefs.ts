import { createStore } from 'zustand/vanilla';
import { DISTANCE_UNITS, WIND_UNITS } from '../../lib/units';
import type { DistanceUnit, WindUnit } from '../../lib/units';

export const THEME_CHOICES = ['auto', 'night', 'day'] as const;
export type ThemeChoice = (typeof THEME_CHOICES)[number];
export const HOUR_CYCLES = ['24', '12'] as const;
export type HourCycle = (typeof HOUR_CYCLES)[number];

/** What one person prefers, kept in this browser. */
export interface Prefs {
  theme: ThemeChoice;
  wind: WindUnit;
  distance: DistanceUnit;
  hours: HourCycle;
}

export const DEFAULT_PREFS: Prefs = { theme: 'auto', wind: 'kt', distance: 'nmi', hours: '24' };
export const PREFS_KEY = 'leeboard.prefs';

/** Whatever was kept, made whole: an unknown value falls back to the default. */
export function readPrefs(kept: string | null): Prefs {
  let given: Partial<Record<keyof Prefs, unknown>> = {};
  try {
    const parsed: unknown = JSON.parse(kept ?? '{}');
    if (typeof parsed === 'object' && parsed !== null) given = parsed;
  } catch {
    // A damaged record is not worth a word: the defaults stand.
  }
  const one = <T extends string>(choices: readonly T[], value: unknown, fallback: T): T => (choices.includes(value as T) ? (value as T) : fallback);
  return {
    theme: one(THEME_CHOICES, given.theme, DEFAULT_PREFS.theme),
    wind: one(WIND_UNITS, given.wind, DEFAULT_PREFS.wind),
    distance: one(DISTANCE_UNITS, given.distance, DEFAULT_PREFS.distance),
    hours: one(HOUR_CYCLES, given.hours, DEFAULT_PREFS.hours),
  };
}

export const prefsStore = createStore<Prefs>(() => DEFAULT_PREFS);

/** Takes up what this browser kept, and keeps every change from then on. Returns the function that stops. */
export function keepPrefs(storage: Pick<Storage, 'getItem' | 'setItem'>): () => void {
  prefsStore.setState(readPrefs(storage.getItem(PREFS_KEY)));
  return prefsStore.subscribe((prefs) => {
    try {
      storage.setItem(PREFS_KEY, JSON.stringify(prefs));
    } catch {
      // A full or forbidden storage costs only the memory of the choice.
    }
  });
}
