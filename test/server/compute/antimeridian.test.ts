import { describe, expect, test } from 'vitest';
import { SURFACES } from '../../../lib/exposure';
import { compile } from '../../../server/compute/worker';

const surfacesOf = (key: string, csv: string): string[] => {
  const bytes = new TextEncoder().encode(csv);
  const { places } = compile({ key, coastFile: null, layers: [{ id: 'L', kind: 'assets', name: 'Sites', bytes, contentType: 'text/csv', fileName: 'sites.csv' }] });
  return Array.from(places.surface, (index) => SURFACES[index]);
};

describe('assets by the 180th meridian are compiled, and stand on the ground of Natural Earth (1:10 million)', () => {
  test('on both sides of it, as in Fiji', () => {
    // Inland Viti Levu (178.0 E) and open sea at 178.5 W.
    expect(surfacesOf('fiji', 'name,lat,lon\nInland,-17.8,178.0\nReef,-18,-178.5').sort()).toEqual(['marine', 'open']);
  });

  test('on it', () => {
    expect(surfacesOf('on', 'name,lat,lon\nA,-17,180\nB,-17.1,-180')).toHaveLength(2);
  });

  test('and by the pole', () => {
    expect(surfacesOf('pole', 'name,lat,lon\nA,89.9,0')).toEqual(['marine']);
  });
});
