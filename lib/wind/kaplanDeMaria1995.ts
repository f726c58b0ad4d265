/** Kaplan and DeMaria (1995), J. Appl. Meteor. 34, 2499-2512: United States landfalls south of 37 N. */
const REDUCTION = 0.9;
const BACKGROUND_KT = 26.7;
const DECAY_PER_HOUR = 0.095;

/**
 * Maximum 1-minute wind (kt) some hours after landfall: `V(t) = Vb + (R V0 - Vb) exp(-a t)`, R = 0.9, Vb = 26.7 kt, a = 0.095 per
 * hour, V0 the wind at landfall over water. R is the step from water to land at the shore. A storm whose wind over land is
 * already at the background stays as it is.
 */
export function inlandWindKt(landfallKt: number, hours: number): number {
  const atShore = REDUCTION * landfallKt;
  return atShore <= BACKGROUND_KT ? atShore : BACKGROUND_KT + (atShore - BACKGROUND_KT) * Math.exp(-DECAY_PER_HOUR * Math.max(0, hours));
}

/**
 * The part of the decay formula that wears a storm down, without the step at the shore: wind over water (kt) after `hours` of
 * land, for a storm that may return to sea.
 */
export const decayedOverLandKt = (windKt: number, hours: number): number =>
  windKt <= BACKGROUND_KT ? windKt : BACKGROUND_KT + (windKt - BACKGROUND_KT) * Math.exp(-DECAY_PER_HOUR * Math.max(0, hours));

/**
 * Correction (kt) to subtract for the distance of the centre from the coast (km, at least 1): `m ln(D / D0) + b`,
 * `m = 0.0109 t (50 - t)`, `b = -0.0503 t (50 - t)`, D0 = 1 km, for the first 50 hours after landfall (coefficients from memory). A storm that
 * hugs the coast keeps more of its wind than one far inland.
 */
export function inlandCorrectionKt(hours: number, coastDistanceKm: number): number {
  const t = Math.min(Math.max(hours, 0), 50);
  return t * (50 - t) * (0.0109 * Math.log(Math.max(coastDistanceKm, 1)) - 0.0503);
}
