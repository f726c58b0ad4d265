import type { CheckContext } from './checks';
import type { Format, InputError, Warning } from './model';

/** How a file is to be read, and what its advisory is held against. `technique` and `cycle` (`2026092512`) choose within a deck. */
export interface ReadOptions extends CheckContext {
  format?: Format;
  technique?: string;
  cycle?: string;
}

/** Where in the file something stands, counted from 1. */
export interface Place {
  line?: number;
  column?: number;
}

/** What a reader found: an advisory not yet checked, where its parts stand (`points.3.lat`), and what to look at. */
export interface Draft {
  advisory: unknown;
  /** The place of the nearest part known: of `points.3` where `points.3.lat` has none. */
  placeOf: (path: string) => Place;
  warnings: Warning[];
}

export type Read = { ok: true; draft: Draft } | { ok: false; errors: InputError[] };

export const failed = (errors: InputError | readonly InputError[]): Read => ({ ok: false, errors: [errors].flat() as InputError[] });

/** What is known of a path, or of the nearest part around it. */
export function nearest<T>(known: ReadonlyMap<string, T>, path: string): T | undefined {
  for (let key = path; key !== ''; key = key.slice(0, Math.max(0, key.lastIndexOf('.')))) {
    const found = known.get(key);
    if (found !== undefined) return found;
  }
  return undefined;
}
