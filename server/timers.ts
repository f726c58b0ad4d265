/** Timers as an argument, so that tests turn them by hand. Both return the function that stops. */
export interface Timers {
  every(ms: number, run: () => void): () => void;
  later(ms: number, run: () => void): () => void;
}

/** The machine's timers. They keep no process alive. */
export const machineTimers: Timers = {
  every(ms, run) {
    const timer = setInterval(run, ms).unref();
    return () => clearInterval(timer);
  },
  later(ms, run) {
    const timer = setTimeout(run, ms).unref();
    return () => clearTimeout(timer);
  },
};
