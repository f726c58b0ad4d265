import { byThreshold } from '../units';
import type { ByThreshold, ThresholdKey } from '../units';
import type { Change, ClassRow, Impact, Spread, Totals, ZoneChange, ZoneRow } from './model';

/** What an impact is compared with: the impact of the advisory before, at the same stage, and that advisory's number. */
export interface Earlier {
  impact: Pick<Impact, 'advisoryId' | 'stage' | 'totals' | 'zones' | 'classes'>;
  number: string;
}

type Compared = { totals: Totals; zones: ZoneRow[]; classes: ClassRow[] };

const HOUR_MS = 3_600_000;

/** The value a change is measured on: the mean of the members when both sides have it, else the forecast track. */
const valueOf = (spread: Spread, basis: Change['basis']): number => (basis === 'members' ? (spread.mean ?? spread.track) : spread.track);

const spreadChange = (now: ByThreshold<Spread>, before: ByThreshold<Spread>, basis: Change['basis']): ByThreshold<number> =>
  byThreshold((_, kt) => valueOf(now[`${kt}`], basis) - valueOf(before[`${kt}`], basis));

/** Fills in the change columns; rows that the earlier impact did not have keep null. */
export function withChange<T extends Compared>(current: T, stage: Impact['stage'], earlier: Earlier | null): T & { change: Change | null } {
  if (!earlier) return { ...current, change: null };
  const basis = stage === 'members' && earlier.impact.stage === 'members' ? 'members' : 'track';
  const zonesBefore = new Map(earlier.impact.zones.map((zone) => [zone.id, zone]));
  const classesBefore = new Map(earlier.impact.classes.map((row) => [row.class, row]));
  return {
    ...current,
    zones: current.zones.map((zone) => ({ ...zone, change: zoneChange(zone, zonesBefore.get(zone.id), basis) })),
    classes: current.classes.map((row) => {
      const before = classesBefore.get(row.class);
      return { ...row, change: before ? spreadChange(row.atOrAbove, before.atOrAbove, basis) : null };
    }),
    change: {
      sinceAdvisoryId: earlier.impact.advisoryId,
      sinceNumber: earlier.number,
      basis,
      people: spreadChange(current.totals.peopleAtOrAbove, earlier.impact.totals.peopleAtOrAbove, basis),
      assets: spreadChange(current.totals.assetsAtOrAbove, earlier.impact.totals.assetsAtOrAbove, basis),
    },
  };
}

function zoneChange(now: ZoneRow, before: ZoneRow | undefined, basis: Change['basis']): ZoneChange | null {
  if (!before) return null;
  const difference = (a: number | null, b: number | null): number | null => (a === null || b === null ? null : round2(a - b));
  const hours = (a: string | null, b: string | null): number | null => (a === null || b === null ? null : round2((Date.parse(a) - Date.parse(b)) / HOUR_MS));
  const moment = basis === 'members' ? 'median' : 'track';
  const each = <T>(of: (key: ThresholdKey) => T): ByThreshold<T> => byThreshold((_, kt) => of(`${kt}`));
  return {
    maxWindKt: difference(now.maxWindKt, before.maxWindKt),
    people: spreadChange(now.peopleAtOrAbove, before.peopleAtOrAbove, basis),
    chance: each((key) => difference(now.chance[key], before.chance[key])),
    arrivalHours: each((key) => hours(now.arrival[key][moment], before.arrival[key][moment])),
  };
}

const round2 = (value: number): number => Math.round(value * 100) / 100;
