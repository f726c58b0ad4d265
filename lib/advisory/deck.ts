import { failed, nearest } from './draft';
import { deckLine } from './deck/deck-line';
import { forecastsIn, preferred } from './deck/choose';
import { isoInstant, shown } from './instants';
import type { Place, Read, ReadOptions } from './draft';
import type { DeckForecast } from './deck/choose';
import type { DeckLine } from './deck/deck-line';
import type { InputError, Warning } from './model';

const HOUR_MS = 3_600_000;
const CENTRES: Record<string, Record<string, string>> = {
  OFCL: { AL: 'US National Hurricane Center', EP: 'US National Hurricane Center', CP: 'Central Pacific Hurricane Center' },
  JTWC: { WP: 'Joint Typhoon Warning Center', IO: 'Joint Typhoon Warning Center', SH: 'Joint Typhoon Warning Center' },
};
/** Fields of a point that any line of its lead may bring. */
const FIELDS = ['maxWindKt', 'gustKt', 'minPressureHpa', 'radiusMaxWindNm', 'eyeDiameterNm', 'stage'] as const;

/** What a deck holds, without its lines: for a choice of technique and cycle. */
export type DeckEntry = Omit<DeckForecast, 'lines'>;

/** Lists the forecasts in a deck, in the order of the file; lines that cannot be read are passed over. */
export function listDeck(text: string): DeckEntry[] {
  return forecastsIn(parse(text).lines).map(({ stormId, technique, cycle, usableLeads, leads }) => ({ stormId, technique, cycle, usableLeads, leads }));
}

/**
 * Reads the comma-delimited forecast deck that forecast centres exchange. One line is one threshold of one
 * lead; lines of a lead are merged. Unless told otherwise it takes the official technique's latest cycle.
 * Issue time is the cycle, number the cycle's digits; winds are 1-minute.
 */
export function readDeck(text: string, { technique, cycle }: ReadOptions = {}): Read {
  const { lines, errors } = parse(text);
  if (errors.length > 0) return failed(errors);
  const all = forecastsIn(lines);
  const asked = all.filter((forecast) => (technique === undefined || forecast.technique === technique.toUpperCase()) && (cycle === undefined || forecast.cycle === cycle));
  if (asked.length === 0) {
    const wanted = [technique, cycle].filter((part) => part !== undefined).map((part) => shown(part)).join(' at ');
    return failed({ message: `the deck has no forecast ${wanted}: it holds ${summary(all)}` });
  }
  const chosen = preferred(asked);
  if (chosen === undefined) {
    return failed({ line: asked[0]!.lines[0]!.line, message: `no line of ${summary(asked)} has both a position and a wind: choose a technique that forecasts both` });
  }
  const others = all.filter((forecast) => forecast !== chosen);
  const warnings: Warning[] = [];
  if (others.length > 0) warnings.push({ code: 'deck-has-more', message: `read ${chosen.technique} of ${chosen.cycle} for ${chosen.stormId}; the deck also holds ${summary(others)}` });
  return { ok: true, draft: assemble(chosen, warnings) };
}

function parse(text: string): { lines: DeckLine[]; errors: InputError[] } {
  const lines: DeckLine[] = [];
  const errors: InputError[] = [];
  text.split(/\r\n|\n|\r/).forEach((content, index) => {
    if (content.trim() === '') return;
    const read = deckLine(content, index + 1);
    if ('message' in read) errors.push(read);
    else lines.push(read);
  });
  return { lines, errors };
}

function assemble({ stormId, technique, cycle, lines }: DeckForecast, warnings: Warning[]): Extract<Read, { ok: true }>['draft'] {
  const { basin, cycleMs } = lines[0]!;
  const places = new Map<string, Place>([['storm', { line: lines[0]!.line }], ['issuedAt', { line: lines[0]!.line }]]);
  const byLead = new Map<number, DeckLine[]>();
  for (const line of [...lines].sort((a, b) => a.leadHours - b.leadHours)) {
    // Leads before the cycle are where the storm has been.
    if (line.leadHours < 0) continue;
    const group = byLead.get(line.leadHours);
    if (group === undefined) byLead.set(line.leadHours, [line]);
    else group.push(line);
  }
  const points = [...byLead.values()].flatMap((group) => {
    const point = merge(group, warnings);
    return point === null ? [] : [{ validAt: isoInstant(cycleMs + group[0]!.leadHours * HOUR_MS), line: group[0]!.line, point }];
  });
  points.forEach(({ line }, index) => places.set(`points.${index}`, { line }));
  const name = lines.find((line) => line.name !== undefined)?.name;
  if (name === undefined) warnings.push({ code: 'stormname-assumed', path: 'storm.name', line: lines[0]!.line, message: 'the deck does not name the storm: its identifier was taken' });
  const advisory = {
    storm: { id: stormId, name: name === undefined ? stormId : name[0]!.toUpperCase() + name.slice(1).toLowerCase() },
    number: cycle,
    centre: CENTRES[technique]?.[basin] ?? `technique ${technique}`,
    issuedAt: isoInstant(cycleMs),
    averaging: '1-min',
    points: points.map(({ validAt, point }) => ({ validAt, ...point })),
  };
  return { advisory, placeOf: (path) => nearest(places, path) ?? {}, warnings };
}

/** The lines of one lead as one point; null, with a warning, where they give no position or no wind. */
function merge(group: readonly DeckLine[], warnings: Warning[]): Record<string, unknown> | null {
  const [first] = group as [DeckLine, ...DeckLine[]];
  const located = group.find((line) => line.lat !== undefined);
  const windy = group.find((line) => line.maxWindKt !== undefined);
  if (located === undefined || windy === undefined) {
    warnings.push({ code: 'lead-left-out', line: first.line, message: `the ${first.leadHours} h lead was left out: it gives no ${located === undefined ? 'position' : 'wind'}` });
    return null;
  }
  const radiiNm: Record<string, unknown> = {};
  for (const line of group) {
    const differs = (line.lat !== undefined && (line.lat !== located.lat || line.lon !== located.lon)) || (line.maxWindKt !== undefined && line.maxWindKt !== windy.maxWindKt);
    const again = line.ring !== undefined && Object.hasOwn(radiiNm, line.ring.threshold) && JSON.stringify(radiiNm[line.ring.threshold]) !== JSON.stringify(line.ring.radii);
    if (differs || again) warnings.push({ code: 'lead-repeated', line: line.line, message: `the ${line.leadHours} h lead is given again with other values than on line ${first.line}, which was kept` });
    else if (line.ring !== undefined) radiiNm[line.ring.threshold] ??= line.ring.radii;
    if (line.unusedRadii !== undefined) warnings.push({ code: 'threshold-unused', line: line.line, message: `${line.unusedRadii} were left out: 34, 50 and 64 kt with AAA or a quadrant code (NEQ, SEQ, SWQ, NWQ) are read` });
  }
  const fields = FIELDS.flatMap((field) => {
    const value = group.find((line) => line[field] !== undefined)?.[field];
    return value === undefined ? [] : [[field, value]];
  });
  return { lat: located.lat, lon: located.lon, ...Object.fromEntries(fields), ...(Object.keys(radiiNm).length === 0 ? {} : { radiiNm }) };
}

/** `OFCL 2026092512, JTWC 2026092506 and 12 more`. */
function summary(forecasts: readonly DeckForecast[]): string {
  const storms = new Set(forecasts.map(({ stormId }) => stormId));
  const named = forecasts.slice(0, 8).map(({ stormId, technique, cycle }) => `${technique} ${cycle}${storms.size > 1 ? ` (${stormId})` : ''}`);
  return named.join(', ') + (forecasts.length > named.length ? ` and ${forecasts.length - named.length} more` : '');
}
