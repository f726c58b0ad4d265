import { describe, expect, test } from 'vitest';
import { linChavasBackground, schwerdtAsymmetryKt } from '../../lib/wind';

describe('motion asymmetry', () => {
  test('is greatest to the right of the way in the north, to the left in the south', () => {
    const azimuths = Array.from({ length: 72 }, (_, i) => i * 5);
    const strongest = (lat: number): number => azimuths.reduce((best, azimuth) => (schwerdtAsymmetryKt(azimuth, 12, 300, lat) > schwerdtAsymmetryKt(best, 12, 300, lat) ? azimuth : best));
    expect(strongest(20)).toBe(30);
    expect(strongest(-20)).toBe(210);
  });

  test('vanishes for a storm at rest, and over a full circle', () => {
    expect(schwerdtAsymmetryKt(90, 0, 0, 20)).toBe(0);
    const sum = [0, 90, 180, 270].reduce((total, azimuth) => total + schwerdtAsymmetryKt(azimuth, 15, 40, 20), 0);
    expect(sum).toBeCloseTo(0, 9);
  });

  test('the background wind turns to the left of the way in the north, to the right in the south', () => {
    expect(linChavasBackground(10, 10, 20).towardDeg).toBeCloseTo(350, 9);
    expect(linChavasBackground(10, 350, -20).towardDeg).toBeCloseTo(10, 9);
  });
});
