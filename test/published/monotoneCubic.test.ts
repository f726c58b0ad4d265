import { expect, test } from 'vitest';
import { hermite, monotoneSlopes } from '../../lib/track';

// The data of Akima (1970) that Fritsch and Carlson (1980, SIAM J. Numer. Anal. 17, 238-246) use as their table of chemical data
// "RPN 14" is quoted from memory; what they require of it is checked, not their picture: monotone where the data are, flat where flat.
const x = [7.99, 8.09, 8.19, 8.7, 9.2, 10, 12, 15, 20];
const y = [0, 2.76429e-5, 4.37498e-2, 0.169183, 0.469428, 0.94374, 0.998636, 0.999919, 0.999994];

test('the radiochemical data of Fritsch and Carlson rise without a wiggle', () => {
  const d = monotoneSlopes(x, y);
  let before = -Infinity;
  for (let i = 0; i + 1 < x.length; i++) {
    for (let f = 0; f <= 1; f += 0.01) {
      const value = hermite(f, x[i + 1] - x[i], y[i], y[i + 1], d[i], d[i + 1]);
      expect(value).toBeGreaterThanOrEqual(before - 1e-12);
      before = value;
    }
  }
});

test('slopes lie in the region of Fritsch and Carlson that is sufficient for monotony: none above three times a chord', () => {
  const d = monotoneSlopes(x, y);
  for (let i = 0; i + 1 < x.length; i++) {
    const chord = (y[i + 1] - y[i]) / (x[i + 1] - x[i]);
    expect(d[i] / chord).toBeLessThanOrEqual(3);
    expect(d[i + 1] / chord).toBeLessThanOrEqual(3);
  }
});
