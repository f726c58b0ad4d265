import type { Impact } from '../../lib/impact';

export interface InOrder {
  /** Reads where the event stands; deliveries start above it. Asked again, it answers the same. */
  open(): Promise<void>;
  put(impact: Impact): void;
}

export interface InOrderOptions {
  /** The event's revision now. */
  revision: () => Promise<number>;
  /** The stored impacts above a revision, oldest first. */
  since: (revision: number) => Promise<Impact[]>;
  deliver: (impact: Impact) => void;
  /** Reading failed: what waits is delivered with the gap, which screens see and mend by joining again. */
  failed: (error: unknown) => void;
}

/** Delivers an event's impacts in rising order, each once, whatever order they are put in (rule 4). */
export function inOrder({ revision, since, deliver, failed }: InOrderOptions): InOrder {
  const early = new Map<number, Impact>();
  let last: number | null = null;
  let opening: Promise<void> | null = null;
  let filling = false;

  function drain(): void {
    if (last === null) return;
    for (const known of early.keys()) if (known <= last) early.delete(known);
    for (let next = early.get(last + 1); next; next = early.get(last + 1)) {
      early.delete(next.revision);
      last = next.revision;
      deliver(next);
    }
    if (early.size > 0 && !filling) void fill(last);
  }

  async function fill(from: number): Promise<void> {
    filling = true;
    try {
      for (const impact of await since(from)) early.set(impact.revision, impact);
    } catch (error) {
      failed(error);
    }
    // What the store does not hold never comes: go on from the next that is there.
    if (last !== null && early.size > 0 && !early.has(last + 1)) {
      const above = [...early.keys()].filter((known) => known > last!);
      if (above.length > 0) last = Math.min(...above) - 1;
    }
    filling = false;
    drain();
  }

  return {
    open() {
      opening ??= revision().then(
        (at) => {
          last = at;
          drain();
        },
        (error: unknown) => {
          opening = null;
          throw error;
        },
      );
      return opening;
    },
    put(impact) {
      early.set(impact.revision, impact);
      drain();
    },
  };
}
