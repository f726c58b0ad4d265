import { PathLayer, SolidPolygonLayer } from '@deck.gl/layers';
import type { Layer } from '@deck.gl/core';
import type { Position } from 'geojson';
import type { Area, Swath } from '../live/bulk';
import { chanceColour } from '../theme/bands';
import type { ThresholdKey } from '../../lib/units';
import { outlinesOf } from './shapes';
import type { Polygon } from './shapes';
import type { Palette, Rgba } from './palette';
import { rgba, withAlpha } from './palette';

/** How much of the ground each band hides: land and zones stay readable under all of them. */
const COVER: Record<Palette['theme'], Record<ThresholdKey, number>> = {
  night: { '34': 0.55, '50': 0.6, '64': 0.68 },
  day: { '34': 0.5, '50': 0.58, '64': 0.72 },
};

interface Piece {
  area: Area;
  polygon: Polygon;
}

const band = (area: Area): ThresholdKey => String(area.thresholdKt) as ThresholdKey;

function fill(area: Area, palette: Palette): Rgba {
  if (area.chance === null) return withAlpha(palette.band[band(area)].fill, COVER[palette.theme][band(area)]);
  // Chances nest: each step covers the one below, so that its colour is the legend's.
  return withAlpha(rgba(chanceColour(palette.theme, area.chance)), 0.82);
}

const edge = (area: Area, palette: Palette): Rgba => (area.chance === null ? palette.band[band(area)].edge : rgba(chanceColour(palette.theme, area.chance)));

const cache = new WeakMap<Swath, { pieces: Piece[]; lines: { area: Area; line: Position[] }[] }>();

function parts(swath: Swath) {
  let found = cache.get(swath);
  if (!found) {
    found = {
      pieces: swath.areas.flatMap((area) => area.polygons.map((polygon) => ({ area, polygon }))),
      lines: swath.areas.flatMap((area) => outlinesOf(area.polygons).map((line) => ({ area, line }))),
    };
    cache.set(swath, found);
  }
  return found;
}

/** The bands of one revision: weakest below, each with its edge. */
export function drawSwath(swath: Swath, palette: Palette): Layer[] {
  const { pieces, lines } = parts(swath);
  return [
    new SolidPolygonLayer<Piece>({
      id: 'swath',
      data: pieces,
      getPolygon: ({ polygon }) => polygon as [number, number][][],
      getFillColor: ({ area }) => fill(area, palette),
      extruded: false,
      updateTriggers: { getFillColor: palette.theme },
    }),
    new PathLayer<{ area: Area; line: Position[] }>({
      id: 'swath-edge',
      data: lines,
      getPath: ({ line }) => line as [number, number][],
      getColor: ({ area }) => edge(area, palette),
      getWidth: 1.25,
      widthUnits: 'pixels',
      jointRounded: true,
      updateTriggers: { getColor: palette.theme },
    }),
  ];
}
