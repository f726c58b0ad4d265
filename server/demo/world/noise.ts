import { makeRandom } from './random';

/** Smooth noise over the plane, about -1 to 1, with features one unit across. */
export type Noise = (x: number, y: number) => number;

const SIZE = 256;

/** Gradient noise on a lattice (Perlin, 2002, ACM Trans. Graphics 21, 681-682), its lattice shuffled by the seed. */
export function makeNoise(seed: number): Noise {
  const random = makeRandom(seed);
  const shuffled = Array.from({ length: SIZE }, (_, i) => i);
  for (let i = SIZE - 1; i > 0; i--) {
    const j = random.whole(0, i);
    [shuffled[i], shuffled[j]] = [shuffled[j], shuffled[i]];
  }
  const gradientX = shuffled.map((k) => Math.cos((2 * Math.PI * k) / SIZE));
  const gradientY = shuffled.map((k) => Math.sin((2 * Math.PI * k) / SIZE));
  const corner = (ix: number, iy: number, dx: number, dy: number): number => {
    const k = shuffled[(shuffled[ix & (SIZE - 1)] + iy) & (SIZE - 1)];
    return gradientX[k] * dx + gradientY[k] * dy;
  };
  return (x, y) => {
    const ix = Math.floor(x);
    const iy = Math.floor(y);
    const dx = x - ix;
    const dy = y - iy;
    const u = fade(dx);
    const v = fade(dy);
    const low = mix(corner(ix, iy, dx, dy), corner(ix + 1, iy, dx - 1, dy), u);
    const high = mix(corner(ix, iy + 1, dx, dy - 1), corner(ix + 1, iy + 1, dx - 1, dy - 1), u);
    return 1.5 * mix(low, high, v);
  };
}

/** Octaves of noise, each half as wide and `gain` times as strong; turned between octaves so that the lattice does not show. */
export function octaves(noise: Noise, count: number, gain: number): Noise {
  return (x, y) => {
    let sum = 0;
    let weight = 1;
    for (let k = 0; k < count; k++) {
      sum += weight * noise(x + 17.3 * k, y - 9.1 * k);
      weight *= gain;
      [x, y] = [1.6 * x - 1.2 * y, 1.2 * x + 1.6 * y];
    }
    return sum;
  };
}

const fade = (t: number): number => t * t * t * (t * (6 * t - 15) + 10);
export const mix = (a: number, b: number, t: number): number => a + (b - a) * t;

/** 0 below `low`, 1 above `high`, smooth between (also falling, where `low` is above `high`). */
export function ramp(low: number, high: number, value: number): number {
  const t = Math.min(1, Math.max(0, (value - low) / (high - low)));
  return t * t * (3 - 2 * t);
}
