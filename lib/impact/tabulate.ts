import { milli } from '../exposure';
import type { Exposure } from '../exposure';
import type { PlaceHazard } from '../hazard';
import { byThreshold, THRESHOLDS_KT } from '../units';
import { assetTable } from './assetTable';
import type { AssetTable } from './assetTable';
import { withChange } from './change';
import type { Earlier } from './change';
import type { MemberSummary } from './members';
import type { ClassRow, Impact, Spread, Totals, ZoneRow } from './model';
import { spreadOver, trackOnly } from './spread';
import { zoneRows } from './zoneRows';

/** What a run knows besides its numbers. */
export interface RunParticulars {
  eventId: string;
  advisoryId: string;
  issuedAtMs: number;
  /** The event's clock when the run was made. */
  nowMs: number;
  seed: number;
  /** The wall clock when the run was made. */
  computedAt: string;
}

/** Joins hazard to exposure. Without members every range is null and the stage is `track`. */
export function tabulate(
  run: RunParticulars,
  exposure: Exposure,
  hazard: PlaceHazard,
  members: MemberSummary | null,
  earlier: Earlier | null,
): { impact: Omit<Impact, 'revision'>; assets: AssetTable } {
  const stage = members ? 'members' : 'track';
  const zones = zoneRows(exposure, hazard, members, run.issuedAtMs, run.nowMs);
  const assets = assetTable(exposure, hazard, members, run.issuedAtMs);
  const classes = classRows(exposure, assets, members);
  const totals = totalsOf(exposure, hazard, assets, members);
  const compared = withChange({ totals, zones, classes }, stage, earlier);
  return {
    assets,
    impact: {
      eventId: run.eventId,
      advisoryId: run.advisoryId,
      stage,
      members: members?.members ?? 0,
      seed: run.seed,
      computedAt: run.computedAt,
      ...compared,
      evacuation: evacuationOf(compared.zones),
      restoration: null,
      claims: null,
    },
  };
}

function totalsOf(exposure: Exposure, hazard: PlaceHazard, assets: AssetTable, members: MemberSummary | null): Totals {
  const { places } = exposure;
  const milliPeople = [0, 0, 0];
  let maxWindKt = 0;
  for (let i = 0; i < places.count; i++) {
    maxWindKt = Math.max(maxWindKt, hazard.peakKt[i]);
    if (places.people[i] === 0) continue;
    for (let t = 0; t < 3 && hazard.peakKt[i] >= THRESHOLDS_KT[t]; t++) milliPeople[t] += milli(places.people[i]);
  }
  const assetsOver = members ? overClasses(members, exposure.classes.length) : null;
  return {
    people: Math.round(exposure.peopleTotal),
    peopleInZones: Math.round(exposure.peopleInZones),
    assets: exposure.assets.count,
    peopleAtOrAbove: byThreshold((t) => {
      const track = Math.round(milliPeople[t] / 1000);
      return members ? spreadOver(track, members.milliPeople, t * members.members, members.members, 1000) : trackOnly(track);
    }),
    assetsAtOrAbove: byThreshold((t) => {
      const track = countAtOrAbove(assets, THRESHOLDS_KT[t]);
      return members && assetsOver ? spreadOver(track, assetsOver, t * members.members, members.members) : trackOnly(track);
    }),
    maxWindKt: Math.round(maxWindKt * 10) / 10,
  };
}

/** Assets reached in each member, over all classes: `[t * members + m]`. */
function overClasses({ classReached, members }: MemberSummary, classes: number): Uint32Array {
  const sums = new Uint32Array(3 * members);
  for (let c = 0; c < classes; c++) for (let i = 0; i < 3 * members; i++) sums[i] += classReached[c * 3 * members + i];
  return sums;
}

function countAtOrAbove({ peakKt }: AssetTable, kt: number): number {
  let count = 0;
  for (let i = 0; i < peakKt.length; i++) if (peakKt[i] >= kt) count++;
  return count;
}

function classRows(exposure: Exposure, assets: AssetTable, members: MemberSummary | null): ClassRow[] {
  const counts = exposure.classes.map(() => [0, 0, 0, 0]);
  for (let a = 0; a < exposure.assets.count; a++) {
    const row = counts[exposure.assets.classIndex[a]];
    row[3]++;
    for (let t = 0; t < 3 && assets.peakKt[a] >= THRESHOLDS_KT[t]; t++) row[t]++;
  }
  return exposure.classes.map((name, c): ClassRow => ({
    class: name,
    count: counts[c][3],
    atOrAbove: byThreshold((t): Spread =>
      members ? spreadOver(counts[c][t], members.classReached, (c * 3 + t) * members.members, members.members) : trackOnly(counts[c][t]),
    ),
    change: null,
  }));
}

function evacuationOf(zones: ZoneRow[]): Impact['evacuation'] {
  const next = zones.filter((zone) => zone.startBy !== null).sort((a, b) => Date.parse(a.startBy!) - Date.parse(b.startBy!))[0];
  return {
    zonesReached: byThreshold((_, kt) => zones.filter((zone) => zone.maxWindKt >= kt).length),
    zonesWithoutClearance: zones.filter((zone) => zone.clearanceHours === null).length,
    nextStartBy: next ? { zoneId: next.id, at: next.startBy! } : null,
  };
}
