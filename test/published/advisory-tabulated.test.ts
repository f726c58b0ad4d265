/**
 * Official forecast advisories as others read them from the same texts: rrricanesdata (CC0), table fstadv.
 * See test/fixtures/bulletins/README.md.
 */
import { readFileSync } from 'node:fs';
import { parse } from 'csv-parse/sync';
import { describe, expect, test } from 'vitest';
import { readAdvisory, writeBulletin } from '../../lib/advisory';
import type { Advisory, Point } from '../../lib/advisory';

const fixture = (name: string): string => readFileSync(new URL(`../fixtures/bulletins/${name}`, import.meta.url), 'utf8');
type Row = Record<string, string>;
const rows = parse(fixture('tabulated.csv'), { columns: true }) as Row[];

/** Leads whose times the table has right. */
const LEADS = ['', 'Hr12', 'Hr24', 'Hr36', 'Hr48', 'Hr72'];

function tabulatedPoint(row: Row, lead: string): Point | null {
  const date = row[lead === '' ? 'Date' : `${lead}FcstDate`];
  const value = (name: string): number | undefined => (row[name] === undefined || row[name] === '' ? undefined : Number(row[name]));
  if (date === undefined || date === '') return null;
  const rings = ['34', '50', '64'].flatMap((kt) => {
    const [ne, se, sw, nw] = ['NE', 'SE', 'SW', 'NW'].map((quadrant) => value(`${lead}${quadrant}${kt}`));
    return ne === undefined ? [] : [[kt, { ne, se, sw, nw }]];
  });
  const pressure = lead === '' ? value('Pressure') : undefined;
  const eye = lead === '' ? value('Eye') : undefined;
  return {
    validAt: `${date.replace(' ', 'T')}Z`,
    lat: value(`${lead}Lat`)!,
    lon: value(`${lead}Lon`)!,
    maxWindKt: value(`${lead}Wind`)!,
    gustKt: value(`${lead}Gust`)!,
    ...(pressure === undefined ? {} : { minPressureHpa: pressure }),
    ...(eye === undefined ? {} : { eyeDiameterNm: eye }),
    ...(rings.length === 0 ? {} : { radiiNm: Object.fromEntries(rings) as Point['radiiNm'] }),
  };
}

const tabulated = (row: Row): Point[] => LEADS.flatMap((lead) => tabulatedPoint(row, lead) ?? []);
const withoutStage = (point: Point): Point => Object.fromEntries(Object.entries(point).filter(([name]) => name !== 'stage')) as Point;

function read(text: string): Advisory {
  const reading = readAdvisory(text);
  if (!reading.ok) throw new Error(JSON.stringify(reading.errors));
  return reading.advisory;
}

describe('the bulletin says what the table says it says', () => {
  test.each([
    ['al012011.fstadv.010', 'AL012011'],
    ['al012012.fstadv.012', 'AL012012'],
    ['ep132014.fstadv.001.08220251', 'EP132014'],
  ])('%s', (name, key) => {
    const row = rows.find((each) => each.Key === key)!;
    const { storm, number, issuedAt, points } = read(fixture(`${name}.txt`));
    expect([storm.id, storm.name, number, issuedAt]).toEqual([key, row.Name, row.Adv, `${row.Date!.replace(' ', 'T')}Z`]);
    const expected = tabulated(row);
    expect(points.slice(0, expected.length).map(withoutStage)).toEqual(expected);
  });
});

describe('a whole storm of official advisories, written as bulletins', () => {
  const irene = rows.filter((row) => row.Key === 'AL092011');
  const given = (row: Row): Advisory => ({ storm: { id: 'AL092011', name: row.Name! }, number: row.Adv!, centre: 'NWS NATIONAL HURRICANE CENTER MIAMI FL', issuedAt: `${row.Date!.replace(' ', 'T')}Z`, averaging: '1-min', points: tabulated(row) });

  test('has the 35 advisories that were issued', () => expect(irene).toHaveLength(35));

  test.each(irene.map((row) => [row.Adv!, row] as const))('number %s reads back as tabulated, and causes no warning', (_, row) => {
    const reading = readAdvisory(writeBulletin(given(row)));
    expect(reading).toMatchObject({ ok: true, warnings: [] });
    expect(reading.ok && { ...reading.advisory, points: reading.advisory.points.map(withoutStage) }).toEqual(given(row));
  });
});
