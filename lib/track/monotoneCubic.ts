/**
 * Slopes at the knots of a cubic that passes through every knot and is monotone wherever the knots are, so it never overshoots:
 * Fritsch and Carlson (1980), SIAM J. Numer. Anal. 17, 238-246, with the weighted harmonic mean of Fritsch and Butland (1984),
 * SIAM J. Sci. Stat. Comput. 5, 300-304, inside and shape-preserving three-point slopes at the ends. `x` rises strictly.
 */
export function monotoneSlopes(x: ArrayLike<number>, y: ArrayLike<number>): Float64Array {
  const n = x.length;
  const slopes = new Float64Array(n);
  if (n < 2) return slopes;
  const h = (i: number): number => x[i + 1] - x[i];
  const chord = (i: number): number => (y[i + 1] - y[i]) / h(i);
  if (n === 2) return slopes.fill(chord(0));
  for (let i = 1; i < n - 1; i++) slopes[i] = harmonicSlope(chord(i - 1), chord(i), h(i - 1), h(i));
  slopes[0] = endSlope(chord(0), chord(1), h(0), h(1));
  slopes[n - 1] = endSlope(chord(n - 2), chord(n - 3), h(n - 2), h(n - 3));
  return slopes;
}

/** Weighted harmonic mean of the chords before and after a knot, steps `h0` and `h1`; zero at a turn. At most three times either. */
export function harmonicSlope(before: number, after: number, h0: number, h1: number): number {
  if (before * after <= 0) return 0;
  const w0 = 2 * h1 + h0;
  const w1 = h1 + 2 * h0;
  return (w0 + w1) / (w0 / before + w1 / after);
}

function endSlope(chord: number, next: number, h: number, hNext: number): number {
  const slope = ((2 * h + hNext) * chord - h * next) / (h + hNext);
  if (slope * chord <= 0) return 0;
  return chord * next < 0 && Math.abs(slope) > 3 * Math.abs(chord) ? 3 * chord : slope;
}

/** Cubic Hermite at fraction `f` of a step `h`, from `y0` to `y1` with slopes `d0` and `d1`. */
export function hermite(f: number, h: number, y0: number, y1: number, d0: number, d1: number): number {
  const g = 1 - f;
  return y0 * (1 + 2 * f) * g * g + y1 * f * f * (3 - 2 * f) + h * f * g * (d0 * g - d1 * f);
}

/** Derivative of `hermite` by the knots' coordinate. */
export function hermiteSlope(f: number, h: number, y0: number, y1: number, d0: number, d1: number): number {
  const g = 1 - f;
  return (6 * f * g * (y1 - y0)) / h + d0 * g * (1 - 3 * f) + d1 * f * (3 * f - 2);
}
