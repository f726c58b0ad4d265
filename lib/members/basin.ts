export const BASINS = ['atlantic', 'eastern-north-pacific', 'western-north-pacific', 'southern-hemisphere'] as const;
export type Basin = (typeof BASINS)[number];

/** The isthmus between the Atlantic and the eastern North Pacific, south to north: [lat, lon] along the divide. */
const DIVIDE = [
  [0, -70],
  [8, -78],
  [9, -84],
  [14, -88],
  [17, -95],
  [20, -101],
  [30, -108],
  [60, -120],
] as const;

function divideLon(lat: number): number {
  let i = 1;
  while (i < DIVIDE.length - 1 && DIVIDE[i][0] < lat) i++;
  const [lat0, lon0] = DIVIDE[i - 1];
  const [lat1, lon1] = DIVIDE[i];
  return lon0 + ((lon1 - lon0) * (Math.min(Math.max(lat, lat0), lat1) - lat0)) / (lat1 - lat0);
}

/** The basin whose forecast errors apply at a position (degrees). The North Indian Ocean takes those of the western North Pacific. */
export function basinOf(lat: number, lon: number): Basin {
  if (lat < 0) return 'southern-hemisphere';
  if (lon > 20) return 'western-north-pacific';
  return lon > divideLon(lat) ? 'atlantic' : 'eastern-north-pacific';
}
