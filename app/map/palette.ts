import type { Theme } from '../theme/bands';
import { bandColours } from '../theme/bands';
import { THRESHOLD_KEYS } from '../../lib/units';
import type { ByThreshold } from '../../lib/units';

/** Red, green, blue, opacity; 0 to 255. */
export type Rgba = [number, number, number, number];

export interface Palette {
  land: Rgba;
  coast: Rgba;
  graticule: Rgba;
  ink: Rgba;
  halo: Rgba;
  control: Rgba;
  band: ByThreshold<{ fill: Rgba; edge: Rgba }>;
  theme: Theme;
}

/** Reads `#rrggbb` and `rgb(r, g, b)`. */
export function rgba(colour: string, alpha = 255): Rgba {
  const text = colour.trim();
  const [r, g, b] = text.startsWith('#') ? [1, 3, 5].map((at) => parseInt(text.slice(at, at + 2), 16)) : (text.match(/[\d.]+/g) ?? []).map(Number);
  return [r, g, b, alpha];
}

/** The tokens of the page in the form the map wants. `token` gives a custom property of the page. */
export function palette(theme: Theme, token: (name: string) => string): Palette {
  const colours = bandColours(theme);
  const bands = THRESHOLD_KEYS.map((key) => [key, { fill: rgba(colours[key].fill), edge: rgba(colours[key].edge) }]);
  return {
    land: rgba(token('--land')),
    coast: rgba(token('--coast')),
    graticule: rgba(token('--graticule')),
    ink: rgba(token('--ink')),
    halo: rgba(token('--halo')),
    control: rgba(token('--control')),
    band: Object.fromEntries(bands) as Palette['band'],
    theme,
  };
}

export const withAlpha = ([r, g, b]: Rgba, alpha: number): Rgba => [r, g, b, Math.round(alpha * 255)];
