import { describe, expect, test } from 'vitest';
import { compileExposure } from '../../lib/exposure';
import { forecastHazard, makeBlocks, nodeLeads, placesAt, tabulateStorm } from '../../lib/hazard';
import { makeTrack } from '../../lib/track';
import { surfaceFactor } from '../../lib/wind';
import { makeAdvisories } from '../../server/demo/storm/advisories';
import { cellsOf, zonesOf } from './shipped';

/** What a room must be able to practise on: forecasts that change who is hit, when, and how hard, on their own tracks. */
const { places, zones } = compileExposure([{ layerId: 'zones', data: { kind: 'zones', zones: zonesOf() } }, { layerId: 'people', data: { kind: 'population', cells: cellsOf() } }], () => 'open');
const ground = placesAt(places.lat, places.lon, new Float32Array(places.count).fill(surfaceFactor('open')));
const blocks = makeBlocks(ground, null);

const told = makeAdvisories().map((advisory) => {
  const track = makeTrack(advisory);
  const { peakKt, arrival } = forecastHazard(tabulateStorm(track, nodeLeads(track, 0.5)), ground, blocks);
  const people = (kt: number): number => places.people.reduce((sum, value, i) => sum + (peakKt[i] >= kt ? value : 0), 0);
  const firstIn = (name: string): number => {
    const zone = zones.findIndex((one) => one.name === name);
    return arrival.reduce((least, lead, k) => (k % 3 === 0 && places.zone[k / 3] === zone && lead < least ? lead : least), Infinity);
  };
  const firsts = zones.map(({ name }) => firstIn(name)).filter(Number.isFinite);
  return { people34: people(34), people50: people(50), people64: people(64), cityHour: firstIn('Port Ansel W'), firstIn, firsts };
});
const hourOf = (i: number): number => told[i].cityHour + 6 * i;

describe('advisory 3, two hours after its issue', () => {
  test('34 kt comes to the first zone within a day, and takes a quarter of a day or more from the first to the last', () => {
    const [first, last] = [Math.min(...told[2].firsts) - 2, Math.max(...told[2].firsts) - 2];
    expect(first).toBeGreaterThan(18);
    expect(first).toBeLessThan(24);
    expect(last - first).toBeGreaterThan(6);
    expect(last).toBeLessThan(40);
  });

  test('the first start-by times are hours away, not days: Saltmarsh has at most four hours on the forecast track', () => {
    const slack = zones.map(({ name, clearanceHours }) => ({ name, hours: told[2].firstIn(name) - 2 - clearanceHours! })).sort((a, b) => a.hours - b.hours);
    expect(slack[0].name).toBe('Saltmarsh');
    expect(slack[0].hours).toBeLessThan(4);
    expect(slack.filter(({ hours }) => hours < 12).length).toBeGreaterThan(5);
  });
});

describe('the surprise', () => {
  test('advisory 4 brings hurricane force to five times as many people as any before', () => {
    const before = Math.max(...told.slice(0, 3).map(({ people64 }) => people64));
    expect(told[3].people64).toBeGreaterThan(5 * before);
    expect(told[3].people64).toBeGreaterThan(500_000);
  });

  test('advisories 1 to 3 have the city on the fringe: under a quarter of the country in 50 kt', () => {
    for (const { people50, people34 } of told.slice(0, 3)) {
      expect(people50).toBeLessThan(600_000);
      expect(people34).toBeGreaterThan(800_000);
    }
  });

  test('4 and 5 make it sooner, 6 later', () => {
    expect(hourOf(3)).toBeLessThan(hourOf(2));
    expect(hourOf(5)).toBeGreaterThan(hourOf(4));
  });

  test('7 still moves the counts', () => {
    expect(Math.abs(told[6].people64 - told[5].people64)).toBeGreaterThan(50_000);
  });
});
