/**
 * Modified Rankine vortex: `V = Vmax (r / rm)^inner` inside `rm` and `Vmax (rm / r)^outer` outside. Depperman (1947), Bull. Amer.
 * Meteor. Soc. 28, 399-404 (from memory); Hughes (1952), J. Meteor. 9, 422-428 (outer exponents 0.4 to 0.6; from memory). Wind in the
 * unit of `max`, radii in one unit.
 */
export function modifiedRankine(radius: number, max: number, radiusMax: number, outer: number, inner = 1): number {
  return radius < radiusMax ? max * (radius / radiusMax) ** inner : max * (radiusMax / radius) ** outer;
}
