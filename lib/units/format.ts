import { KM_PER_MILE, kmToMiles, kmToNmi, ktToKmh, ktToMph, ktToMs } from './convert';

export const WIND_UNITS = ['kt', 'm/s', 'km/h', 'mph'] as const;
export type WindUnit = (typeof WIND_UNITS)[number];
export const DISTANCE_UNITS = ['nmi', 'km', 'mi'] as const;
export type DistanceUnit = (typeof DISTANCE_UNITS)[number];

/** A true minus sign: as wide as a figure, so that columns of numbers align. */
const MINUS = '\u2212';
/** Keeps a number and its unit on one line. */
const NARROW_SPACE = '\u00a0';
/** Shown for a value that is not known, never for zero. */
export const UNKNOWN = '\u2013';

const windIn: Record<WindUnit, (kt: number) => number> = { kt: (kt) => kt, 'm/s': ktToMs, 'km/h': ktToKmh, mph: ktToMph };
const kmIn: Record<DistanceUnit, (km: number) => number> = { nmi: kmToNmi, km: (km) => km, mi: kmToMiles };
const kmFrom: Record<DistanceUnit, (value: number) => number> = { nmi: (nmi) => nmi * 1.852, km: (km) => km, mi: (mi) => mi * KM_PER_MILE };

/** A wind of `kt` knots as a number in `unit`, not rounded. */
export const windValue = (kt: number, unit: WindUnit): number => windIn[unit](kt);
/** A distance of `km` as a number in `unit`, not rounded. */
export const distanceValue = (km: number, unit: DistanceUnit): number => kmIn[unit](km);
/** Kilometres of a distance given in `unit`. */
export const distanceKmFrom = (value: number, unit: DistanceUnit): number => kmFrom[unit](value);

const numberFormats = new Map<string, Intl.NumberFormat>();

function numberFormat(locale: string, options: Intl.NumberFormatOptions): Intl.NumberFormat {
  const key = `${locale} ${JSON.stringify(options)}`;
  let format = numberFormats.get(key);
  if (!format) numberFormats.set(key, (format = new Intl.NumberFormat(locale, options)));
  return format;
}

function write(value: number, locale: string, options: Intl.NumberFormatOptions): string {
  if (!Number.isFinite(value)) return UNKNOWN;
  return numberFormat(locale, options).format(value).replace('-', MINUS);
}

/** `64 kt`, `33 m/s`: whole units. An unknown wind (null, NaN) is a dash. */
export function formatWind(kt: number | null, unit: WindUnit, locale = 'en'): string {
  if (kt === null || !Number.isFinite(kt)) return UNKNOWN;
  return `${write(windIn[unit](kt), locale, { maximumFractionDigits: 0, signDisplay: 'negative' })}${NARROW_SPACE}${unit}`;
}

/** `54 nmi`, `8.4 km`: one decimal below ten. */
export function formatDistance(km: number | null, unit: DistanceUnit, locale = 'en'): string {
  if (km === null || !Number.isFinite(km)) return UNKNOWN;
  const value = kmIn[unit](km);
  const digits = Math.abs(value) < 9.95 ? 1 : 0;
  return `${write(value, locale, { maximumFractionDigits: digits, signDisplay: 'negative' })}${NARROW_SPACE}${unit}`;
}

/** A whole count with grouping: `122,400`. */
export function formatCount(count: number | null, locale = 'en'): string {
  return count === null ? UNKNOWN : write(count, locale, { maximumFractionDigits: 0, signDisplay: 'negative' });
}

/** A change in a count, always signed but for none: `+210,000`, `−24,000`, `0`. */
export function formatChange(change: number | null, locale = 'en'): string {
  return change === null ? UNKNOWN : write(change, locale, { maximumFractionDigits: 0, signDisplay: 'exceptZero' });
}

/** A count to three figures for headlines: `1.92 M`, `884 k`, `412`. */
export function formatCompactCount(count: number | null, locale = 'en'): string {
  if (count === null || !Number.isFinite(count)) return UNKNOWN;
  const size = Math.abs(count);
  for (const [scale, letter] of [[1e9, 'G'], [1e6, 'M'], [1e3, 'k']] as const) {
    // Rounding to three figures may carry 999,600 over to the next letter.
    if (Number((size / scale).toPrecision(3)) >= 1) {
      return `${write(count / scale, locale, { maximumSignificantDigits: 3, signDisplay: 'negative' })}${NARROW_SPACE}${letter}`;
    }
  }
  return formatCount(count, locale);
}

/** A share of one as a percentage: `41 %`. What is neither none nor all is never written as 0 or 100. */
export function formatChance(share: number | null, locale = 'en'): string {
  if (share === null || !Number.isFinite(share)) return UNKNOWN;
  const percent = Math.round(share * 100);
  if (share > 0 && percent === 0) return `<1${NARROW_SPACE}%`;
  if (share < 1 && percent === 100) return `>99${NARROW_SPACE}%`;
  return `${write(percent, locale, { maximumFractionDigits: 0 })}${NARROW_SPACE}%`;
}

/** `26.4 N 58.1 W`. */
export function formatLatLon(lat: number, lon: number, decimals = 1): string {
  return `${angle(lat, decimals, 'N', 'S')} ${angle(lon, decimals, 'E', 'W')}`;
}

function angle(degrees: number, decimals: number, positive: string, negative: string): string {
  if (!Number.isFinite(degrees)) return UNKNOWN;
  return `${Math.abs(degrees).toFixed(decimals)}${NARROW_SPACE}${degrees < 0 ? negative : positive}`;
}
