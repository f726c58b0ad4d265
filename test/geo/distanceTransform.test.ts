import fc from 'fast-check';
import { expect, test } from 'vitest';
import { distanceTransform } from '../../lib/geo/distanceTransform';

const COLUMNS = 17;
const ROWS = 13;

test('is the least distance over all marked cells, on cells of any shape', () => {
  fc.assert(
    fc.property(fc.uint8Array({ minLength: COLUMNS * ROWS, maxLength: COLUMNS * ROWS, max: 9 }), fc.double({ min: 0.3, max: 3, noNaN: true }), (noise, stepX) => {
      // About one cell in ten.
      const marked = noise.map((value) => (value === 0 ? 1 : 0));
      fc.pre(marked.includes(1));
      const distance = distanceTransform(marked, 1, COLUMNS, ROWS, new Float64Array(ROWS).fill(stepX), 1);
      for (let i = 0; i < marked.length; i++) {
        let least = Infinity;
        for (let j = 0; j < marked.length; j++) if (marked[j]) least = Math.min(least, Math.hypot(((i % COLUMNS) - (j % COLUMNS)) * stepX, Math.floor(i / COLUMNS) - Math.floor(j / COLUMNS)));
        expect(distance[i]).toBeCloseTo(least, 4);
      }
    }),
  );
});

test('without a marked cell everything is far', () => {
  expect(distanceTransform(new Uint8Array(4), 1, 2, 2, new Float64Array(2).fill(1), 1).every((km) => km > 1e5)).toBe(true);
});
