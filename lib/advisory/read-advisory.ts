import { readBulletin } from './bulletin';
import { readCsv } from './csv';
import { readDeck } from './deck';
import { detectFormat } from './detect-format';
import { finish } from './finish';
import { readGeoJson } from './geojson';
import { readJson } from './json';
import type { Read, ReadOptions } from './draft';
import type { Format, Reading } from './model';

const READERS: Record<Format, (text: string, options: ReadOptions) => Read> = {
  bulletin: readBulletin,
  deck: readDeck,
  geojson: readGeoJson,
  csv: readCsv,
  json: readJson,
};

/** Nobody mends more at once; the first are where to start. */
const MOST_LISTED = 100;

const NOT_RECOGNISED =
  'this is none of the forms a forecast is read from: a forecast/advisory text bulletin, a comma-delimited forecast deck, CSV with a header naming lat and lon, GeoJSON, or an advisory as JSON';

/**
 * Reads a forecast in any form. The form is told from the content unless `options.format` names it.
 *
 * Never throws: what is wrong comes back as `errors`, each saying where (lines and columns count from 1)
 * and how to mend it; what is only odd comes back as `warnings` beside the advisory, also against the
 * event's clock and the advisory before where `options.nowMs` and `options.previous` give them.
 *
 * @example
 * const reading = readAdvisory(text);
 * if (reading.ok) show(reading.advisory, reading.warnings);
 */
export function readAdvisory(text: string, options: ReadOptions = {}): Reading {
  const plain = text.replace(/^\ufeff/, '');
  if (plain.trim() === '') return { ok: false, format: options.format ?? null, errors: [{ message: 'the file is empty: nothing to read' }] };
  const format = options.format ?? detectFormat(plain);
  if (format === null) return { ok: false, format, errors: [{ line: 1, message: NOT_RECOGNISED }] };
  const read = READERS[format](plain, options);
  const reading: Reading = read.ok ? finish(format, read.draft, options) : { ok: false, format, errors: read.errors };
  return reading.ok ? { ...reading, warnings: listed(reading.warnings, (message) => ({ code: 'more-warnings', message })) } : { ...reading, errors: listed(reading.errors, (message) => ({ message })) };
}

/** The first of a long list, and how many more there are. */
const listed = <T>(all: T[], more: (message: string) => T): T[] => (all.length <= MOST_LISTED ? all : [...all.slice(0, MOST_LISTED), more(`and ${all.length - MOST_LISTED} more like these`)]);
