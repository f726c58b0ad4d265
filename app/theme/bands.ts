import { interpolateCividis, interpolateMagma } from 'd3-scale-chromatic';
import { THRESHOLD_KEYS } from '../../lib/units';
import type { ByThreshold, ThresholdKey } from '../../lib/units';

export const THEMES = ['night', 'day'] as const;
export type Theme = (typeof THEMES)[number];

export interface BandColour {
  /** Area colour, `#rrggbb`. */
  fill: string;
  /** Outline: the step of the same map that stands at least 3:1 off the paper. */
  edge: string;
}

/**
 * Where each band sits on magma (van der Walt and Smith, 2015; perceptually uniform), 0 black to 1 pale:
 * the stronger the wind, the further from the paper.
 */
const STEPS: Record<Theme, ByThreshold<{ fill: number; edge: number }>> = {
  night: { '34': { fill: 0.36, edge: 0.5 }, '50': { fill: 0.6, edge: 0.66 }, '64': { fill: 0.86, edge: 0.9 } },
  day: { '34': { fill: 0.78, edge: 0.63 }, '50': { fill: 0.54, edge: 0.48 }, '64': { fill: 0.28, edge: 0.22 } },
};

export function bandColours(theme: Theme): ByThreshold<BandColour> {
  const colour = (key: ThresholdKey): BandColour => ({
    fill: interpolateMagma(STEPS[theme][key].fill),
    edge: interpolateMagma(STEPS[theme][key].edge),
  });
  return { '34': colour('34'), '50': colour('50'), '64': colour('64') };
}

/** The strongest band a sustained wind (kt) falls in, or null below 34 kt. */
export function bandOf(windKt: number): ThresholdKey | null {
  if (windKt >= 64) return '64';
  if (windKt >= 50) return '50';
  return windKt >= 34 ? '34' : null;
}

/** Chance 0 to 1 on cividis (Nunez, Anderton and Renslow, 2018), the likelier the further from the paper. */
export function chanceColour(theme: Theme, chance: number): string {
  return interpolateCividis(theme === 'night' ? 0.3 + 0.7 * chance : 0.8 - 0.8 * chance);
}

/** The bands as custom properties, one rule a theme: `--band-34`, `--band-34-edge` and so on. */
export function bandStyleSheet(): string {
  return THEMES.map((theme) => {
    const colours = bandColours(theme);
    const rules = THRESHOLD_KEYS.map((key) => `--band-${key}:${colours[key].fill};--band-${key}-edge:${colours[key].edge}`);
    return `:root[data-theme='${theme}']{${rules.join(';')}}`;
  }).join('\n');
}
