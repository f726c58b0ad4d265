import { expect, test } from 'vitest';
import { hilbertDistance } from '../../lib/exposure/hilbert';

// Hilbert, D., 1891, Math. Ann. 38, 459-460: the curve passes every cell of a square of 2^n by 2^n once, from cell to neighbour.
test.each([2, 4, 8, 64])('the curve passes each of %i by %i cells once, and goes from each to one beside it', (side) => {
  const cells = Array.from({ length: side * side }, (_, i) => [i % side, Math.floor(i / side)]);
  const at = cells.map(([column, row]) => Math.floor(hilbertDistance((column + 0.5) / side, (row + 0.5) / side) / (2 ** 32 / side ** 2)));
  expect(new Set(at).size).toBe(side * side);
  const inOrder = cells.map((cell, i) => ({ cell, at: at[i] })).sort((a, b) => a.at - b.at);
  for (let i = 1; i < inOrder.length; i++) {
    const [[x0, y0], [x1, y1]] = [inOrder[i - 1].cell, inOrder[i].cell];
    expect(Math.abs(x0 - x1) + Math.abs(y0 - y1)).toBe(1);
  }
});

test('the edges of the square are on it', () => {
  for (const [x, y] of [[0, 0], [1, 0], [0, 1], [1, 1]]) {
    expect(hilbertDistance(x, y)).toBeGreaterThanOrEqual(0);
    expect(hilbertDistance(x, y)).toBeLessThan(2 ** 32);
  }
});
