import { useMemo } from 'react';
import { useBulk, useEventMs, useLive, useView } from '../live/EventContext';
import { trackView } from './trackView';
import type { TrackView } from './trackView';

/** The track on the map: of a forecast being looked at, else of the advisory whose figures are shown. Moves with the event's clock. */
export function useTrack(): TrackView | null {
  const preview = useView((state) => state.preview);
  const shown = useLive((state) => (state.impact && state.advisories[state.impact.advisoryId]) ?? state.advisory);
  const history = useBulk((state) => state.history);
  const nowMs = useEventMs();
  return useMemo(() => {
    const advisory = preview ?? shown;
    if (!advisory || nowMs === null) return null;
    const earlier = preview ? [] : history.filter((one) => shown !== null && one.sequence < shown.sequence);
    try {
      // A forecast that is only looked at may be of any year: all of it is drawn as lying ahead.
      return trackView(advisory, earlier, preview ? -Infinity : nowMs);
    } catch {
      // Two points at one time (a file only looked at) make no way; the table still shows them.
      return null;
    }
  }, [preview, shown, history, nowMs]);
}
