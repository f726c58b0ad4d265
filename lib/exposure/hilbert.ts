const ORDER = 16;
const SIDE = 1 << ORDER;

/** Distance along a Hilbert curve of order 16 over the unit square (Hilbert, 1891; bit form of Warren, Hacker's Delight, 2003). */
export function hilbertDistance(x: number, y: number): number {
  let column = Math.min(SIDE - 1, Math.max(0, Math.floor(x * SIDE)));
  let row = Math.min(SIDE - 1, Math.max(0, Math.floor(y * SIDE)));
  let distance = 0;
  for (let half = SIDE >> 1; half > 0; half >>= 1) {
    const right = column & half ? 1 : 0;
    const upper = row & half ? 1 : 0;
    distance += half * half * ((3 * right) ^ upper);
    if (upper === 0) {
      const turned = right === 1 ? SIDE - 1 - row : row;
      row = right === 1 ? SIDE - 1 - column : column;
      column = turned;
    }
  }
  return distance;
}
