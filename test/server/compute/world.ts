import { writeFileSync } from 'node:fs';
import type { LayerInput } from '../../../server/compute/tasks';

const bytes = (text: string): Uint8Array => new TextEncoder().encode(text);

/** A square island of 100 km around 26 N 48 W, its people on a grid, two zones, and three assets. */
export function writeIsland(file: string): void {
  const ring = [[-48.5, 25.5], [-47.5, 25.5], [-47.5, 26.5], [-48.5, 26.5], [-48.5, 25.5]];
  writeFileSync(file, JSON.stringify({ type: 'FeatureCollection', features: [{ type: 'Feature', properties: {}, geometry: { type: 'Polygon', coordinates: [ring] } }] }));
}

export function islandLayers(): LayerInput[] {
  const cells = ['lat,lon,people'];
  for (let i = 0; i < 40; i++) for (let j = 0; j < 40; j++) cells.push(`${(25.52 + i * 0.024).toFixed(3)},${(-48.48 + j * 0.024).toFixed(3)},${10 + ((i * 7 + j) % 13)}`);
  const zone = (id: string, name: string, west: number, east: number) => ({
    type: 'Feature',
    properties: { id, name, clearanceHours: 10 },
    geometry: { type: 'Polygon', coordinates: [[[west, 25.5], [east, 25.5], [east, 26.5], [west, 26.5], [west, 25.5]]] },
  });
  return [
    { id: 'L1', kind: 'population', name: 'People', contentType: 'text/csv', fileName: null, bytes: bytes(cells.join('\n')) },
    { id: 'L2', kind: 'zones', name: 'Zones', contentType: 'application/geo+json', fileName: null, bytes: bytes(JSON.stringify({ type: 'FeatureCollection', features: [zone('W', 'Westering', -48.5, -48), zone('E', 'Hale Point', -48, -47.5)] })) },
    { id: 'L3', kind: 'assets', name: 'Hospitals', contentType: 'text/csv', fileName: null, bytes: bytes('id,name,lat,lon,class\nh1,Saltmarsh,25.6,-48.4,hospital\nh2,Fell Head,26.4,-47.6,hospital\nh3,Far away,-40,20,hospital\n') },
  ];
}
