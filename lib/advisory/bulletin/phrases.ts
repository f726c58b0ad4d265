/** Positions, times and winds as bulletins write them. Each takes one line of at most 240 characters. */

const POSITION = /(\d{1,3}(?:\.\d+)?)\s?([NS])[\s,/]{0,6}(\d{1,3}(?:\.\d+)?)\s?([EW])\b/i;
const DAY_TIME = /\b(\d{1,2})\s?\/\s?(\d{4})\s?(?:Z|UTC)?/i;
const FORECAST = /^(?:\d{1,3}[\s-]?H(?:OU)?RS?\s)?(?:FORECAST|OUTLOOK)\s+VALID\b\s*(.*)$/i;
const LOCATED = /\b(?:RE-?)?(?:LOCATED|CENTERED|CENTRED)\b/i;
const WIND = /^MAX(?:IMUM)?\s+(?:SUSTAINED\s+)?WINDS?\b[.\s]*(.*)$/i;

export interface Position {
  lat: number;
  lon: number;
}

export function position(text: string): (Position & { end: number }) | null {
  const match = POSITION.exec(text);
  if (match === null) return null;
  const signed = (value: string, negative: boolean): number => (negative ? -Number(value) : Number(value)) + 0;
  return { lat: signed(match[1]!, /s/i.test(match[2]!)), lon: signed(match[3]!, /w/i.test(match[4]!)), end: match.index + match[0].length };
}

/** `19/0600Z`, day of the month and hhmm. */
export function dayTime(text: string): { day: number; hhmm: string; end: number } | null {
  const match = DAY_TIME.exec(text);
  return match === null ? null : { day: Number(match[1]), hhmm: match[2]!, end: match.index + match[0].length };
}

export type ForecastLine = { day: number; hhmm: string; position: Position | null; remark: string } | { problem: string };

/** Reads `FORECAST VALID 29/1800Z 11.7N  83.0W...INLAND`; null if the line is no forecast line. */
export function forecastLine(text: string): ForecastLine | null {
  const match = FORECAST.exec(text);
  if (match === null) return null;
  const tail = match[1]!;
  const time = dayTime(tail.slice(0, 12));
  if (time === null) return { problem: `no time such as 29/1800Z follows VALID in "${text}"` };
  const rest = tail.slice(time.end);
  const where = position(rest);
  const remark = (where === null ? rest : rest.slice(where.end)).replace(/^[.\s]+|[.\s]+$/g, '').replace(/\s+/g, ' ');
  return { day: time.day, hhmm: time.hhmm, position: where === null ? null : { lat: where.lat, lon: where.lon }, remark };
}

/** Reads `HURRICANE CENTER LOCATED NEAR 33.5N  76.9W AT 03/0900Z`, also in the repeat and the earlier fix. */
export function locatedLine(text: string): { kind: 'now' | 'repeat' | 'earlier'; before: string; day: number; hhmm: string; position: Position } | null {
  const word = LOCATED.exec(text);
  if (word === null) return null;
  const tail = text.slice(word.index);
  const where = position(tail);
  if (where === null) return null;
  const time = dayTime(tail.slice(where.end)) ?? dayTime(text.slice(0, word.index));
  if (time === null) return null;
  const before = text.slice(0, word.index);
  const kind = /^REPEAT/i.test(before) ? 'repeat' : /WAS\s*$/i.test(before) ? 'earlier' : 'now';
  return { kind, before, day: time.day, hhmm: time.hhmm, position: { lat: where.lat, lon: where.lon } };
}

export type WindLine = { kt: number; gustKt: number | undefined } | { problem: string };

/** Reads `MAX WIND  45 KT...GUSTS  55 KT.`; null if the line gives no maximum wind. */
export function windLine(text: string): WindLine | null {
  const match = WIND.exec(text);
  if (match === null) return null;
  const wind = /^(-?\d{1,4}(?:\.\d+)?)\s*KT\b/i.exec(match[1]!);
  if (wind === null) return { problem: `no wind in knots such as "45 KT" stands in "${text}"` };
  const tail = match[1]!.slice(wind[0].length);
  if (!/GUST/i.test(tail)) return { kt: Number(wind[1]), gustKt: undefined };
  const gust = /GUSTS?\s*(?:TO|NEAR)?\s*(-?\d{1,4}(?:\.\d+)?)\s*KT\b/i.exec(tail);
  if (gust === null) return { problem: `no gust in knots such as "GUSTS 55 KT" stands in "${text}"` };
  return { kt: Number(wind[1]), gustKt: Number(gust[1]) };
}

const PRESSURE = /MINIMUM CENTRAL PRESSURE\s+(?:IS\s+|NEAR\s+)?(\d{3,4}(?:\.\d+)?)\s*(?:MB|HPA|MILLIBARS?)\b/i;
const EYE = /^EYE DIAMETER\s+(?:IS\s+)?(\d{1,3})\s*(?:NM|NMI)\b/i;

/** The number that follows a phrase of its own; `problem` where the phrase stands without it, null where it does not stand. */
export function quantityLine(text: string): { quantity: 'minPressureHpa' | 'eyeDiameterNm'; value: number } | { problem: string } | null {
  const pressure = PRESSURE.exec(text);
  if (pressure !== null) return { quantity: 'minPressureHpa', value: Number(pressure[1]) };
  if (/MINIMUM CENTRAL PRESSURE/i.test(text)) return { problem: `no pressure such as "983 MB" stands in "${text}"` };
  const eye = EYE.exec(text);
  if (eye !== null) return { quantity: 'eyeDiameterNm', value: Number(eye[1]) };
  return /^EYE DIAMETER/i.test(text) ? { problem: `no width such as "15 NM" stands in "${text}"` } : null;
}
