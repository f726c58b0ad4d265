import fc from 'fast-check';
import { expect, test } from 'vitest';
import { hermite, monotoneSlopes } from '../../lib/track';
import { hermiteSlope } from '../../lib/track/monotoneCubic';

const knots = fc
  .array(fc.tuple(fc.double({ min: 0.5, max: 24, noNaN: true }), fc.double({ min: 0, max: 180, noNaN: true })), { minLength: 2, maxLength: 12 })
  .map((pairs) => {
    let x = 0;
    return { x: pairs.map(([step]) => (x += step)), y: pairs.map(([, value]) => value) };
  });

test('passes through its knots and never leaves the span between neighbours', () => {
  fc.assert(
    fc.property(knots, fc.double({ min: 0, max: 1, noNaN: true }), ({ x, y }, f) => {
      const d = monotoneSlopes(x, y);
      for (let i = 0; i + 1 < x.length; i++) {
        const h = x[i + 1] - x[i];
        expect(hermite(0, h, y[i], y[i + 1], d[i], d[i + 1])).toBe(y[i]);
        expect(hermite(1, h, y[i], y[i + 1], d[i], d[i + 1])).toBe(y[i + 1]);
        const value = hermite(f, h, y[i], y[i + 1], d[i], d[i + 1]);
        expect(value).toBeGreaterThanOrEqual(Math.min(y[i], y[i + 1]) - 1e-9);
        expect(value).toBeLessThanOrEqual(Math.max(y[i], y[i + 1]) + 1e-9);
      }
    }),
  );
});

test('is monotone between knots', () => {
  fc.assert(
    fc.property(knots, ({ x, y }) => {
      const d = monotoneSlopes(x, y);
      for (let i = 0; i + 1 < x.length; i++) {
        const sign = Math.sign(y[i + 1] - y[i]);
        for (let f = 0; f <= 1; f += 0.05) expect(sign * hermiteSlope(f, x[i + 1] - x[i], y[i], y[i + 1], d[i], d[i + 1])).toBeGreaterThanOrEqual(-1e-9);
      }
    }),
  );
});

test('a straight line stays straight, a parabola is followed to third order', () => {
  const line = monotoneSlopes([0, 1, 3, 4], [0, 2, 6, 8]);
  expect([...line]).toEqual([2, 2, 2, 2]);
  const errorAt = (h: number): number => {
    const x = [0, 1, 2, 3].map((i) => 1 + i * h);
    const y = x.map((value) => value * value);
    const d = monotoneSlopes(x, y);
    return Math.abs(hermite(0.5, h, y[1], y[2], d[1], d[2]) - (1 + 1.5 * h) ** 2);
  };
  expect(errorAt(0.1) / errorAt(0.05)).toBeGreaterThan(7);
});

test('the slope is the derivative', () => {
  const at = (f: number): number => hermite(f, 6, 40, 65, 1, 7);
  for (const f of [0.1, 0.5, 0.9]) expect(hermiteSlope(f, 6, 40, 65, 1, 7)).toBeCloseTo((at(f + 1e-6) - at(f - 1e-6)) / (2e-6 * 6), 5);
});
