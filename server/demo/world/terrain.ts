import { makeNoise, mix, octaves, ramp } from './noise';
import { cut, insideStroke, join } from './shapes';
import type { Stroke } from './shapes';

/** The main island's body: a bent spine, a northern head, a western hook and a low south. */
const BODY: readonly Stroke[] = [
  [[-152, -14, 15], [-118, 2, 27], [-70, 18, 40], [-18, 14, 49], [40, 8, 50], [92, 20, 38], [132, 44, 22], [154, 62, 11]],
  [[-70, 18, 34], [-84, 58, 17], [-96, 82, 6]],
  [[20, 30, 30], [36, 66, 20], [30, 88, 9]],
  [[-152, -14, 14], [-163, 8, 8], [-158, 24, 4]],
  [[-60, -10, 28], [-78, -44, 14]],
];
/** Wide bights that the sea has taken out of the body. */
const BIGHTS: readonly Stroke[] = [
  [[-30, 104, 26], [-24, 66, 13], [-12, 52, 5]],
  [[92, 88, 24], [74, 62, 8]],
  [[-132, 52, 20], [-116, 34, 7]],
  [[118, -30, 15], [104, -14, 4]],
];
/** Drowned valleys. The first is the Ansel, the estuary that leads to Port Ansel. */
const ESTUARY: Stroke = [[5, -70, 15], [3, -54, 10], [-3, -43, 6.2], [-2, -32, 3.6], [-8, -23, 2.1], [-17, -17, 1.5], [-22, -8, 1], [-31, -2, 0.75], [-34, 8, 0.5]];
const VALLEYS: readonly Stroke[] = [
  [[-2, -34, 2.4], [7, -26, 1.4], [14, -22, 0.9], [20, -13, 0.5]],
  [[-3, -43, 2.2], [-13, -39, 1.2], [-20, -41, 0.6], [-27, -36, 0.4]],
  [[-17, -17, 1.3], [-26, -20, 0.8], [-33, -16, 0.5]],
  [[64, -60, 8], [61, -40, 3.4], [65, -27, 1.2], [62, -14, 0.5]],
  [[62, -38, 2.2], [72, -31, 1], [78, -29, 0.5]],
  [[-62, -60, 7], [-55, -34, 2.6], [-49, -20, 0.9], [-47, -9, 0.4]],
  [[-86, 100, 8], [-74, 64, 3.8], [-67, 46, 1.4], [-60, 38, 0.5]],
  [[-73, 62, 2], [-82, 52, 1.2], [-84, 44, 0.5]],
  [[58, 88, 7], [53, 56, 2.8], [45, 40, 1], [42, 30, 0.5]],
  [[-14, 74, 8], [-5, 50, 3.2], [2, 36, 1.2], [0, 26, 0.5]],
  [[-5, 50, 2], [-15, 42, 1.2], [-22, 42, 0.6]],
  [[122, 84, 7], [111, 54, 2.8], [101, 43, 1], [93, 38, 0.5]],
  [[-146, 34, 6], [-136, 14, 2.6], [-127, 3, 0.9], [-118, 0, 0.4]],
  [[-120, -46, 6], [-113, -20, 2.4], [-104, -8, 0.8]],
];
/** The lesser islands: the Lambs in the east, the western isle, the northern skerries. */
const ISLES: readonly Stroke[] = [
  [[186, 28, 11], [202, 42, 9], [208, 56, 3]],
  [[178, -4, 5], [188, -12, 6]],
  [[-202, -44, 9], [-186, -52, 13], [-172, -48, 5]],
  [[-14, 112, 5], [2, 118, 6.5], [14, 114, 3]],
  [[72, 108, 5], [82, 116, 4]],
  [[-206, 18, 3.6], [-198, 24, 4.5]],
];

/** What the land is made of, by place in km: each is above zero on land and grows inland, about km near the coast. */
export interface Terrain {
  /** The body without its small bays and valleys: what the barrier coast lies parallel to. */
  body(x: number, y: number): number;
  /** All land but the barrier coast. */
  land(x: number, y: number): number;
  /** Barrier islands and marsh, given how far (km) the body is. */
  barrier(x: number, y: number, offshoreKm: number): number;
  /** Height above the sea where there is land, m, given the distance to the coast (km). */
  heightM(x: number, y: number, inlandKm: number): number;
}

export function makeTerrain(seed: number): Terrain {
  const broad = octaves(makeNoise(seed), 3, 0.5);
  const broadY = octaves(makeNoise(seed + 1), 3, 0.5);
  const fine = octaves(makeNoise(seed + 2), 6, 0.62);
  const along = makeNoise(seed + 3);
  const hills = octaves(makeNoise(seed + 4), 5, 0.5);

  const bent = (x: number, y: number): [number, number] => [x + 13 * broad(x / 62, y / 62), y + 13 * broadY(x / 62, y / 62)];
  const bodyOf = (x: number, y: number): number => {
    let inside = -Infinity;
    for (const stroke of BODY) inside = inside === -Infinity ? insideStroke(stroke, x, y) : join(inside, insideStroke(stroke, x, y), 14);
    for (const bight of BIGHTS) inside = cut(inside, insideStroke(bight, x, y), 8);
    return inside;
  };
  /** Rock in the north and west, sand and mud towards the south-east. */
  const ruggedness = (x: number, y: number): number => mix(0.34, 1.25, ramp(-34, 22, y - 0.12 * x + 10 * broad(x / 45 + 7, y / 45)));

  const body = (x: number, y: number): number => bodyOf(...bent(x, y));

  const land = (x: number, y: number): number => {
    const [bx, by] = bent(x, y);
    let inside = bodyOf(bx, by);
    let isles = -Infinity;
    for (const stroke of ISLES) isles = Math.max(isles, insideStroke(stroke, bx, by));
    if (Math.max(inside, isles) < -14) return Math.max(inside, isles);
    const detail = fine(x / 21, y / 21);
    inside += 6.5 * ruggedness(x, y) * detail;
    // Valleys meander by a noise of their own, and their mud banks are ragged.
    const mx = x + 2.6 * along(x / 9, y / 9 + 40) + 1 * fine(x / 5 + 3, y / 5);
    const my = y + 2.6 * along(x / 9 + 80, y / 9) + 1 * fine(x / 5, y / 5 + 9);
    for (const valley of VALLEYS) inside = Math.min(inside, -insideStroke(valley, mx, my));
    inside = Math.min(inside, -insideStroke(ESTUARY, mx, my));
    const skerries = 2.6 * (fine(x / 8 + 90, y / 8) - 0.62) - 0.42 * Math.max(0, -inside - 2) - 3 * ramp(0.9, 0.5, ruggedness(x, y));
    return Math.max(inside, isles + 7 * detail, skerries);
  };

  const barrier = (x: number, y: number, offshoreKm: number): number => {
    if (offshoreKm < 0.8 || offshoreKm > 22 || y > 36) return -5;
    // Windward: from the south-west hook round to the eastern head.
    const windward = Math.min(ramp(-138, -112, x), ramp(168, 140, x + 0.5 * y), ramp(24, 2, y - 0.24 * Math.max(0, x)));
    const s = x + 0.55 * y;
    const line = 7.6 + 2.6 * along(s / 52, 3.5) + 0.5 * along(s / 9, 8.5);
    const beads = 0.72 + 1.15 * along(s / 17, 20.5) + 0.35 * along(s / 6, 31.5);
    // A deep channel keeps the estuary's mouth open.
    const channel = 2.4 * ramp(5.5, 1.5, Math.abs(x - 8 - 0.1 * (y + 60)));
    const ridge = Math.min(1.5, beads) - 2.4 * (1 - windward) - channel - Math.abs(offshoreKm - line) + 0.3 * fine(x / 4, y / 4);
    const marsh = fine(x / 6.5 + 50, y / 6.5) - 0.42 - 2 * (1 - windward) - 0.35 * Math.abs(offshoreKm - line + 3.4);
    return Math.max(ridge, marsh);
  };

  const heightM = (x: number, y: number, inlandKm: number): number => {
    const ridge = ramp(2, 34, inlandKm) * ramp(-26, 34, y - 0.08 * x);
    return Math.max(1, 2.2 * inlandKm ** 0.9 + 620 * ridge * (0.62 + 0.55 * hills(x / 38, y / 38)) + 5 * hills(x / 12, y / 12));
  };
  return { body, land, barrier, heightM };
}
