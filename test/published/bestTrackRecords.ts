import { readFileSync } from 'node:fs';
import type { Advisory } from '../../lib/advisory';
import { THRESHOLD_KEYS } from '../../lib/units';

/** A six-hourly best-track record; radii by threshold and quadrant and the radius of maximum wind in nmi, null where not recorded. */
export interface BestTrackRecord {
  atMs: number;
  lat: number;
  lon: number;
  maxWindKt: number;
  stage: string;
  radiiNm: number[][] | null;
  radiusMaxWindNm: number | null;
}

const HOUR_MS = 3_600_000;
const degrees = (text: string): number => Number.parseFloat(text) * (/[SW]$/.test(text) ? -1 : 1);

/** The storms of test/fixtures/best-track, records at 00, 06, 12 and 18 UTC. */
export function bestTracks(): BestTrackRecord[][] {
  const text = readFileSync(new URL('../fixtures/best-track/atlantic-2021-2022.txt', import.meta.url), 'utf8');
  const storms: BestTrackRecord[][] = [];
  for (const line of text.trim().split('\n')) {
    const fields = line.split(',').map((field) => field.trim());
    if (/^[A-Z]{2}\d{6}$/.test(fields[0])) {
      storms.push([]);
      continue;
    }
    const [date, time, , stage, lat, lon, wind] = fields;
    if (Number(time) % 600 !== 0) continue;
    const radii = [0, 1, 2].map((t) => fields.slice(8 + 4 * t, 12 + 4 * t).map(Number));
    const radiusMaxWind = Number(fields[20]);
    storms[storms.length - 1].push({
      atMs: Date.UTC(Number(date.slice(0, 4)), Number(date.slice(4, 6)) - 1, Number(date.slice(6)), Number(time) / 100),
      lat: degrees(lat),
      lon: degrees(lon),
      maxWindKt: Number(wind),
      stage,
      radiiNm: radii.flat().every((nmi) => nmi >= 0) ? radii : null,
      radiusMaxWindNm: radiusMaxWind > 0 ? radiusMaxWind : null,
    });
  }
  return storms;
}

export const isTropical = ({ stage }: BestTrackRecord): boolean => ['TD', 'TS', 'HU'].includes(stage);

/** Records as an advisory whose points they are; of the radii only the thresholds named. */
export function advisoryFrom(records: BestTrackRecord[], thresholds: readonly string[] = THRESHOLD_KEYS): Advisory {
  const iso = (ms: number): string => `${new Date(ms).toISOString().slice(0, 19)}Z`;
  return {
    storm: { name: 'Best track' },
    number: '1',
    centre: 'US National Hurricane Center',
    issuedAt: iso(records[0].atMs),
    averaging: '1-min',
    points: records.map(({ atMs, lat, lon, maxWindKt, radiiNm }) => ({
      validAt: iso(atMs),
      lat,
      lon,
      maxWindKt,
      ...(radiiNm
        ? { radiiNm: Object.fromEntries(THRESHOLD_KEYS.flatMap((key, t) => (thresholds.includes(key) ? [[key, { ne: radiiNm[t][0], se: radiiNm[t][1], sw: radiiNm[t][2], nw: radiiNm[t][3] }]] : []))) }
        : {}),
    })),
  };
}

export const leadOf = (record: BestTrackRecord, first: BestTrackRecord): number => (record.atMs - first.atMs) / HOUR_MS;
