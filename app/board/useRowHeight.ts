import { useSyncExternalStore } from 'react';

const LOW = '(max-height: 850px) and (min-width: 900px)';
const NARROW = '(max-width: 899px)';

const subscribe = (changed: () => void): (() => void) => {
  const lists = [LOW, NARROW].map((query) => window.matchMedia(query));
  for (const list of lists) list.addEventListener('change', changed);
  return () => lists.forEach((list) => list.removeEventListener('change', changed));
};

/** Height (px) of a row of the zone table: closer on low screens, taller where a second line is needed. */
export const useRowHeight = (): number =>
  useSyncExternalStore(
    subscribe,
    () => (window.matchMedia(NARROW).matches ? 50 : window.matchMedia(LOW).matches ? 36 : 42),
    () => 42,
  );
