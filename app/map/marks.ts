import type { Marks } from '../http/api';
import { bandOf } from '../theme/bands';
import { worldX, worldY } from './mercator';
import type { Palette, Rgba } from './palette';
import { withAlpha } from './palette';

/** Shapes of the small marks; the names are those in the atlas. */
export const GLYPHS = ['cross', 'house', 'bar', 'diamond', 'square', 'triangle', 'hexagon', 'ring'] as const;
export type Glyph = (typeof GLYPHS)[number] | 'dot';

const USUAL: [RegExp, Glyph][] = [
  [/hospital|clinic|health/i, 'cross'],
  [/shelter|school/i, 'house'],
  [/bridge|causeway|road/i, 'bar'],
  [/substation|power|plant/i, 'diamond'],
  [/depot|yard|staging|base/i, 'square'],
];
/** A class of more than this is drawn as dots: shapes would cover one another. */
const MOST_GLYPHS = 1500;

export interface MarkClass {
  name: string;
  count: number;
  glyph: Glyph;
}

/** The classes there are, with the shape each is drawn in; few-of-a-kind first. */
export function markClasses(marks: Marks): MarkClass[] {
  const counts = new Array<number>(marks.classes.length).fill(0);
  for (const index of marks.classIndex) counts[index] += 1;
  const free = GLYPHS.filter((glyph) => !USUAL.some(([, usual]) => usual === glyph));
  let next = 0;
  const glyphFor = (name: string): Glyph => USUAL.find(([pattern]) => pattern.test(name))?.[1] ?? free[next++ % free.length];
  return marks.classes
    .map((name, i) => ({ name, count: counts[i], glyph: counts[i] > MOST_GLYPHS ? ('dot' as const) : glyphFor(name) }))
    .filter((one) => one.count > 0)
    .sort((a, b) => a.count - b.count || a.name.localeCompare(b.name));
}

const crowded = new WeakMap<Marks, ReadonlySet<number>>();

/** Indices of the classes that are drawn as dots. */
export function dotClasses(marks: Marks): ReadonlySet<number> {
  let found = crowded.get(marks);
  if (!found) {
    found = new Set(markClasses(marks).filter((one) => one.glyph === 'dot').map((one) => marks.classes.indexOf(one.name)));
    crowded.set(marks, found);
  }
  return found;
}

export interface MarkColumns {
  /** Index of each drawn mark in `Marks`. */
  index: Uint32Array;
  /** lon, lat pairs. */
  positions: Float64Array;
  /** Four bytes a mark. */
  colours: Uint8Array;
}

/** Columns for one set of marks, weakest wind first so that what is hit lies on top. Typed arrays the map takes as they are. */
export function markColumns(marks: Marks, chosen: readonly number[], palette: Palette): MarkColumns {
  const order = Uint32Array.from(chosen).sort((a, b) => marks.maxWindKt[a] - marks.maxWindKt[b]);
  const positions = new Float64Array(order.length * 2);
  const colours = new Uint8Array(order.length * 4);
  const none: Rgba = withAlpha(palette.control, 0.7);
  order.forEach((mark, i) => {
    positions[i * 2] = marks.lon[mark];
    positions[i * 2 + 1] = marks.lat[mark];
    const band = bandOf(marks.maxWindKt[mark]);
    colours.set(band ? palette.band[band].fill : none, i * 4);
  });
  return { index: order, positions, colours };
}

/** Marks of a class, or of all dot classes that are shown. */
export function marksWhere(marks: Marks, wanted: (className: string) => boolean): number[] {
  const yes = marks.classes.map(wanted);
  const chosen: number[] = [];
  marks.classIndex.forEach((index, i) => {
    if (yes[index]) chosen.push(i);
  });
  return chosen;
}

const CELL_PX = 5;
/** From here on every dot has room of its own. */
const ALL_FROM_ZOOM = 11;

/**
 * Of the marks that fall on one spot of the screen at a zoom level (a cell of five pixels), the one with the strongest wind: what
 * would be drawn over and over is drawn once. Counts never use this.
 */
export function thinned(marks: Marks, chosen: readonly number[], zoomLevel: number): number[] {
  if (zoomLevel >= ALL_FROM_ZOOM) return [...chosen];
  const strongest = new Map<number, number>();
  const across = (512 * 2 ** (zoomLevel + 1)) / CELL_PX;
  for (const mark of chosen) {
    const cell = Math.floor(worldY(marks.lat[mark], zoomLevel + 1) / CELL_PX) * across + Math.floor(worldX(marks.lon[mark], zoomLevel + 1) / CELL_PX);
    const held = strongest.get(cell);
    if (held === undefined || marks.maxWindKt[mark] > marks.maxWindKt[held]) strongest.set(cell, mark);
  }
  return [...strongest.values()];
}
