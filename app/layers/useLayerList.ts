import { useCallback, useEffect } from 'react';
import { fetchLayers } from '../http/api';
import { useHold } from '../live/EventContext';

/** Fetches the list of layers when the page opens, and again when asked. */
export function useLayerList(eventId: string): { refresh: () => void } {
  const { bulk } = useHold();
  const refresh = useCallback(() => {
    fetchLayers(eventId).then((layers) => bulk.setState({ layers }), () => undefined);
  }, [eventId, bulk]);
  useEffect(refresh, [refresh]);
  return { refresh };
}
