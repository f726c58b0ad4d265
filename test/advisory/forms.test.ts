import { describe, expect, test } from 'vitest';
import { THRESHOLD_KEYS } from '../../lib/units';
import { writeBulletin } from '../../lib/advisory';
import { expectedOf, read } from './fixtures';
import type { Advisory, Point } from '../../lib/advisory';

/** An official forecast with three rings, and the same one written in every form. */
const whole = expectedOf('bulletins', 'al012004.fstadv.012').advisory;
const QUADRANTS = ['ne', 'se', 'sw', 'nw'] as const;
const about = { stormName: whole.storm.name, stormId: whole.storm.id, number: whole.number, centre: whole.centre, issuedAt: whole.issuedAt, averaging: whole.averaging };

const properties = ({ validAt, maxWindKt, gustKt, minPressureHpa, eyeDiameterNm, stage, radiiNm }: Point): Record<string, unknown> => ({ validAt, maxWindKt, gustKt, minPressureHpa, eyeDiameterNm, stage, radiiNm });

function asCsv({ points }: Advisory): string {
  const names = ['validAt', 'lat', 'lon', 'maxWindKt', 'gustKt', 'minPressureHpa', 'eyeDiameterNm', 'stage'] as const;
  const header = [...names, ...THRESHOLD_KEYS.flatMap((key) => QUADRANTS.map((quadrant) => `r${key}${quadrant}Nm`)), ...Object.keys(about)];
  const rows = points.map((point) => [...names.map((name) => point[name] ?? ''), ...THRESHOLD_KEYS.flatMap((key) => QUADRANTS.map((quadrant) => point.radiiNm?.[key]?.[quadrant] ?? '')), ...Object.values(about)]);
  return [header, ...rows].map((row) => row.join(',')).join('\n');
}

function asDeck({ issuedAt, points }: Advisory): string {
  const cycle = issuedAt.replace(/\D/g, '').slice(0, 10);
  const tenths = (value: number, positive: string, negative: string): string => `${Math.round(Math.abs(value) * 10)}${value < 0 ? negative : positive}`;
  return points
    .flatMap((point) => {
      const lead = (Date.parse(point.validAt) - Date.parse(issuedAt)) / 3_600_000;
      const stage = point.stage === 'post-tropical' ? 'EX' : 'HU';
      return THRESHOLD_KEYS.map((key) => {
        const ring = point.radiiNm?.[key] ?? { ne: 0, se: 0, sw: 0, nw: 0 };
        return `AL, 01, ${cycle}, 03, OFCL, ${lead}, ${tenths(point.lat, 'N', 'S')}, ${tenths(point.lon, 'E', 'W')}, ${point.maxWindKt}, ${point.minPressureHpa ?? 0}, ${stage}, ${key}, NEQ, ${ring.ne}, ${ring.se}, ${ring.sw}, ${ring.nw}, 0, 0, 0, ${point.gustKt ?? 0}, ${point.eyeDiameterNm ?? 0},`;
      });
    })
    .join('\n');
}

const asPoints = ({ points }: Advisory): string => JSON.stringify({ type: 'FeatureCollection', properties: about, features: points.map((point) => ({ type: 'Feature', geometry: { type: 'Point', coordinates: [point.lon, point.lat] }, properties: properties(point) })) });

function asLine({ points }: Advisory): string {
  const rows = points.map(properties);
  const lists = Object.fromEntries(Object.keys(rows[0]!).map((name) => [name === 'validAt' ? 'times' : name, rows.map((row) => row[name] ?? null)]));
  return JSON.stringify({ type: 'Feature', geometry: { type: 'LineString', coordinates: points.map(({ lon, lat }) => [lon, lat]) }, properties: { ...about, ...lists } });
}

const FORMS: [string, (advisory: Advisory) => string][] = [
  ['bulletin', writeBulletin],
  ['deck', asDeck],
  ['csv', asCsv],
  ['geojson', asPoints],
  ['geojson', asLine],
  ['json', (advisory) => JSON.stringify(advisory)],
];

describe('one storm reads the same in every form', () => {
  test.each(FORMS)('as %s (%o)', (_, write) => {
    expect(read(write(whole)).advisory.points).toEqual(whole.points);
  });

  test.each(FORMS.filter(([form]) => form !== 'deck'))('as %s with who issued it and when', (_, write) => {
    const { storm, number, centre, issuedAt, averaging } = whole;
    expect(read(write(whole)).advisory).toMatchObject({ storm, number, centre, issuedAt, averaging });
  });

  test('as a deck with its identifier, cycle and centre', () => {
    expect(read(asDeck(whole)).advisory).toMatchObject({ storm: { id: 'AL012004' }, number: '2004080309', centre: 'US National Hurricane Center', issuedAt: whole.issuedAt });
  });
});
