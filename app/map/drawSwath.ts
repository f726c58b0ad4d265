import { PathLayer, SolidPolygonLayer } from '@deck.gl/layers';
import type { Layer } from '@deck.gl/core';
import type { Position } from 'geojson';
import type { Area } from '../live/bulk';
import { chanceColour } from '../theme/bands';
import type { ThresholdKey } from '../../lib/units';
import { outlinesOf } from './shapes';
import type { Polygon } from './shapes';
import type { Palette, Rgba } from './palette';
import { rgba, withAlpha } from './palette';
import { byLevel, thinLine } from './thinLine';

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

const pieces = byLevel((areas: Area[]) => areas.flatMap((area) => area.polygons.map((polygon): Piece => ({ area, polygon }))));
const lines = byLevel((areas: Area[], level) => areas.flatMap((area) => outlinesOf(area.polygons).map((line) => ({ area, line: thinLine(line, level) }))));

/** The bands of one revision: weakest below, each with its edge. */
export function drawSwath(areas: Area[], level: number, palette: Palette): Layer[] {
  return [
    new SolidPolygonLayer<Piece>({
      id: 'swath',
      data: pieces(areas, 0),
      getPolygon: ({ polygon }) => polygon as [number, number][][],
      getFillColor: ({ area }) => fill(area, palette),
      extruded: false,
      updateTriggers: { getFillColor: palette.theme },
    }),
    new PathLayer<{ area: Area; line: Position[] }>({
      id: 'swath-edge',
      data: lines(areas, level),
      getPath: ({ line }) => line as [number, number][],
      getColor: ({ area }) => edge(area, palette),
      getWidth: 1.25,
      widthUnits: 'pixels',
      jointRounded: true,
      updateTriggers: { getColor: palette.theme },
    }),
  ];
}
