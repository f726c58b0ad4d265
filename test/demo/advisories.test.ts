import { describe, expect, test } from 'vitest';
import { readAdvisory } from '../../lib/advisory';
import type { Advisory } from '../../lib/advisory';
import { distanceKm } from '../../lib/geo';
import { kmToNmi } from '../../lib/units';
import { makeAdvisories } from '../../server/demo/storm/advisories';
import { textOf } from './shipped';

const files = Array.from({ length: 8 }, (_, i) => `advisories/0${i + 1}.txt`);
const sources = makeAdvisories();

function read(file: string) {
  const reading = readAdvisory(textOf(file));
  if (!reading.ok) throw new Error(`${file}: ${JSON.stringify(reading.errors)}`);
  return reading;
}
const hour = (at: string): number => Date.parse(at) / 3_600_000;
const leads = ({ issuedAt, points }: Advisory): number[] => points.map(({ validAt }) => hour(validAt) - hour(issuedAt));

describe.each(files.map((file, i) => [file, sources[i]] as const))('%s', (file, source) => {
  test('reads as the bulletin it is, without a warning, and equals what was written', () => {
    const { format, advisory, warnings } = read(file);
    expect(format).toBe('bulletin');
    expect(advisory).toEqual(source);
    expect(warnings).toEqual([]);
  });

  test('points at 12 to 120 hours from the synoptic hour before issue, as the public product has them', () => {
    expect(leads(source)).toEqual([0, ...[12, 24, 36, 48, 60, 72, 96, 120].map((lead) => lead - 3)]);
  });

  test('radii of 34 and 50 kt to 72 h and of 64 kt to 48 h, wherever the wind reaches them', () => {
    source.points.forEach(({ maxWindKt, radiiNm = {} }, k) => {
      const lead = k === 0 ? 0 : leads(source)[k] + 3;
      expect('34' in radiiNm).toBe(maxWindKt >= 34 && lead <= 72);
      expect('50' in radiiNm).toBe(maxWindKt >= 50 && lead <= 72);
      expect('64' in radiiNm).toBe(maxWindKt >= 64 && lead <= 48);
    });
  });

  test('a stronger wind reaches less far, in every quadrant', () => {
    for (const { radiiNm } of source.points) {
      for (const side of ['ne', 'se', 'sw', 'nw'] as const) {
        if (radiiNm?.['50']) expect(radiiNm['50'][side]).toBeLessThan(radiiNm['34']![side]);
        if (radiiNm?.['64']) expect(radiiNm['64'][side]).toBeLessThan(radiiNm['50']![side]);
      }
    }
  });

  test('ends as an extratropical storm', () => {
    expect(source.points[source.points.length - 1].stage).toBe('post-tropical');
  });
});

test('advisories come six hours apart, at 0300, 0900, 1500 and 2100 UTC', () => {
  sources.forEach(({ issuedAt, nextDueAt }, i) => {
    expect([3, 9, 15, 21]).toContain(new Date(issuedAt).getUTCHours());
    if (i > 0) expect(issuedAt).toBe(sources[i - 1].nextDueAt);
    expect(hour(nextDueAt!) - hour(issuedAt)).toBe(6);
  });
});

describe('the storm of the story', () => {
  const analysed = sources.map(({ points }) => points[0]);

  test('is a tropical storm at first and a hurricane of 105 kt when it comes ashore', () => {
    expect(analysed[0].maxWindKt).toBe(55);
    expect(analysed[7].maxWindKt).toBe(105);
  });

  test('moves between 8 and 16 kt, which storms of these latitudes do (common practice, no source)', () => {
    for (let i = 1; i < 8; i++) {
      const speedKt = kmToNmi(distanceKm(analysed[i - 1].lat, analysed[i - 1].lon, analysed[i].lat, analysed[i].lon)) / 6;
      expect(speedKt).toBeGreaterThan(8);
      expect(speedKt).toBeLessThan(16);
    }
  });

  test('is forecast with errors within what official forecasts have: none beyond 2.7 times the mean (US National Hurricane Center, Atlantic 2015-2019)', () => {
    const meanNmi: [number, number][] = [[12, 24.1], [24, 36.9], [36, 49.6], [48, 65.1]];
    const at = (advisory: Advisory, when: number): { lat: number; lon: number } | null => {
      const { points } = advisory;
      const k = points.findIndex(({ validAt }) => hour(validAt) >= when);
      if (k <= 0) return null;
      const f = (when - hour(points[k - 1].validAt)) / (hour(points[k].validAt) - hour(points[k - 1].validAt));
      return { lat: points[k - 1].lat + f * (points[k].lat - points[k - 1].lat), lon: points[k - 1].lon + f * (points[k].lon - points[k - 1].lon) };
    };
    let compared = 0;
    sources.forEach((advisory, i) => {
      for (const [lead, mean] of meanNmi) {
        const later = sources[i + lead / 6];
        if (!later) continue;
        const forecast = at(advisory, hour(later.issuedAt))!;
        const errorNmi = kmToNmi(distanceKm(forecast.lat, forecast.lon, later.points[0].lat, later.points[0].lon));
        expect(errorNmi, `advisory ${i + 1}, ${lead} h`).toBeLessThan(2.7 * mean);
        compared++;
      }
    });
    expect(compared).toBeGreaterThan(10);
  });
});
