import type { Identity } from '../../lib/wire';

const KEPT_MS = 30_000;
const MOST = 1000;

/** Remembers for half a minute whom a key belongs to, so that a busy client costs no database write a request. */
export function keyCache(look: (key: string) => Promise<Identity | null>, nowMs: () => number = () => performance.now()) {
  const held = new Map<string, { identity: Identity; untilMs: number }>();
  return {
    async get(key: string): Promise<Identity | null> {
      const hit = held.get(key);
      if (hit && hit.untilMs > nowMs()) return hit.identity;
      held.delete(key);
      const identity = await look(key);
      if (identity) {
        if (held.size >= MOST) held.clear();
        held.set(key, { identity, untilMs: nowMs() + KEPT_MS });
      }
      return identity;
    },
    clear: () => held.clear(),
  };
}
