/** The sphere: distances, vectors, rings by quadrant, the antimeridian, and where land is. */
export { cutAtAntimeridian } from './antimeridian';
export { boundsOf } from './bounds';
export type { Bounds } from './bounds';
export { makeLandMask } from './landMask';
export type { LandMask } from './landMask';
export { quadrantRing } from './ring';
export type { QuadrantKm } from './ring';
export { bearingDeg, destination, distanceKm, EARTH_RADIUS_KM, normaliseLon } from './sphere';
export { add, cross, dot, fromUnitVector, length, scale, unitVector } from './vector';
export type { Vector } from './vector';
