import { readdirSync, readFileSync } from 'node:fs';
import { readAdvisory } from '../../lib/advisory';
import type { Advisory, InputError, Point, ReadOptions, Warning } from '../../lib/advisory';

type Folder = 'bulletins' | 'decks';
const folder = (name: Folder): URL => new URL(`../fixtures/${name}/`, import.meta.url);

export const namesIn = (where: Folder): string[] => readdirSync(folder(where)).filter((name) => name.endsWith('.txt')).map((name) => name.slice(0, -4));

export const textOf = (where: Folder, name: string): string => readFileSync(new URL(`${name}.txt`, folder(where)), 'utf8');

export interface Expected {
  advisory: Advisory;
  warnings: { code: string; line: number }[];
}

export const expectedOf = (where: Folder, name: string): Expected => JSON.parse(readFileSync(new URL(`${name}.json`, folder(where)), 'utf8')) as Expected;

/** What is read, where reading must succeed. */
export function read(text: string, options?: ReadOptions): { advisory: Advisory; warnings: Warning[] } {
  const reading = readAdvisory(text, options);
  if (!reading.ok) throw new Error(`not read: ${JSON.stringify(reading.errors)}`);
  return { advisory: reading.advisory, warnings: reading.warnings };
}

/** What is wrong, where reading must fail. */
export function errorsOf(text: string, options?: ReadOptions): InputError[] {
  const reading = readAdvisory(text, options);
  if (reading.ok) throw new Error(`read: ${JSON.stringify(reading.advisory)}`);
  return reading.errors;
}

export const codes = (warnings: readonly Warning[]): string[] => warnings.map(({ code }) => code);

const HEADER = ['HURRICANE MARO FORECAST/ADVISORY NUMBER   5', 'NWS NATIONAL HURRICANE CENTER MIAMI FL       AL092031', '0900 UTC FRI SEP 19 2031', ''];
const LOCATED = ['HURRICANE CENTER LOCATED NEAR 24.1N  55.2W AT 19/0900Z', 'MAX SUSTAINED WINDS  70 KT WITH GUSTS TO  85 KT.'];
const FORECAST = ['FORECAST VALID 19/1800Z 24.9N  56.2W', 'MAX WIND  80 KT...GUSTS 100 KT.'];
const END = ['NEXT ADVISORY AT 19/1500Z', '$$', 'NNNN'];

/** A short bulletin of an invented storm, of which a test can replace any part. Line 5 is the position, line 7 the forecast. */
export const bulletin = ({ header = HEADER, located = LOCATED, forecast = FORECAST, end = END }: { header?: string[]; located?: string[]; forecast?: string[]; end?: string[] } = {}): string =>
  [...header, ...located, ...forecast, ...end].join('\n');

/** A point of the same storm, of which a test can replace any field. */
export const point = (fields: Partial<Point> = {}): Point => ({ validAt: '2031-09-19T09:00:00Z', lat: 24.1, lon: -55.2, maxWindKt: 70, ...fields });

/** An advisory of the same storm with nothing to warn of, of which a test can replace any field. */
export const advisory = (fields: Partial<Advisory> = {}): Advisory => ({
  storm: { id: 'AL092031', name: 'Maro' },
  number: '5',
  centre: 'NWS NATIONAL HURRICANE CENTER MIAMI FL',
  issuedAt: '2031-09-19T09:00:00Z',
  averaging: '1-min',
  points: [point(), point({ validAt: '2031-09-19T18:00:00Z', lat: 24.9, lon: -56.2, maxWindKt: 80 })],
  ...fields,
});
