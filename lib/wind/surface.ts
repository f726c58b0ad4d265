import type { Surface } from '../units';

/**
 * Sustained wind at 10 m over a surface, over that over water.
 *
 * Open land 0.8: winds over land are 20 % lower (Knaff et al., 2011, J. Appl. Meteor. Climatol. 50, 2149-2166). Built-up 0.68:
 * that times 0.85, the square root of the velocity pressure coefficients at 10 m of exposure B over exposure C, 0.72 / 1.00
 * (ASCE 7, table of Kz; from memory).
 */
const FACTORS: Record<Surface, number> = { marine: 1, open: 0.8, 'built-up': 0.68 };

export const surfaceFactor = (surface: Surface): number => FACTORS[surface];

/** Inland of a shore the wind still blows as over water for 600 ft (ASCE 7, exposure D; from memory). */
const SHORE_KM = 0.183;

/** The surface of a place of which only the distance to the coast is known (km, positive inland). */
export const surfaceOf = (coastDistanceKm: number): Surface => (coastDistanceKm > SHORE_KM ? 'open' : 'marine');
