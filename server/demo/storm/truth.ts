const HOUR_MS = 3_600_000;

/** Issue time of the first advisory; hours of the story count from here. */
const START_MS = Date.UTC(2031, 8, 18, 9);

export const instantAt = (hour: number): string => `${new Date(START_MS + hour * HOUR_MS).toISOString().slice(0, 19)}Z`;

export interface Storm {
  lat: number;
  lon: number;
  maxWindKt: number;
}

/** What the storm in the end does: `[hour, lat, lon, wind kt]`. It comes ashore by the mouth of the Ansel at hour 42. */
const WAY: readonly (readonly [number, number, number, number])[] = [
  [-6, 19.5, -40.4, 45],
  [0, 19.8, -41.7, 55],
  [6, 20.2, -43.0, 65],
  [12, 20.7, -44.2, 75],
  [18, 21.3, -45.3, 85],
  [24, 22.0, -46.3, 95],
  [30, 22.8, -47.2, 100],
  [36, 23.7, -47.9, 105],
  [42, 24.6, -48.4, 105],
  [48, 25.6, -48.6, 85],
  [54, 26.7, -48.6, 75],
  [60, 27.9, -48.2, 70],
  [66, 29.2, -47.3, 65],
  [72, 30.7, -45.9, 60],
  [84, 34.0, -41.8, 55],
  [96, 37.6, -36.0, 50],
  [108, 41.2, -28.8, 50],
  [132, 47.0, -13.0, 45],
  [168, 55.0, 8.0, 35],
];

/**
 * The true storm at an hour of the story. Position by a cubic through the six-hourly points with slopes from their neighbours
 * (Catmull and Rom, 1974), wind straight between them. The story's own, so that the bulletins change only when the story does.
 */
export function truthAt(hour: number): Storm {
  const last = WAY.length - 1;
  let k = 0;
  while (k < last - 1 && hour >= WAY[k + 1][0]) k++;
  const [from, to] = [WAY[k], WAY[k + 1]];
  const f = (hour - from[0]) / (to[0] - from[0]);
  const curve = (column: 1 | 2): number => {
    const step = to[0] - from[0];
    const [before, after] = [WAY[Math.max(0, k - 1)], WAY[Math.min(last, k + 2)]];
    const slopeFrom = (step * (to[column] - before[column])) / (to[0] - before[0]);
    const slopeTo = (step * (after[column] - from[column])) / (after[0] - from[0]);
    const [a, b] = [from[column], to[column]];
    return a + f * (slopeFrom + f * (3 * (b - a) - 2 * slopeFrom - slopeTo + f * (2 * (a - b) + slopeFrom + slopeTo)));
  };
  return { lat: curve(1), lon: curve(2), maxWindKt: from[3] + f * (to[3] - from[3]) };
}
