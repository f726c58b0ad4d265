import { KM_PER_MILE, THRESHOLD_KEYS, kmToNmi, kmhToKt, mphToKt, msToKt } from '../units';
import type { ThresholdKey } from '../units';
import type { QuadrantRadii } from './model';

/** What a column or property of a table of points holds. Values are turned into the model's unit by `toModel`. */
export type Column =
  | { kind: 'time' | 'lat' | 'lon' | 'stage' }
  | { kind: 'quantity'; field: 'maxWindKt' | 'gustKt' | 'minPressureHpa' | 'radiusMaxWindNm' | 'eyeDiameterNm'; toModel: (value: number) => number }
  | { kind: 'radius'; threshold: ThresholdKey; quadrant: keyof QuadrantRadii; toModel: (value: number) => number }
  | { kind: 'about'; field: AboutField }
  | { kind: 'unit-missing'; field: string; hint: string };

/** What is said of the whole advisory, the same in every row. */
export type AboutField = 'stormName' | 'stormId' | 'number' | 'centre' | 'issuedAt' | 'nextDueAt' | 'dissipatesAt' | 'averaging';

const same = (value: number): number => value;
const WIND_UNITS: Record<string, (value: number) => number> = { kt: same, kts: same, ms: msToKt, kmh: kmhToKt, mph: mphToKt };
const LENGTH_UNITS: Record<string, (value: number) => number> = { nm: same, nmi: same, km: kmToNmi, mi: (miles) => kmToNmi(miles * KM_PER_MILE) };
const PRESSURE_UNITS: Record<string, (value: number) => number> = { hpa: same, mb: same };

type QuantityField = Extract<Column, { kind: 'quantity' }>['field'];

/** A quantity's names, without the unit that must follow. */
const QUANTITIES: readonly { names: string; field: QuantityField; units: Record<string, (value: number) => number>; hint: string }[] = [
  { names: 'maxwind|wind', field: 'maxWindKt', units: WIND_UNITS, hint: 'maxWindKt, maxWindMs, maxWindKmh or maxWindMph' },
  { names: 'gust|gusts', field: 'gustKt', units: WIND_UNITS, hint: 'gustKt, gustMs, gustKmh or gustMph' },
  { names: 'minpressure|pressure', field: 'minPressureHpa', units: PRESSURE_UNITS, hint: 'minPressureHpa' },
  { names: 'radiusmaxwind|rmw', field: 'radiusMaxWindNm', units: LENGTH_UNITS, hint: 'radiusMaxWindNm, radiusMaxWindKm or radiusMaxWindMi' },
  { names: 'eyediameter|eye', field: 'eyeDiameterNm', units: LENGTH_UNITS, hint: 'eyeDiameterNm, eyeDiameterKm or eyeDiameterMi' },
];

const PLAIN: Record<string, Column> = {
  validat: { kind: 'time' },
  time: { kind: 'time' },
  datetime: { kind: 'time' },
  lat: { kind: 'lat' },
  latitude: { kind: 'lat' },
  lon: { kind: 'lon' },
  lng: { kind: 'lon' },
  long: { kind: 'lon' },
  longitude: { kind: 'lon' },
  stage: { kind: 'stage' },
  stormname: { kind: 'about', field: 'stormName' },
  storm: { kind: 'about', field: 'stormName' },
  stormid: { kind: 'about', field: 'stormId' },
  number: { kind: 'about', field: 'number' },
  centre: { kind: 'about', field: 'centre' },
  center: { kind: 'about', field: 'centre' },
  issuedat: { kind: 'about', field: 'issuedAt' },
  nextdueat: { kind: 'about', field: 'nextDueAt' },
  dissipatesat: { kind: 'about', field: 'dissipatesAt' },
  averaging: { kind: 'about', field: 'averaging' },
};

const RADIUS = new RegExp(`^r(${THRESHOLD_KEYS.join('|')})(ne|se|sw|nw)([a-z]*)$`);

/** The accepted names of what every table of points must have, for error messages. */
export const REQUIRED = {
  time: 'validAt, time or datetime',
  lat: 'lat or latitude',
  lon: 'lon, lng or longitude',
  maxWindKt: QUANTITIES[0]!.hint,
} as const;

/** What a column is, by its name; capitals, spaces, hyphens and underscores make no difference. Null: not one of ours. */
export function columnOf(name: string): Column | null {
  const key = name.toLowerCase().replace(/[^a-z0-9]/g, '');
  if (Object.hasOwn(PLAIN, key)) return PLAIN[key]!;
  for (const { names, field, units, hint } of QUANTITIES) {
    const match = new RegExp(`^(?:${names})([a-z]*)$`).exec(key);
    if (match === null) continue;
    if (Object.hasOwn(units, match[1]!)) return { kind: 'quantity', field, toModel: units[match[1]!]! };
    if (match[1] === '') return { kind: 'unit-missing', field, hint };
  }
  const radius = RADIUS.exec(key);
  if (radius === null) return null;
  const [, threshold, quadrant, unit] = radius as unknown as [string, ThresholdKey, keyof QuadrantRadii, string];
  if (Object.hasOwn(LENGTH_UNITS, unit)) return { kind: 'radius', threshold, quadrant, toModel: LENGTH_UNITS[unit]! };
  return unit === '' ? { kind: 'unit-missing', field: `${threshold}${quadrant}`, hint: `r${threshold}${quadrant[0]!.toUpperCase()}${quadrant[1]}Nm, ...Km or ...Mi` } : null;
}
