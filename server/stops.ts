export interface Stops {
  add(stop: () => Promise<unknown>): void;
  /** Stops what was added last first, each once. One that fails holds up none of the others; the first failure is thrown at the end. */
  run(): Promise<void>;
}

/** Collects what stops the parts of something, as they are started. */
export function stopsInReverse(): Stops {
  const stops: (() => Promise<unknown>)[] = [];
  return {
    add: (stop) => void stops.push(stop),
    async run() {
      const failures: unknown[] = [];
      for (let stop = stops.pop(); stop; stop = stops.pop()) {
        try {
          await stop();
        } catch (error) {
          failures.push(error);
        }
      }
      if (failures.length > 0) throw failures[0];
    },
  };
}
