import { describe, expect, test } from 'vitest';
import { SURFACES } from '../../lib/units';
import { gustFactor, surfaceFactor, surfaceOf } from '../../lib/wind';

describe('surface', () => {
  test('the rougher, the less sustained wind and the more gust over it', () => {
    const [marine, open, builtUp] = SURFACES;
    expect(surfaceFactor(marine)).toBe(1);
    expect(surfaceFactor(open)).toBeGreaterThan(surfaceFactor(builtUp));
    expect(gustFactor(marine)).toBeLessThan(gustFactor(open));
    expect(gustFactor(open)).toBeLessThan(gustFactor(builtUp));
  });

  test('no gust over land is above the gust over water beside it', () => {
    const gust = SURFACES.map((surface) => surfaceFactor(surface) * gustFactor(surface));
    expect(Math.max(...gust)).toBe(gust[0]);
  });

  test('the shore itself is marine', () => {
    expect([-50, 0, 0.1, 0.3, 20].map(surfaceOf)).toEqual(['marine', 'marine', 'marine', 'open', 'open']);
  });
});
