import type { MultiPolygon, Polygon, Position } from 'geojson';
import { EARTH_RADIUS_KM } from '../geo';
import { makeArea } from './area';
import type { Area } from './area';
import { SAMPLE_KM } from './sampleKm';

/** A vast area is sampled more thinly, since the kernel's work grows with the places. */
const MOST_PER_AREA = 2000;
const KM_PER_DEGREE = (EARTH_RADIUS_KM * Math.PI) / 180;

/**
 * Positions spread evenly over an area, at least one: a place at each step along the chords of its rows, laid end to end, so that
 * thin and ragged parts get their share and no more. Rows and steps are two kilometres, more in areas of over 8000 km2.
 */
export function insideArea(geometry: Polygon | MultiPolygon): Position[] {
  const parts = (geometry.type === 'Polygon' ? [geometry.coordinates] : geometry.coordinates).map((coordinates) => makeArea({ type: 'Polygon', coordinates }));
  const stepKm = Math.max(SAMPLE_KM, Math.sqrt(parts.reduce((sum, part) => sum + boxKm2(part), 0) / MOST_PER_AREA));
  const places: Position[] = [];
  let widest: { lengthKm: number; place: Position } = { lengthKm: -1, place: [parts[0].west, parts[0].south] };
  let toNextKm = stepKm / 2;
  for (const part of parts) {
    const rows = Math.max(1, Math.round(((part.north - part.south) * KM_PER_DEGREE) / stepKm));
    for (let row = 0; row < rows; row++) {
      const lat = part.south + ((row + 0.5) * (part.north - part.south)) / rows;
      const kmPerDegree = kmPerDegreeLon(lat);
      const chords = part.chordsAt(lat);
      for (let i = 0; i < chords.length; i += 2) {
        const lengthKm = (chords[i + 1] - chords[i]) * kmPerDegree;
        if (lengthKm > widest.lengthKm) widest = { lengthKm, place: [(chords[i] + chords[i + 1]) / 2, lat] };
        for (; toNextKm < lengthKm; toNextKm += stepKm) places.push([chords[i] + toNextKm / kmPerDegree, lat]);
        toNextKm -= lengthKm;
      }
    }
  }
  return places.length > 0 ? places : [widest.place];
}

const kmPerDegreeLon = (lat: number): number => KM_PER_DEGREE * Math.cos((lat * Math.PI) / 180);

const boxKm2 = ({ west, south, east, north }: Area): number => (north - south) * KM_PER_DEGREE * (east - west) * kmPerDegreeLon((south + north) / 2);
