import { createStore } from 'zustand/vanilla';

/** This machine's clock as a store: one timer for the whole page, aligned to the second. */
export const tickStore = createStore<{ localMs: number }>(() => ({ localMs: 0 }));

/** Starts the page's one timer; returns the function that stops it. */
export function startTicking(): () => void {
  let timer: ReturnType<typeof setTimeout>;
  const beat = (): void => {
    const localMs = Date.now();
    tickStore.setState({ localMs });
    timer = setTimeout(beat, 1000 - (localMs % 1000));
  };
  beat();
  return () => clearTimeout(timer);
}
