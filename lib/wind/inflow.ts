/**
 * Angle (degrees) by which the surface wind crosses circles round the centre inward: 10 (1 + r/Rm) inside Rm, 20 + 25 (r/Rm - 1) to
 * 1.2 Rm, 25 beyond. Phadke et al. (2003), Ocean Eng. 30, 553-578, eq. 11 (after Bretschneider, 1972).
 */
export function inflowAngleDeg(radiusKm: number, radiusMaxWindKm: number): number {
  const share = radiusKm / radiusMaxWindKm;
  if (share < 1) return 10 * (1 + share);
  return share < 1.2 ? 20 + 25 * (share - 1) : 25;
}
