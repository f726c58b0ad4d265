/** The storm between its points: position, motion, strength, radii and pressure at any time. */
export { pressureFromWindHpa, windFromPressureKt } from './atkinsonHolliday1977';
export { climatologicalVortex, climatologyRadiiKm, motionAsymmetryKt, QUADRANT_AZIMUTHS_DEG, strongSideDeg } from './climatologyRadii';
export { hermite, monotoneSlopes } from './monotoneCubic';
export { decayExponent } from './quadrantPeaks';
export { chavasKnaffRadiusMaxWindKm, willoughbyRadiusMaxWindKm } from './radiusMaxWind';
export { stormAt } from './stormAt';
export type { Ring, StormState } from './stormAt';
export { centreAt, makeTrack } from './track';
export type { Track } from './track';
export { withPast } from './withPast';
