import { SURFACES } from '../exposure';
import { gustFactor } from '../wind';

/** Three-second gust from a 1-minute sustained wind at a place whose surface is number `surface` of SURFACES. */
const FACTORS = SURFACES.map((surface) => gustFactor(surface));

export const gustKt = (windKt: number, surface: number): number => windKt * FACTORS[surface];
