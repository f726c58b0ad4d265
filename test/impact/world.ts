import type { Exposure } from '../../lib/exposure';
import type { PlaceHazard } from '../../lib/hazard';

/** Three people places in two zones and one outside, and two assets (one of them a line with two places). */
export function smallExposure(): Exposure {
  return {
    places: {
      count: 7,
      lat: Float64Array.of(25, 25.1, 25.2, 25.3, 25, 25.1, 25.2),
      lon: Float64Array.of(-48, -48, -48, -48, -48.1, -48.1, -48.1),
      surface: Uint8Array.of(0, 0, 0, 0, 0, 0, 0),
      people: Float64Array.of(100, 200, 50.5, 7, 0, 0, 0),
      zone: Int32Array.of(0, 0, 1, -1, -1, -1, -1),
      asset: Int32Array.of(-1, -1, -1, -1, 0, 1, 1),
    },
    assets: {
      count: 2,
      layer: ['L1', 'L2'],
      id: ['h1', 'f1'],
      name: ['Hale Point Infirmary', 'Feeder 1'],
      classIndex: Uint16Array.of(0, 1),
      people: [null, 40],
      lat: Float64Array.of(25, 25.15),
      lon: Float64Array.of(-48.1, -48.1),
      firstPlace: Uint32Array.of(4, 5),
      placeCount: Uint32Array.of(1, 2),
    },
    classes: ['hospital', 'feeder'],
    zones: [
      { id: 'Z1', name: 'Saltmarsh', clearanceHours: 10, people: 300, layer: 'L0' },
      { id: 'Z2', name: 'Orrin Bar', clearanceHours: null, people: 50.5, layer: 'L0' },
    ],
    peopleTotal: 357.5,
    peopleInZones: 350.5,
  } as Exposure;
}

/** Peak winds (kt) and arrival leads (h) by place; each wind is left five hours after it comes. */
export function hazardOf(peaks: number[], arrivals: (number | null)[][]): PlaceHazard {
  const flat = arrivals.flatMap((row) => row.map((lead) => lead ?? NaN));
  return { peakKt: Float32Array.from(peaks), peakLead: new Float32Array(peaks.length), arrival: Float32Array.from(flat), end: Float32Array.from(flat, (lead) => lead + 5) };
}
