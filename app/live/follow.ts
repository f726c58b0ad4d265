import type { StoreApi } from 'zustand/vanilla';
import { fetchAdvisories, fetchEvent, fetchLayers, fetchLayerSource, fetchMarks, fetchSwath } from '../http/api';
import { words } from '../words';
import type { Bulk } from './bulk';
import type { LiveEvent } from './connect';
import { readSwath, readZones } from './readSwath';
import type { View } from './view';

/** Runs one fetch at a time: a newer wish aborts the one before. */
function latest(): (run: (signal: AbortSignal) => Promise<void>, failed: (error: unknown) => void) => void {
  let current: AbortController | null = null;
  return (run, failed) => {
    current?.abort();
    const mine = new AbortController();
    current = mine;
    run(mine.signal).catch((error: unknown) => {
      if (!mine.signal.aborted) failed(error);
    });
  };
}

/**
 * Fetches what belongs to the revision and product on the screen, and the history when an advisory is not known yet.
 * What is shown stays until its successor is whole. Returns the function that stops.
 */
export function followRevisions({ store, session }: LiveEvent, bulk: StoreApi<Bulk>, view: StoreApi<View>): () => void {
  const { eventId } = store.getState();
  const swath = latest();
  const marks = latest();
  const history = latest();
  const layers = latest();
  const quiet = (): void => undefined;
  const asked = { swath: '', marks: 0, advisory: '', zones: '' };

  const refresh = (): void => {
    const { impact, advisory, advisories, link } = store.getState();
    const { product } = view.getState();
    if (link.state !== 'live') return;
    const newestId = advisory && impact && !advisories[impact.advisoryId] ? impact.advisoryId : advisory?.id;
    if (newestId && newestId !== asked.advisory) {
      asked.advisory = newestId;
      history(async (signal) => {
        const items = await fetchAdvisories(eventId, signal);
        bulk.setState({ history: items.sort((a, b) => a.sequence - b.sequence) });
        for (const item of items) session.tell({ kind: 'advisory', notice: { eventId, advisory: item } });
        session.tell({ kind: 'event', atMs: Date.now(), event: await fetchEvent(eventId, signal) });
      }, quiet);
    }
    if (!impact) return;
    const wish = `${impact.revision} ${product}`;
    // Chances exist once members do; until then the swath of the track stands in.
    const shown = impact.stage === 'members' ? product : 'peak';
    const held = bulk.getState().swath;
    // Members change nothing on the forecast track: the revision that brings them has the areas and marks of the one before.
    const asBefore = impact.stage === 'members' && held?.revision === impact.revision - 1 && held.advisoryId === impact.advisoryId;
    if (wish !== asked.swath && asBefore && held.product === shown) {
      asked.swath = wish;
      bulk.setState({ swath: { ...held, revision: impact.revision } });
    } else if (wish !== asked.swath) {
      asked.swath = wish;
      swath(
        async (signal) => {
          const areas = readSwath(await fetchSwath(eventId, impact.revision, shown, signal));
          bulk.setState({ swath: { revision: impact.revision, advisoryId: impact.advisoryId, product: shown, areas }, trouble: null });
        },
        () => {
          asked.swath = '';
          bulk.setState({ trouble: words.map.swathMissing });
        },
      );
    }
    if (impact.revision !== asked.marks) {
      const before = asked.marks;
      asked.marks = impact.revision;
      if (!(asBefore && before === impact.revision - 1 && bulk.getState().marks)) marks(async (signal) => bulk.setState({ marks: await fetchMarks(eventId, impact.revision, signal) }), quiet);
      layers(async (signal) => {
        const found = await fetchLayers(eventId, signal);
        bulk.setState({ layers: found });
        const zoneLayers = found.filter((layer) => layer.kind === 'zones');
        const key = zoneLayers.map((layer) => layer.id).join(' ');
        if (key === asked.zones) return;
        const shapes = await Promise.all(zoneLayers.map((layer) => fetchLayerSource(eventId, layer.id, signal)));
        asked.zones = key;
        bulk.setState({ zones: shapes.flatMap(readZones) });
      }, quiet);
    }
  };

  const stops = [store.subscribe(refresh), view.subscribe((now, before) => now.product !== before.product && refresh())];
  refresh();
  return () => stops.forEach((stop) => stop());
}
