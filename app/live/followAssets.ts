import type { StoreApi } from 'zustand/vanilla';
import { fetchAssets } from '../http/api';
import type { Bulk } from './bulk';
import type { LiveEvent } from './connect';
import type { View } from './view';

/** A class of more than this is not fetched whole for the sake of one card. */
const MOST_ROWS = 1000;

/** Fetches the rows of a class of assets when one of it is pointed at, once a revision. Returns the function that stops. */
export function followAssets({ store }: LiveEvent, bulk: StoreApi<Bulk>, view: StoreApi<View>): () => void {
  const asked = new Set<string>();
  return view.subscribe(({ hoverMark }, before) => {
    if (hoverMark === null || hoverMark === before.hoverMark) return;
    const { marks, layers } = bulk.getState();
    const { impact, eventId } = store.getState();
    const name = marks?.classes[marks.classIndex[hoverMark]];
    if (!marks || !impact || name === undefined) return;
    const count = layers.reduce((sum, layer) => sum + (layer.classes.find((one) => one.class === name)?.count ?? 0), 0);
    const wish = `${impact.revision} ${name}`;
    if (count === 0 || count > MOST_ROWS || asked.has(wish)) return;
    asked.add(wish);
    fetchAssets(eventId, { revision: impact.revision, class: name, limit: MOST_ROWS }).then(
      (rows) => {
        const held = bulk.getState().assets;
        const byClass = held.revision === impact.revision ? held.byClass : {};
        if (held.revision <= impact.revision) bulk.setState({ assets: { revision: impact.revision, byClass: { ...byClass, [name]: Object.fromEntries(rows.map((row) => [row.id, row])) } } });
      },
      () => asked.delete(wish),
    );
  });
}
