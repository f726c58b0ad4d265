import { LineLayer, SolidPolygonLayer } from '@deck.gl/layers';
import type { Layer } from '@deck.gl/core';
import type { ZoneShape } from '../live/bulk';
import type { ThresholdKey } from '../../lib/units';
import { outlinesOf } from './shapes';
import type { Polygon } from './shapes';
import type { Palette, Rgba } from './palette';
import { withAlpha } from './palette';
import { byLevel, segmentsOf, thinLine } from './thinLine';
import type { Segment } from './thinLine';

const pieces = byLevel((zones: ZoneShape[]) => zones.flatMap((zone) => zone.polygons.map((polygon) => ({ id: zone.id, polygon }))));
const lines = byLevel((zones: ZoneShape[], level) => segmentsOf(zones.flatMap((zone) => outlinesOf(zone.polygons)).map((line) => thinLine(line, level))));

/** Zones tinted by the band that reaches them, with thin outlines. `bands` is a line `id=band` a zone. */
export function drawZones(zones: ZoneShape[], bands: string, level: number, palette: Palette): { fills: Layer[]; lines: Layer[] } {
  const bandById = new Map(bands.split('\n').map((line) => [line.slice(0, line.lastIndexOf('=')), line.slice(line.lastIndexOf('=') + 1)]));
  const tint = (id: string): Rgba => {
    const band = bandById.get(id) as ThresholdKey | '' | undefined;
    return band ? withAlpha(palette.band[band].fill, 0.22) : [0, 0, 0, 0];
  };
  return {
    fills: [
      new SolidPolygonLayer<{ id: string; polygon: Polygon }>({
        id: 'zones',
        data: pieces(zones, 0),
        getPolygon: ({ polygon }) => polygon as [number, number][][],
        getFillColor: ({ id }) => tint(id),
        extruded: false,
        updateTriggers: { getFillColor: [palette.theme, bands] },
      }),
    ],
    lines: [
      new LineLayer<Segment>({
        id: 'zone-outlines',
        data: lines(zones, level),
        getSourcePosition: ([from]) => from as [number, number],
        getTargetPosition: ([, to]) => to as [number, number],
        getColor: withAlpha(palette.ink, 0.4),
        getWidth: 0.75,
        widthUnits: 'pixels',
        updateTriggers: { getColor: palette.theme },
      }),
    ],
  };
}
