import { useEffect, useState } from 'react';
import { useLive } from '../live/EventContext';

/** A town to name on the map. */
export interface Place {
  name: string;
  lon: number;
  lat: number;
  people: number;
}

/** Towns of the exercise's own country; a real event names its zones instead. */
export function usePlaces(): Place[] {
  const demo = useLive((state) => state.event?.demo ?? false);
  const [places, setPlaces] = useState<Place[]>([]);
  useEffect(() => {
    if (!demo) return;
    const stop = new AbortController();
    fetch('/demo/world.json', { signal: stop.signal })
      .then((response) => (response.ok ? response.json() : { places: [] }))
      .then((world: { places?: Place[] }) => setPlaces(world.places ?? []), () => undefined);
    return () => stop.abort();
  }, [demo]);
  return places;
}
