/**
 * Exact conversions. Source: NIST Special Publication 811 (2008), appendix B.8
 * (international nautical mile 1852 m, knot 1852/3600 m/s, mile per hour 0.44704 m/s, foot 0.3048 m).
 */
export const METRES_PER_NMI = 1852;
export const MS_PER_KT = 1852 / 3600;
export const MS_PER_MPH = 0.44704;
export const METRES_PER_FOOT = 0.3048;
export const KM_PER_MILE = 1.609344;

export const ktToMs = (kt: number): number => kt * MS_PER_KT;
export const msToKt = (ms: number): number => ms / MS_PER_KT;
export const ktToMph = (kt: number): number => (kt * MS_PER_KT) / MS_PER_MPH;
export const mphToKt = (mph: number): number => (mph * MS_PER_MPH) / MS_PER_KT;
export const ktToKmh = (kt: number): number => kt * 1.852;
export const kmhToKt = (kmh: number): number => kmh / 1.852;
export const nmiToKm = (nmi: number): number => nmi * 1.852;
export const kmToNmi = (km: number): number => km / 1.852;
export const kmToMiles = (km: number): number => km / KM_PER_MILE;
