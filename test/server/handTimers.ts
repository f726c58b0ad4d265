import type { Timers } from '../../server/timers';

/** Timers that pass when told to. */
export function handTimers(): Timers & { pass(ms: number): void } {
  let nowMs = 0;
  let timers: { atMs: number; everyMs: number | null; run: () => void }[] = [];
  const add = (everyMs: number | null, ms: number, run: () => void): (() => void) => {
    const timer = { atMs: nowMs + ms, everyMs, run };
    timers.push(timer);
    return () => {
      timers = timers.filter((other) => other !== timer);
    };
  };
  return {
    every: (ms, run) => add(ms, ms, run),
    later: (ms, run) => add(null, ms, run),
    pass(ms) {
      const end = nowMs + ms;
      for (;;) {
        const [next] = timers.filter((timer) => timer.atMs <= end).sort((a, b) => a.atMs - b.atMs);
        if (!next) break;
        nowMs = next.atMs;
        if (next.everyMs === null) timers = timers.filter((other) => other !== next);
        else next.atMs += next.everyMs;
        next.run();
      }
      nowMs = end;
    },
  };
}
