import { utcMs } from '../instants';
import { THRESHOLD_KEYS } from '../../units';
import type { ThresholdKey } from '../../units';
import type { InputError, QuadrantRadii, Stage } from '../model';

/** One line of a deck: a technique's forecast of one lead, with the radii of one threshold. Absent: not given. */
export interface DeckLine {
  line: number;
  basin: string;
  number: string;
  cycle: string;
  cycleMs: number;
  technique: string;
  leadHours: number;
  lat?: number;
  lon?: number;
  maxWindKt?: number;
  gustKt?: number;
  minPressureHpa?: number;
  radiusMaxWindNm?: number;
  eyeDiameterNm?: number;
  stage?: Stage;
  name?: string;
  ring?: { threshold: ThresholdKey; radii: QuadrantRadii };
  /** Radii that were given in a form that is not used. */
  unusedRadii?: string;
}

/** Places of the fields, as the format's description numbers them (US Naval Research Laboratory, `abrdeck`), from 0. */
const FIELD = { basin: 0, number: 1, cycle: 2, technique: 4, lead: 5, lat: 6, lon: 7, wind: 8, pressure: 9, stage: 10, threshold: 11, code: 12, radii: 13, rmw: 19, gust: 20, eye: 21, name: 27 } as const;

const STAGES: Record<string, Stage> = {
  DB: 'disturbance', WV: 'disturbance', MD: 'disturbance',
  TD: 'depression',
  TS: 'tropical', TY: 'tropical', ST: 'tropical', TC: 'tropical', HU: 'tropical',
  SD: 'subtropical', SS: 'subtropical',
  EX: 'post-tropical', PT: 'post-tropical',
  LO: 'remnant-low',
};

/** Quadrants in clockwise order from the one the code names. */
const CLOCKWISE = ['ne', 'se', 'sw', 'nw'] as const;
const STARTS: Record<string, number> = { NEQ: 0, SEQ: 1, SWQ: 2, NWQ: 3 };

/** Reads one line; an error where the fields that say what it is of cannot be read. */
export function deckLine(text: string, line: number): DeckLine | InputError {
  const fields = text.split(',', 40).map((field) => field.trim());
  const field = (index: number): string => fields[index] ?? '';
  const fail = (index: number, message: string): InputError => ({ line, column: columnOf(text, index), message });

  const basin = field(FIELD.basin).toUpperCase();
  if (!/^[A-Z]{2}$/.test(basin)) return fail(FIELD.basin, `"${field(0).slice(0, 20)}" is no basin: a line starts with two letters such as AL`);
  if (!/^\d{1,2}$/.test(field(FIELD.number))) return fail(FIELD.number, 'no storm number such as 12 follows the basin');
  const cycle = field(FIELD.cycle);
  const cycleMs = /^\d{10}$/.test(cycle) ? utcMs(Number(cycle.slice(0, 4)), Number(cycle.slice(4, 6)), Number(cycle.slice(6, 8)), Number(cycle.slice(8)), 0) : null;
  if (cycleMs === null) return fail(FIELD.cycle, `"${cycle.slice(0, 20)}" is no cycle: write year, month, day and hour, such as 2026092512`);
  const technique = field(FIELD.technique).toUpperCase();
  if (!/^\S{2,8}$/.test(technique)) return fail(FIELD.technique, 'no technique such as OFCL is named in the fifth field');
  if (!/^-?\d{1,3}$/.test(field(FIELD.lead))) return fail(FIELD.lead, `"${field(FIELD.lead).slice(0, 20)}" is no lead time: write whole hours in the sixth field`);

  const lat = degrees(field(FIELD.lat), 'N', 'S');
  const lon = degrees(field(FIELD.lon), 'E', 'W');
  if (lat === 'unreadable') return fail(FIELD.lat, `"${field(FIELD.lat).slice(0, 20)}" is no latitude: write tenths of a degree and N or S, such as 187N`);
  if (lon === 'unreadable') return fail(FIELD.lon, `"${field(FIELD.lon).slice(0, 20)}" is no longitude: write tenths of a degree and E or W, such as 651W`);
  const wind = field(FIELD.wind);
  if (wind !== '' && !/^-?\d+$/.test(wind)) return fail(FIELD.wind, `"${wind.slice(0, 20)}" is no wind: write whole knots, 0 where it is not known`);

  // Both zero is how a technique without a position fills the fields.
  const placed = lat !== null && lon !== null && !(lat === 0 && lon === 0);
  return {
    line, basin, number: field(FIELD.number).padStart(2, '0'), cycle, cycleMs, technique,
    leadHours: Number(field(FIELD.lead)),
    ...(placed ? { lat, lon: lon > 180 ? lon - 360 : lon } : {}),
    ...optional('maxWindKt', given(wind)),
    ...optional('gustKt', given(field(FIELD.gust))),
    ...optional('minPressureHpa', given(field(FIELD.pressure))),
    ...optional('radiusMaxWindNm', given(field(FIELD.rmw))),
    ...optional('eyeDiameterNm', given(field(FIELD.eye))),
    ...optional('stage', STAGES[field(FIELD.stage).toUpperCase()]),
    ...optional('name', /^[A-Z][A-Z-]+$/i.test(field(FIELD.name)) ? field(FIELD.name) : undefined),
    ...radiiOf(field),
  };
}

/** 0 stands for "not known" in a deck, as do -9, -99 and the like. */
function given(text: string): number | undefined {
  const value = /^-?\d+$/.test(text) ? Number(text) : 0;
  return value > 0 ? value : undefined;
}

function degrees(text: string, positive: string, negative: string): number | null | 'unreadable' {
  if (text === '' || /^0+$/.test(text)) return null;
  const match = /^(\d{1,4})([A-Z])$/i.exec(text);
  const letter = match?.[2]!.toUpperCase();
  if (match === null || (letter !== positive && letter !== negative)) return 'unreadable';
  return (Number(match[1]) / 10) * (letter === negative ? -1 : 1) + 0;
}

/** Four radii of 0 are "not given" here: decks fill the fields whether or not the wind is forecast. */
function radiiOf(field: (index: number) => string): Pick<DeckLine, 'ring' | 'unusedRadii'> {
  const radii = [0, 1, 2, 3].map((offset) => given(field(FIELD.radii + offset)) ?? 0);
  if (radii.every((radius) => radius === 0)) return {};
  const written = field(FIELD.threshold);
  const threshold = THRESHOLD_KEYS.find((key) => key === written.replace(/^0+/, ''));
  if (threshold === undefined) return { unusedRadii: `radii of "${written.slice(0, 20)}" kt winds` };
  const code = field(FIELD.code).toUpperCase();
  if (code === 'AAA') {
    const radius = radii[0]!;
    return { ring: { threshold, radii: { ne: radius, se: radius, sw: radius, nw: radius } } };
  }
  const start = STARTS[code];
  if (start === undefined) return { unusedRadii: `radii of ${threshold} kt winds with the code "${code.slice(0, 20)}"` };
  const ring = Object.fromEntries(radii.map((radius, offset) => [CLOCKWISE[(start + offset) % 4]!, radius])) as unknown as QuadrantRadii;
  return { ring: { threshold, radii: { ne: ring.ne, se: ring.se, sw: ring.sw, nw: ring.nw } } };
}

const optional = <K extends string, V>(key: K, value: V | undefined): Partial<Record<K, V>> => (value === undefined ? {} : ({ [key]: value } as Record<K, V>));

/** Column, from 1, at which a field's text starts. */
function columnOf(text: string, index: number): number {
  const before = text.split(',').slice(0, index).reduce((length, field) => length + field.length + 1, 0);
  const rest = text.slice(before);
  return Math.min(before + (rest.length - rest.trimStart().length), text.length) + 1;
}
