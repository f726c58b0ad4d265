import { LineLayer, PathLayer, SolidPolygonLayer } from '@deck.gl/layers';
import type { Layer } from '@deck.gl/core';
import type { Position } from 'geojson';
import type { Land } from './land';
import type { Palette } from './palette';
import { withAlpha } from './palette';
import type { Polygon } from './shapes';

/** Graticule under everything, then land. Sea is the paper. */
export function drawGround(lands: { id: string; land: Land }[], graticuleStep: number, palette: Palette): Layer[] {
  return [
    new LineLayer<[Position, Position]>({
      id: `graticule-${graticuleStep}`,
      data: graticuleLines(graticuleStep),
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

/** Coastlines, over the swath so that the shore stays readable. */
export const drawCoast = (lands: { id: string; land: Land }[], palette: Palette): Layer[] =>
  lands.map(
    ({ id, land }) =>
      new PathLayer<Position[]>({
        id: `coast-${id}`,
        data: land.outlines,
        getPath: (line) => line as [number, number][],
        getColor: withAlpha(palette.coast, 0.85),
        getWidth: 1,
        widthUnits: 'pixels',
        updateTriggers: { getColor: palette.theme },
      }),
  );

const lineCache = new Map<number, [Position, Position][]>();

/** Meridians and parallels are straight on this map: one piece a quarter of the globe keeps single precision exact enough. */
function graticuleLines(step: number): [Position, Position][] {
  let lines = lineCache.get(step);
  if (!lines) {
    lines = [];
    for (let lon = -180; lon < 180; lon += step) for (let lat = -80; lat < 80; lat += 20) lines.push([[lon, lat], [lon, lat + 20]]);
    for (let lat = -80; lat <= 80; lat += step) for (let lon = -180; lon < 180; lon += 30) lines.push([[lon, lat], [lon + 30, lat]]);
    lineCache.set(step, lines);
  }
  return lines;
}
