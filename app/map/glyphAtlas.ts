import { GLYPHS } from './marks';
import type { Glyph } from './marks';

const CELL = 48;

type Draw = (path: Path2D, r: number) => void;
const polygon = (corners: [number, number][]): Draw => (path, r) => {
  corners.forEach(([x, y], i) => (i === 0 ? path.moveTo(x * r, y * r) : path.lineTo(x * r, y * r)));
  path.closePath();
};

/** Each shape in a circle of radius 1, y down. */
const DRAW: Record<Exclude<Glyph, 'dot'>, Draw> = {
  cross: polygon([[-0.32, -0.95], [0.32, -0.95], [0.32, -0.32], [0.95, -0.32], [0.95, 0.32], [0.32, 0.32], [0.32, 0.95], [-0.32, 0.95], [-0.32, 0.32], [-0.95, 0.32], [-0.95, -0.32], [-0.32, -0.32]]),
  house: polygon([[0, -0.95], [0.85, -0.15], [0.85, 0.85], [-0.85, 0.85], [-0.85, -0.15]]),
  bar: polygon([[-1, -0.4], [1, -0.4], [1, 0.4], [-1, 0.4]]),
  diamond: polygon([[0, -1], [0.85, 0], [0, 1], [-0.85, 0]]),
  square: polygon([[-0.78, -0.78], [0.78, -0.78], [0.78, 0.78], [-0.78, 0.78]]),
  triangle: polygon([[0, -0.9], [0.95, 0.75], [-0.95, 0.75]]),
  hexagon: polygon([[0.5, -0.87], [1, 0], [0.5, 0.87], [-0.5, 0.87], [-1, 0], [-0.5, -0.87]]),
  ring: (path, r) => path.arc(0, 0, r * 0.9, 0, 2 * Math.PI),
};

/** SVG path of a glyph of radius `r` about the origin, for the legend. */
export function glyphPath(glyph: Exclude<Glyph, 'dot'>, r: number): string {
  const parts: string[] = [];
  const pen = {
    moveTo: (x: number, y: number) => parts.push(`M${x} ${y}`),
    lineTo: (x: number, y: number) => parts.push(`L${x} ${y}`),
    closePath: () => parts.push('Z'),
    arc: (_x: number, _y: number, radius: number) => parts.push(`M${-radius} 0a${radius} ${radius} 0 1 0 ${2 * radius} 0a${radius} ${radius} 0 1 0 ${-2 * radius} 0`),
  };
  DRAW[glyph](pen as unknown as Path2D, r);
  return parts.join('');
}

export interface GlyphAtlas {
  image: HTMLCanvasElement;
  mapping: Record<string, { x: number; y: number; width: number; height: number; mask: true }>;
}

/** All shapes on one canvas, white, to be tinted by the map. `name` is filled, `name-under` a little larger for the outline. */
export function makeGlyphAtlas(): GlyphAtlas {
  const image = document.createElement('canvas');
  image.width = CELL * GLYPHS.length;
  image.height = CELL * 2;
  const context = image.getContext('2d')!;
  context.fillStyle = '#ffffff';
  const mapping: GlyphAtlas['mapping'] = {};
  GLYPHS.forEach((glyph, i) => {
    (['', '-under'] as const).forEach((kind, row) => {
      const path = new Path2D();
      DRAW[glyph](path, CELL * 0.34);
      context.setTransform(1, 0, 0, 1, i * CELL + CELL / 2, row * CELL + CELL / 2);
      context.fill(path);
      if (kind === '-under') {
        context.strokeStyle = '#ffffff';
        context.lineWidth = CELL * 0.2;
        context.lineJoin = 'round';
        context.stroke(path);
      }
      mapping[`${glyph}${kind}`] = { x: i * CELL, y: row * CELL, width: CELL, height: CELL, mask: true };
    });
  });
  return { image, mapping };
}
