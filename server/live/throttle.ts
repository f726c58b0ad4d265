import type { Timers } from '../timers';

export interface Throttle<T> {
  put(value: T): void;
  /** Forgets what has not been sent. */
  drop(): void;
}

/** Sends at most one value in `apartMs()`: the first at once, then the newest of those that came since. */
export function throttle<T>(timers: Timers, apartMs: () => number, send: (value: T) => void): Throttle<T> {
  let waiting: { value: T } | null = null;
  let stop: (() => void) | null = null;

  function pause(): void {
    stop = timers.later(apartMs(), () => {
      stop = null;
      if (!waiting) return;
      const { value } = waiting;
      waiting = null;
      send(value);
      pause();
    });
  }

  return {
    put(value) {
      if (stop) waiting = { value };
      else {
        send(value);
        pause();
      }
    },
    drop() {
      waiting = null;
    },
  };
}
