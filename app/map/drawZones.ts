import { PathLayer, SolidPolygonLayer } from '@deck.gl/layers';
import type { Layer } from '@deck.gl/core';
import type { Position } from 'geojson';
import type { ZoneShape } from '../live/bulk';
import { bandOf } from '../theme/bands';
import { outlinesOf } from './shapes';
import type { Polygon } from './shapes';
import type { Palette, Rgba } from './palette';
import { withAlpha } from './palette';

const cache = new WeakMap<ZoneShape[], { pieces: { id: string; polygon: Polygon }[]; lines: { id: string; line: Position[] }[] }>();

function parts(zones: ZoneShape[]) {
  let found = cache.get(zones);
  if (!found) {
    found = {
      pieces: zones.flatMap((zone) => zone.polygons.map((polygon) => ({ id: zone.id, polygon }))),
      lines: zones.flatMap((zone) => outlinesOf(zone.polygons).map((line) => ({ id: zone.id, line }))),
    };
    cache.set(zones, found);
  }
  return found;
}

/** Zones tinted by the greatest wind that reaches them, with thin outlines. `winds` is kt by zone id; `windKey` changes with it. */
export function drawZones(zones: ZoneShape[], winds: ReadonlyMap<string, number>, palette: Palette, windKey: number): { fills: Layer[]; lines: Layer[] } {
  const { pieces, lines } = parts(zones);
  const tint = (id: string): Rgba => {
    const band = bandOf(winds.get(id) ?? 0);
    return band ? withAlpha(palette.band[band].fill, 0.22) : [0, 0, 0, 0];
  };
  return {
    fills: [
      new SolidPolygonLayer<{ id: string; polygon: Polygon }>({
        id: 'zones',
        data: pieces,
        getPolygon: ({ polygon }) => polygon as [number, number][][],
        getFillColor: ({ id }) => tint(id),
        extruded: false,
        updateTriggers: { getFillColor: [palette.theme, windKey] },
      }),
    ],
    lines: [
      new PathLayer<{ id: string; line: Position[] }>({
        id: 'zone-outlines',
        data: lines,
        getPath: ({ line }) => line as [number, number][],
        getColor: withAlpha(palette.ink, 0.4),
        getWidth: 0.75,
        widthUnits: 'pixels',
        updateTriggers: { getColor: palette.theme },
      }),
    ],
  };
}
