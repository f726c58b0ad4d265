import type { DeckLine } from './deck-line';

/** One technique's forecast from one cycle for one storm, as a deck holds it. */
export interface DeckForecast {
  /** `AL092026`: basin, number and season. */
  stormId: string;
  technique: string;
  cycle: string;
  /** Leads at or after the cycle that have both position and wind, and so can be used. */
  usableLeads: number;
  /** All leads at or after the cycle. */
  leads: number;
  lines: DeckLine[];
}

/** Techniques that are a forecast centre's official forecast. */
const OFFICIAL = ['OFCL', 'JTWC'];

/** Groups lines by storm, technique and cycle, in the order of the file. */
export function forecastsIn(lines: readonly DeckLine[]): DeckForecast[] {
  const groups = new Map<string, DeckLine[]>();
  for (const line of lines) {
    const key = `${stormIdOf(line)} ${line.technique} ${line.cycle}`;
    const group = groups.get(key);
    if (group === undefined) groups.set(key, [line]);
    else group.push(line);
  }
  return [...groups.values()].map((group) => {
    const ahead = group.filter((line) => line.leadHours >= 0);
    const leads = new Set(ahead.map((line) => line.leadHours)).size;
    const usableLeads = new Set(ahead.filter((line) => line.lat !== undefined && line.maxWindKt !== undefined).map((line) => line.leadHours)).size;
    const { technique, cycle } = group[0]!;
    return { stormId: stormIdOf(group[0]!), technique, cycle, usableLeads, leads, lines: group };
  });
}

/** Official techniques first, then the latest cycle, then the most leads. Without an official one the most leads come before the cycle. */
export function preferred(forecasts: readonly DeckForecast[]): DeckForecast | undefined {
  const usable = forecasts.filter((forecast) => forecast.usableLeads > 0);
  const official = usable.filter((forecast) => OFFICIAL.includes(forecast.technique));
  if (official.length > 0) return best(official, (a, b) => b.cycle.localeCompare(a.cycle) || b.usableLeads - a.usableLeads);
  const latest = usable.reduce((cycle, forecast) => (forecast.cycle > cycle ? forecast.cycle : cycle), '');
  return best(usable.filter((forecast) => forecast.cycle === latest), (a, b) => b.usableLeads - a.usableLeads);
}

const best = (forecasts: readonly DeckForecast[], order: (a: DeckForecast, b: DeckForecast) => number): DeckForecast | undefined => [...forecasts].sort(order)[0];

/** Southern seasons run from July and carry the year they end in. */
function stormIdOf({ basin, number, cycle }: DeckLine): string {
  const year = Number(cycle.slice(0, 4)) + (basin === 'SH' && Number(cycle.slice(4, 6)) >= 7 ? 1 : 0);
  return `${basin}${number}${year}`;
}
