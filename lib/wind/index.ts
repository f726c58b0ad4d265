/** Wind around a storm: profiles, asymmetry, surface and gust factors, decay over land. */
export { linChavasBackground, schwerdtAsymmetryKt } from './asymmetry';
export { gustFactor } from './gust';
export { coriolisParameter, hollandB, hollandGradientMs, hollandMaxMs, hollandPressurePa } from './holland1980';
export { inflowAngleDeg } from './inflow';
export { decayedOverLandKt, inlandCorrectionKt, inlandWindKt } from './kaplanDeMaria1995';
export { modifiedRankine } from './modifiedRankine';
export { profileKt, quadrantProfiles } from './quadrantProfiles';
export { surfaceFactor, surfaceOf } from './surface';
export { willoughbyShape, willoughbyShareOfMax } from './willoughby2006';
export { windKtAround, windKtAt } from './windKtAt';
