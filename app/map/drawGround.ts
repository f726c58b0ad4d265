import { LineLayer, SolidPolygonLayer } from '@deck.gl/layers';
import type { Layer } from '@deck.gl/core';
import type { Land } from './land';
import type { Palette } from './palette';
import { withAlpha } from './palette';
import type { Polygon } from './shapes';
import { byLevel, segmentsOf, thinLine } from './thinLine';
import type { Segment } from './thinLine';

/** Graticule under everything, then land. Sea is the paper. */
export function drawGround(lands: { id: string; land: Land }[], lines: Segment[], palette: Palette): Layer[] {
  return [
    new LineLayer<Segment>({
      id: 'graticule',
      data: lines,
      getSourcePosition: ([from]) => from as [number, number],
      getTargetPosition: ([, to]) => to as [number, number],
      getColor: palette.graticule,
      getWidth: 1,
      widthUnits: 'pixels',
      updateTriggers: { getColor: palette.theme },
    }),
    ...lands.map(
      ({ id, land }) =>
        new SolidPolygonLayer<Polygon>({
          id: `land-${id}`,
          data: land.polygons,
          getPolygon: (polygon) => polygon as [number, number][][],
          getFillColor: palette.land,
          extruded: false,
          updateTriggers: { getFillColor: palette.theme },
        }),
    ),
  ];
}

const shore = byLevel((land: Land, level) => segmentsOf(land.outlines.map((line) => thinLine(line, level))));

/** Coastlines, over the swath so that the shore stays readable. */
export const drawCoast = (lands: { id: string; land: Land }[], level: number, palette: Palette): Layer[] =>
  lands.map(
    ({ id, land }) =>
      new LineLayer<Segment>({
        id: `coast-${id}`,
        data: shore(land, level),
        getSourcePosition: ([from]) => from as [number, number],
        getTargetPosition: ([, to]) => to as [number, number],
        getColor: withAlpha(palette.coast, 0.85),
        getWidth: 1,
        widthUnits: 'pixels',
        updateTriggers: { getColor: palette.theme },
      }),
  );
