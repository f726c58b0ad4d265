import type { Position } from 'geojson';
import { distanceKm } from '../geo';
import { SAMPLE_KM } from './sampleKm';

/** Both ends of a line, and places between them at equal steps of at most two kilometres along it. */
export function alongLine(line: readonly Position[]): Position[] {
  const lengths = line.slice(1).map(([lon, lat], i) => distanceKm(line[i][1], line[i][0], lat, lon));
  const lengthKm = lengths.reduce((sum, length) => sum + length, 0);
  const steps = Math.max(1, Math.ceil(lengthKm / SAMPLE_KM));
  const stepKm = lengthKm / steps;
  const places: Position[] = [line[0]];
  let beforeKm = 0;
  lengths.forEach((partKm, i) => {
    const [[lonA, latA], [lonB, latB]] = [line[i], line[i + 1]];
    while (places.length < steps && places.length * stepKm <= beforeKm + partKm) {
      const f = (places.length * stepKm - beforeKm) / partKm;
      places.push([lonA + f * (lonB - lonA), latA + f * (latB - latA)]);
    }
    beforeKm += partKm;
  });
  return [...places, line[line.length - 1]];
}
