import type { Advisory, Point } from '../../../lib/advisory';
import { makeTrack } from '../../../lib/track';
import type { Track } from '../../../lib/track';

const HOUR_MS = 3_600_000;

/** Issue time of the first advisory; hours of the story count from here. */
const START_MS = Date.UTC(2031, 8, 18, 9);

export const instantAt = (hours: number): string => `${new Date(START_MS + hours * HOUR_MS).toISOString().slice(0, 19)}Z`;

/** What the storm in the end does: `[hour, lat, lon, wind kt]`. It comes ashore by the mouth of the Ansel at hour 42. */
const WAY: readonly (readonly [number, number, number, number])[] = [
  [-6, 19.5, -40.4, 45],
  [0, 19.8, -41.7, 55],
  [6, 20.2, -43.0, 65],
  [12, 20.7, -44.2, 75],
  [18, 21.3, -45.3, 85],
  [24, 22.0, -46.3, 95],
  [30, 22.8, -47.2, 100],
  [36, 23.7, -47.9, 105],
  [42, 24.6, -48.4, 105],
  [48, 25.6, -48.6, 85],
  [54, 26.7, -48.6, 75],
  [60, 27.9, -48.2, 70],
  [66, 29.2, -47.3, 65],
  [72, 30.7, -45.9, 60],
  [84, 34.0, -41.8, 55],
  [96, 37.6, -36.0, 50],
  [108, 41.2, -28.8, 50],
  [132, 47.0, -13.0, 45],
  [168, 55.0, 8.0, 35],
];

/** The true storm as a track, leads counted from the first advisory. */
export const truth = (): Track => makeTrack(advisoryOf(WAY.map(([hour, lat, lon, maxWindKt]): Point => ({ validAt: instantAt(hour), lat, lon, maxWindKt }))));

const advisoryOf = (points: Point[]): Advisory => ({ storm: { name: 'Quillon' }, number: '0', centre: 'Analysis', issuedAt: instantAt(0), averaging: '1-min', points });
