import type { Layer } from '@deck.gl/core';
import { useEffect, useMemo, useState } from 'react';
import { useStore } from 'zustand';
import type { StoreApi } from 'zustand/vanilla';
import { useBulk, useLive, useView } from '../live/EventContext';
import { themeStore } from '../prefs/theme';
import { bandOf } from '../theme/bands';
import { drawCoast, drawGround } from './drawGround';
import { drawMarks, prepareMarks } from './drawMarks';
import { drawSwath } from './drawSwath';
import { drawZones } from './drawZones';
import { makeGlyphAtlas } from './glyphAtlas';
import { graticuleLines, graticuleStep } from './graticule';
import { boxAround, COARSE_WORLD, landWish, loadLand } from './land';
import type { Land, LandWish } from './land';
import type { MapState } from './mapState';
import { palette } from './palette';

const DEMO_COAST = JSON.stringify({ path: '/demo/coast.geojson', box: null } satisfies LandWish);

/** The wish as text, so that a view that wants the same land does not ask again. */
function useLand(wish: string | null): Land | null {
  const [land, setLand] = useState<Land | null>(null);
  useEffect(() => {
    if (!wish) return;
    let wanted = true;
    loadLand(JSON.parse(wish) as LandWish).then((found) => wanted && setLand(found), () => undefined);
    return () => {
      wanted = false;
    };
  }, [wish]);
  return land;
}

/** All layers of the map, bottom first: graticule, land, zones, swath, coast, outlines, assets. */
export function useLayers(map: StoreApi<MapState>): Layer[] {
  const theme = useStore(themeStore, (state) => state.theme);
  const paint = useMemo(() => palette(theme, (name) => getComputedStyle(document.documentElement).getPropertyValue(name)), [theme]);
  // As text, so that a view within the same box draws nothing anew.
  const grid = useStore(map, (state) => JSON.stringify({ step: graticuleStep(state.camera), ...boxAround(state.camera, state.size) }));
  const zoom = useStore(map, (state) => Math.round(state.camera.zoom * 4) / 4);
  const demo = useLive((state) => state.event?.demo ?? false);
  // The exercise's country lies in open ocean: the fine coast of the real world would be fetched for nothing.
  const wish = useStore(map, (state) => JSON.stringify(demo ? COARSE_WORLD : landWish(state.camera, state.size)));
  const world = useLand(wish);
  const coast = useLand(demo ? DEMO_COAST : null);
  const areas = useBulk((state) => state.swath?.areas);
  const zones = useBulk((state) => state.zones);
  const marks = useBulk((state) => state.marks);
  // Which band each zone is in: the same for the revision that only adds members, so that nothing is drawn again.
  const bands = useLive((state) => state.impact?.zones.map((zone) => `${zone.id}=${bandOf(zone.maxWindKt) ?? ''}`).join('\n') ?? '');
  const hidden = useView((state) => state.hiddenClasses);
  const preview = useView((state) => state.preview !== null);
  const atlas = useMemo(() => makeGlyphAtlas(), []);

  const meridians = useMemo(() => graticuleLines(JSON.parse(grid) as Parameters<typeof graticuleLines>[0]), [grid]);
  const lands = useMemo(() => [...(world ? [{ id: 'world', land: world }] : []), ...(coast ? [{ id: 'demo', land: coast }] : [])], [world, coast]);
  const shown = preview ? '' : bands;
  const level = Math.floor(zoom);
  const drawn = useMemo(() => marks && prepareMarks(marks, hidden, level, paint), [marks, hidden, level, paint]);

  return useMemo(() => {
    const { fills, lines } = drawZones(zones, shown, level, paint);
    return [
      ...drawGround(lands, meridians, paint),
      ...fills,
      // A forecast that is only looked at has no swath yet: the one of the last revision would mislead.
      ...(areas && !preview ? drawSwath(areas, level, paint) : []),
      ...drawCoast(lands, level, paint),
      ...lines,
      ...(drawn && !preview ? drawMarks(drawn, atlas, zoom, paint) : []),
    ];
  }, [lands, meridians, paint, zones, shown, areas, preview, drawn, atlas, zoom, level]);
}
