import type { Layer } from '@deck.gl/core';
import { useEffect, useMemo, useState } from 'react';
import { useStore } from 'zustand';
import type { StoreApi } from 'zustand/vanilla';
import { useBulk, useLive, useView } from '../live/EventContext';
import { themeStore } from '../prefs/theme';
import { drawCoast, drawGround } from './drawGround';
import { drawMarks, prepareMarks } from './drawMarks';
import { drawSwath } from './drawSwath';
import { drawZones } from './drawZones';
import { makeGlyphAtlas } from './glyphAtlas';
import { graticuleStep } from './graticule';
import { landPath, loadLand } from './land';
import type { Land } from './land';
import type { MapState } from './mapState';
import { palette } from './palette';

const DEMO_COAST = '/demo/coast.geojson';

function useLand(path: string | null): Land | null {
  const [land, setLand] = useState<Land | null>(null);
  useEffect(() => {
    if (!path) return;
    let wanted = true;
    loadLand(path).then((found) => wanted && setLand(found), () => undefined);
    return () => {
      wanted = false;
    };
  }, [path]);
  return land;
}

/** All layers of the map, bottom first: graticule, land, zones, swath, coast, outlines, assets. */
export function useLayers(map: StoreApi<MapState>): Layer[] {
  const theme = useStore(themeStore, (state) => state.theme);
  const paint = useMemo(() => palette(theme, (name) => getComputedStyle(document.documentElement).getPropertyValue(name)), [theme]);
  const step = useStore(map, (state) => graticuleStep(state.camera));
  const path = useStore(map, (state) => landPath(state.camera.zoom));
  const zoom = useStore(map, (state) => Math.round(state.camera.zoom * 4) / 4);
  const world = useLand(path);
  const demo = useLive((state) => state.event?.demo ?? false);
  const coast = useLand(demo ? DEMO_COAST : null);
  const swath = useBulk((state) => state.swath);
  const zones = useBulk((state) => state.zones);
  const marks = useBulk((state) => state.marks);
  const impact = useLive((state) => state.impact);
  const lit = useView((state) => state.hoverZone);
  const selected = useView((state) => state.selectedZone);
  const hidden = useView((state) => state.hiddenClasses);
  const preview = useView((state) => state.preview !== null);
  const atlas = useMemo(() => makeGlyphAtlas(), []);

  const lands = useMemo(() => [...(world ? [{ id: 'world', land: world }] : []), ...(coast ? [{ id: 'demo', land: coast }] : [])], [world, coast]);
  const winds = useMemo(() => new Map(impact?.zones.map((zone) => [zone.id, zone.maxWindKt])), [impact]);
  const drawn = useMemo(() => marks && prepareMarks(marks, hidden, paint), [marks, hidden, paint]);

  return useMemo(() => {
    const { fills, lines } = drawZones(zones, preview ? new Map() : winds, lit, selected, paint, preview ? 0 : (impact?.revision ?? 0));
    return [
      ...drawGround(lands, step, paint),
      ...fills,
      // A forecast that is only looked at has no swath yet: the one of the last revision would mislead.
      ...(swath && !preview ? drawSwath(swath, paint) : []),
      ...drawCoast(lands, paint),
      ...lines,
      ...(drawn && marks && !preview ? drawMarks(drawn, atlas, zoom, paint, `${paint.theme}-${marks.revision}-${[...hidden].join()}`) : []),
    ];
  }, [lands, step, paint, zones, winds, impact?.revision, lit, selected, swath, preview, drawn, marks, atlas, zoom, hidden]);
}
