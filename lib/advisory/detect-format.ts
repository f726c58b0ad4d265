import type { Format } from './model';

const DECK_LINE = /^\s*[A-Z]{2}\s*,\s*\d{1,2}\s*,\s*\d{10}\s*,/i;
const BULLETIN = /FORECAST\s?\/\s?ADVISORY|ADVISORY\s{1,4}NUMBER|CENTER\s{1,4}(?:WAS\s)?LOCATED|(?:FORECAST|OUTLOOK)\s{1,4}VALID/i;
/** How much of a file is looked at. */
const LOOKED_AT = 100_000;

/** Tells the format of a file from its content; null where it is none that can be read. */
export function detectFormat(text: string): Format | null {
  const head = text.slice(0, LOOKED_AT).replace(/^\ufeff/, '');
  const first = head.trimStart().charAt(0);
  if (first === '{' || first === '[') return /"type"\s{0,9}:\s{0,9}"(?:FeatureCollection|Feature|LineString|MultiPoint|Point)"/.test(head) ? 'geojson' : 'json';

  const lines = head.split(/\r\n|\n|\r/).filter((line) => line.trim() !== '');
  const deckLines = lines.filter((line) => DECK_LINE.test(line)).length;
  if (deckLines > 0 && deckLines * 2 >= lines.length) return 'deck';
  if (isCsvHeader(lines[0] ?? '')) return 'csv';
  return BULLETIN.test(head) ? 'bulletin' : null;
}

/** A header names a latitude and a longitude among columns. */
const isCsvHeader = (line: string): boolean => {
  const names = line.slice(0, 5000).split(/[,;\t]/).map((name) => name.trim().replace(/^"|"$/g, '').toLowerCase());
  return names.length > 2 && names.some((name) => /^(lat|latitude)\b/.test(name)) && names.some((name) => /^(lon|lng|long|longitude)\b/.test(name));
};
