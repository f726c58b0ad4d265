import { setImmediate as nextTurn } from 'node:timers/promises';
import { openAssets } from '../compute/bulk';
import type { AssetRows } from '../compute/bulk';
import type { HttpServices } from './httpServices';
import { Refusal } from './problems';

const KEPT = 3;

/** Opens the asset rows of revisions and keeps the last few open: many pages are read of the same ones. */
export function assetReader({ store }: Pick<HttpServices, 'store'>): (eventId: string, revision: number) => Promise<AssetRows> {
  const held = new Map<string, Promise<AssetRows>>();
  const open = async (eventId: string, revision: number): Promise<AssetRows> => {
    const bytes = await store.impacts.bulk(eventId, revision, 'assets');
    if (!bytes) throw new Refusal('not-computed', `Revision ${revision} has no asset rows.`);
    const rows = await openAssets(bytes);
    // Reading the bytes took a turn of its own.
    await nextTurn();
    return rows;
  };
  return (eventId, revision) => {
    const key = `${eventId} ${revision}`;
    const rows = held.get(key) ?? open(eventId, revision);
    // Last used, last to go.
    held.delete(key);
    held.set(key, rows);
    rows.catch(() => held.delete(key));
    if (held.size > KEPT) held.delete(held.keys().next().value!);
    return rows;
  };
}
