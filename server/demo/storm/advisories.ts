import type { Advisory, Point } from '../../../lib/advisory';
import { five, ringsOf } from './rings';
import { instantAt, truthAt } from './truth';

export const STORM = { id: 'LB072031', name: 'Quillon' };
const CENTRE = 'LAMBREY WEATHER SERVICE PORT ANSEL';
const HOURS_APART = 6;
/** Forecast times count from the last synoptic hour, three hours before issue. */
const SYNOPTIC_HOURS = 3;
const LEAD_HOURS = [12, 24, 36, 48, 60, 72, 96, 120];
const EXTRATROPICAL_FROM_LAT = 34;

/**
 * What each advisory gets wrong: `pace` of the forecast storm over the true one, how far west of the truth it is taken and how
 * much too weak it is, both at the lead of landfall and in proportion before.
 *
 * One to three take the storm slowly to the west, four and five bring it to the estuary, stronger and sooner; six slows it.
 */
const ERRORS = [
  { pace: 0.87, westDeg: 1.75, tooWeakKt: 25, pressureHpa: 994 },
  { pace: 0.93, westDeg: 1.85, tooWeakKt: 20, pressureHpa: 988 },
  { pace: 0.985, westDeg: 1.55, tooWeakKt: 15, pressureHpa: 981 },
  { pace: 1.06, westDeg: 0.55, tooWeakKt: 5, pressureHpa: 971 },
  { pace: 1.12, westDeg: 0.05, tooWeakKt: -5, pressureHpa: 961 },
  { pace: 0.86, westDeg: -0.1, tooWeakKt: 0, pressureHpa: 956 },
  { pace: 0.94, westDeg: 0.15, tooWeakKt: 0, pressureHpa: 951, eyeDiameterNm: 25 },
  { pace: 1, westDeg: 0, tooWeakKt: 0, pressureHpa: 950, eyeDiameterNm: 20 },
];
const LANDFALL_HOUR = 42;
/** It stays a storm to the end. */
const LEAST_WIND_KT = 35;

/** The eight advisories of the storm, in order, as a bulletin can carry them. */
export const makeAdvisories = (): Advisory[] => ERRORS.map((_, i) => advisoryOf(i));

function advisoryOf(i: number): Advisory {
  const issued = i * HOURS_APART;
  const { pressureHpa, eyeDiameterNm } = ERRORS[i];
  const now = pointAt(i, issued, 0);
  return {
    storm: STORM,
    number: String(i + 1),
    centre: CENTRE,
    issuedAt: instantAt(issued),
    nextDueAt: instantAt(issued + HOURS_APART),
    averaging: '1-min',
    points: [{ ...now, minPressureHpa: pressureHpa, ...(eyeDiameterNm === undefined ? {} : { eyeDiameterNm }) }, ...LEAD_HOURS.map((lead) => pointAt(i, issued - SYNOPTIC_HOURS + lead, lead))],
  };
}

function pointAt(i: number, hour: number, leadHours: number): Point {
  const issued = i * HOURS_APART;
  const { pace, westDeg, tooWeakKt } = ERRORS[i];
  const after = hour - issued;
  const along = issued + pace * after;
  const storm = truthAt(along);
  const landfallAfter = (LANDFALL_HOUR - issued) / pace;
  const share = landfallAfter > 0 ? Math.min(1.4, after / landfallAfter) : 0;
  const maxWindKt = Math.max(LEAST_WIND_KT, five(storm.maxWindKt - tooWeakKt * Math.min(1, share)));
  const radiiNm = ringsOf(maxWindKt, along, leadHours);
  return {
    validAt: instantAt(hour),
    lat: tenth(storm.lat),
    lon: tenth(storm.lon - westDeg * share),
    maxWindKt,
    gustKt: five(maxWindKt * 1.22),
    ...(Object.keys(radiiNm).length === 0 ? {} : { radiiNm }),
    stage: storm.lat > EXTRATROPICAL_FROM_LAT ? 'post-tropical' : 'tropical',
  };
}

const tenth = (value: number): number => Math.round(value * 10) / 10;
