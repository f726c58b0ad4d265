import { IconLayer, ScatterplotLayer } from '@deck.gl/layers';
import type { Layer } from '@deck.gl/core';
import type { Marks } from '../http/api';
import type { GlyphAtlas } from './glyphAtlas';
import { markClasses, markColumns, marksWhere, thinned } from './marks';
import type { MarkColumns } from './marks';
import type { Palette, Rgba } from './palette';
import { withAlpha } from './palette';

export interface DrawnMarks {
  /** As the map takes it: the same object for as long as nothing changes. */
  dots: { length: number; attributes: Record<string, { value: Float64Array | Uint8Array; size: number; normalized?: boolean }> };
  glyphs: { index: number; glyph: string; position: [number, number]; sizePx: number; colour: Rgba }[];
}

/** Shapes of a class with more than this are drawn smaller. */
const CROWD = 200;

/** Columns and icons for the classes that are shown. */
export function prepareMarks(marks: Marks, hidden: ReadonlySet<string>, zoomLevel: number, palette: Palette): DrawnMarks {
  const classes = new Map(markClasses(marks).map((one) => [one.name, one]));
  const shown = (name: string): boolean => !hidden.has(name);
  const dots = dotData(markColumns(marks, thinned(marks, marksWhere(marks, (name) => shown(name) && classes.get(name)?.glyph === 'dot'), zoomLevel), palette));
  const chosen = marksWhere(marks, (name) => shown(name) && classes.get(name)?.glyph !== 'dot');
  const columns = markColumns(marks, chosen, palette);
  const glyphs = Array.from(columns.index, (index, i) => ({
    index,
    glyph: classes.get(marks.classes[marks.classIndex[index]])!.glyph,
    sizePx: classes.get(marks.classes[marks.classIndex[index]])!.count > CROWD ? 8 : 12,
    position: [columns.positions[i * 2], columns.positions[i * 2 + 1]] as [number, number],
    colour: Array.from(columns.colours.subarray(i * 4, i * 4 + 4)) as Rgba,
  }));
  return { dots, glyphs };
}

const dotData = ({ index, positions, colours }: MarkColumns): DrawnMarks['dots'] => ({
  length: index.length,
  attributes: { getPosition: { value: positions, size: 2 }, getFillColor: { value: colours, size: 4, normalized: true } },
});

/** Dots by the ten thousand from typed arrays, shapes for what is few. */
export function drawMarks({ dots, glyphs }: DrawnMarks, atlas: GlyphAtlas, zoom: number, palette: Palette): Layer[] {
  // Marks grow as one comes nearer; from afar thousands of dots are a tint, not a cover.
  const near = Math.max(0, Math.min(1, (zoom - 6) / 4));
  const icon = { data: glyphs, iconAtlas: atlas.image as unknown as string, iconMapping: atlas.mapping, sizeUnits: 'pixels' as const, sizeScale: 1 + 0.8 * near, getSize: (mark: DrawnMarks['glyphs'][number]) => mark.sizePx, getPosition: (mark: DrawnMarks['glyphs'][number]) => mark.position };
  return [
    new ScatterplotLayer({
      id: 'dots',
      data: dots,
      radiusUnits: 'pixels',
      getRadius: 1,
      radiusScale: 0.75 + 2 * near,
      opacity: 0.45 + 0.45 * near,
      stroked: false,
    }),
    new IconLayer<DrawnMarks['glyphs'][number]>({ ...icon, id: 'glyph-under', getIcon: (mark) => `${mark.glyph}-under`, getColor: withAlpha(palette.halo, 0.85) }),
    new IconLayer<DrawnMarks['glyphs'][number]>({ ...icon, id: 'glyph', getIcon: (mark) => mark.glyph, getColor: (mark) => mark.colour }),
  ];
}
