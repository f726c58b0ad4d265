import { useCallback, useEffect } from 'react';
import type { StoreApi } from 'zustand/vanilla';
import { useBulk, useLive, useView } from '../live/EventContext';
import type { MapState } from './mapState';
import { boundsOf, fitted, nearestTurn } from './mercator';
import type { Bounds } from './mercator';

/** The view leans towards the storm by at most this share of what is worked on, so that the zones stay large. */
const LEAN = 0.22;
const PADDING = { top: 26, right: 40, bottom: 40, left: 40 };

/** Shows the zones (else the assets, else the track), leaning towards the storm; a preview shows all its points. */
export function useFit(map: StoreApi<MapState>): () => void {
  const zones = useBulk((state) => state.zones);
  const marks = useBulk((state) => state.marks);
  const advisory = useLive((state) => state.advisory);
  const preview = useView((state) => state.preview);

  const fit = useCallback(() => {
    const { size } = map.getState();
    if (size.width === 0) return;
    const points = (preview ?? advisory)?.points.map((point) => [point.lon, point.lat] as const) ?? [];
    const places = zones.length > 0 ? zones.flatMap((zone) => zone.polygons.flatMap((polygon) => polygon[0] as [number, number][])) : (marks?.lon.map((lon, i) => [lon, marks.lat[i]] as const) ?? []);
    const bounds = preview ? boundsOf(points) : (withStorm(boundsOf(places), points[0]) ?? boundsOf(points));
    if (!bounds) return;
    const camera = fitted(bounds, size, PADDING, 8);
    const { camera: held } = map.getState();
    // The same view again must not cost a redraw.
    const same = held.lon === camera.lon && held.lat === camera.lat && held.zoom === camera.zoom;
    map.setState({ camera: same ? held : camera, moved: false });
  }, [map, zones, marks, advisory, preview]);

  useEffect(() => {
    if (!map.getState().moved || preview) fit();
    let before = map.getState().size;
    return map.subscribe((now) => {
      if (now.size !== before) {
        before = now.size;
        if (!now.moved) fit();
      }
    });
  }, [fit, map, preview]);
  return fit;
}

function withStorm(bounds: Bounds | null, centre: readonly [number, number] | undefined): Bounds | null {
  if (!bounds || !centre) return bounds;
  const lon = nearestTurn(centre[0], (bounds.west + bounds.east) / 2);
  const [wide, tall] = [(bounds.east - bounds.west) * LEAN, (bounds.north - bounds.south) * LEAN];
  return {
    west: Math.max(bounds.west - wide, Math.min(bounds.west, lon)),
    east: Math.min(bounds.east + wide, Math.max(bounds.east, lon)),
    south: Math.max(bounds.south - tall, Math.min(bounds.south, centre[1])),
    north: Math.min(bounds.north + tall, Math.max(bounds.north, centre[1])),
  };
}
