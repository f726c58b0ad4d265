import { readFileSync } from 'node:fs';
import { describe, expect, test } from 'vitest';
import { bandColours, chanceColour, THEMES } from '../../app/theme/bands';
import type { Theme } from '../../app/theme/bands';
import { THRESHOLD_KEYS } from '../../lib/units';

/** Relative luminance and contrast ratio: WCAG 2.2, definitions of the same names. */
function luminance(hex: string): number {
  const linear = [1, 3, 5].map((at) => {
    const channel = parseInt(hex.slice(at, at + 2), 16) / 255;
    return channel <= 0.04045 ? channel / 12.92 : ((channel + 0.055) / 1.055) ** 2.4;
  });
  return 0.2126 * linear[0] + 0.7152 * linear[1] + 0.0722 * linear[2];
}
const ratio = (a: string, b: string): number => {
  const [low, high] = [luminance(a), luminance(b)].sort((x, y) => x - y);
  return (high + 0.05) / (low + 0.05);
};

const sheet = readFileSync(new URL('../../app/theme/tokens.css', import.meta.url), 'utf8');
function tokens(theme: Theme): Record<string, string> {
  const block = sheet.match(new RegExp(`data-theme='${theme}'\\] \\{([^}]*)\\}`))![1];
  return Object.fromEntries([...block.matchAll(/--([\w-]+): (#[0-9a-f]{6});/g)].map(([, name, value]) => [name, value]));
}

test('black on white is 21 to 1 (WCAG 2.2)', () => {
  expect(ratio('#000000', '#ffffff')).toBeCloseTo(21, 6);
});

describe.each(THEMES)('%s theme', (theme) => {
  const colour = tokens(theme);
  const papers = ['ground', 'panel'] as const;

  test.each(['ink', 'dim', 'overdue', 'soon'])('text in %s stands 4.5 to 1 off the paper (WCAG 2.2, 1.4.3)', (name) => {
    for (const paper of papers) expect(ratio(colour[name], colour[paper]), `${name} on ${paper}`).toBeGreaterThanOrEqual(4.5);
  });

  test('map labels stand 4.5 to 1 off their halo, the sea and the land', () => {
    for (const under of ['halo', 'sea', 'land']) expect(ratio(colour.ink, colour[under]), under).toBeGreaterThanOrEqual(4.5);
    for (const under of ['halo', 'sea']) expect(ratio(colour.dim, colour[under]), under).toBeGreaterThanOrEqual(4.5);
  });

  test.each(['control', 'focus', 'exercise'])('the mark %s stands 3 to 1 off the paper (WCAG 2.2, 1.4.11)', (name) => {
    for (const paper of papers) expect(ratio(colour[name], colour[paper]), `${name} on ${paper}`).toBeGreaterThanOrEqual(3);
  });

  test('the coast stands 3 to 1 off the sea', () => {
    expect(ratio(colour.coast, colour.sea)).toBeGreaterThanOrEqual(3);
  });

  test.each(THRESHOLD_KEYS)('the edge of the %s kt band stands 3 to 1 off the paper', (key) => {
    for (const paper of papers) expect(ratio(bandColours(theme)[key].edge, colour[paper]), paper).toBeGreaterThanOrEqual(3);
  });

  test('a stronger band lies further from the paper, at least 1.5 to 1 from the one before', () => {
    const off = THRESHOLD_KEYS.map((key) => ratio(bandColours(theme)[key].fill, colour.ground));
    expect(off[1] / off[0]).toBeGreaterThanOrEqual(1.5);
    expect(off[2] / off[1]).toBeGreaterThanOrEqual(1.5);
  });

  test('a likelier chance lies further from the paper', () => {
    const off = [0.05, 0.25, 0.5, 0.75, 1].map((chance) => ratio(toHex(chanceColour(theme, chance)), colour.ground));
    expect([...off].sort((a, b) => a - b)).toEqual(off);
  });
});

function toHex(css: string): string {
  const channels = css.startsWith('#') ? null : css.match(/\d+/g);
  return channels ? `#${channels.map((c) => Number(c).toString(16).padStart(2, '0')).join('')}` : css;
}
