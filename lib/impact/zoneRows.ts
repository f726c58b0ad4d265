import { milli } from '../exposure';
import type { Exposure } from '../exposure';
import { LEAST_CHANCE_FOR_TIMES, QUANTILES, sortedQuantile } from '../hazard';
import type { PlaceHazard } from '../hazard';
import { byThreshold } from '../units';
import { gustKt } from './gust';
import type { MemberSummary } from './members';
import type { Moments, ZoneRow } from './model';
import { instantAt } from './moments';
import { spreadOver, trackOnly } from './spread';

const HOUR_MS = 3_600_000;

/** A zone that fewer members reach is not given a time to start: common practice plans for a chance of one in ten (no source). */
const LEAST_CHANCE_TO_ACT = 0.1;

/**
 * One row a zone. A zone takes the strongest wind and the first arrival among the places in it where people live: the first
 * street to be hit sets the clock. Start-by is the early arrival of 34 kt (that of the track while members are not computed) less the
 * hours the zone takes to clear; none where fewer than one member in ten brings 34 kt.
 */
export function zoneRows(exposure: Exposure, hazard: PlaceHazard, members: MemberSummary | null, issuedAtMs: number, nowMs: number): ZoneRow[] {
  const tracks = zoneTracks(exposure, hazard);
  return exposure.zones.map((zone, z): ZoneRow => {
    const at = (t: number): number => z * 3 + t;
    const moments = (t: number, track: Float64Array, values: Float32Array | undefined): Moments =>
      zoneMoments(issuedAtMs, track[at(t)], members && values ? values.subarray(at(t) * members.members, (at(t) + 1) * members.members) : null);
    const arrival = byThreshold((t) => moments(t, tracks.arrival, members?.zoneArrival));
    const reached = members ? countFinite(members.zoneArrival, at(0) * members.members, members.members) / members.members : 1;
    const first = reached < LEAST_CHANCE_TO_ACT ? null : (arrival['34'].early ?? arrival['34'].track);
    const startByMs = first !== null && zone.clearanceHours !== null ? Date.parse(first) - zone.clearanceHours * HOUR_MS : null;
    return {
      id: zone.id,
      name: zone.name,
      people: Math.round(zone.people),
      maxWindKt: round1(tracks.peakKt[z]),
      gustKt: round1(tracks.gustKt[z]),
      rainMm: null,
      chance: byThreshold((t) => (members ? countFinite(members.zoneArrival, at(t) * members.members, members.members) / members.members : null)),
      peopleAtOrAbove: byThreshold((t) => {
        const track = Math.round(tracks.milliPeople[at(t)] / 1000);
        return members ? spreadOver(track, members.zoneMilliPeople, at(t) * members.members, members.members, 1000) : trackOnly(track);
      }),
      arrival,
      end: byThreshold((t) => moments(t, tracks.end, members?.zoneEnd)),
      clearanceHours: zone.clearanceHours,
      startBy: startByMs === null ? null : instantAt(startByMs, 0),
      slackHours: startByMs === null ? null : Math.round(((startByMs - nowMs) / HOUR_MS) * 100) / 100,
      change: null,
    };
  });
}

interface ZoneTracks {
  peakKt: Float64Array;
  gustKt: Float64Array;
  arrival: Float64Array;
  end: Float64Array;
  milliPeople: Float64Array;
}

function zoneTracks({ zones, places }: Exposure, hazard: PlaceHazard): ZoneTracks {
  const tracks: ZoneTracks = {
    peakKt: new Float64Array(zones.length),
    gustKt: new Float64Array(zones.length),
    arrival: new Float64Array(zones.length * 3).fill(Infinity),
    end: new Float64Array(zones.length * 3).fill(-Infinity),
    milliPeople: new Float64Array(zones.length * 3),
  };
  for (let i = 0; i < places.count; i++) {
    const z = places.zone[i];
    if (z < 0) continue;
    tracks.peakKt[z] = Math.max(tracks.peakKt[z], hazard.peakKt[i]);
    tracks.gustKt[z] = Math.max(tracks.gustKt[z], gustKt(hazard.peakKt[i], places.surface[i]));
    for (let t = 0; t < 3; t++) {
      const p = i * 3 + t;
      if (Number.isNaN(hazard.arrival[p])) break;
      const at = z * 3 + t;
      tracks.arrival[at] = Math.min(tracks.arrival[at], hazard.arrival[p]);
      tracks.end[at] = Math.max(tracks.end[at], hazard.end[p]);
      tracks.milliPeople[at] += milli(places.people[i]);
    }
  }
  return tracks;
}

/** Early, median and late over the members that reach the zone; none where fewer than one in twenty do. */
function zoneMoments(issuedAtMs: number, trackLead: number, leads: Float32Array | null): Moments {
  const track = instantAt(issuedAtMs, trackLead);
  const reached = leads?.filter(Number.isFinite).sort();
  if (!leads || !reached || reached.length === 0 || reached.length < LEAST_CHANCE_FOR_TIMES * leads.length) return { track, early: null, median: null, late: null };
  const [early, median, late] = QUANTILES.map((share) => instantAt(issuedAtMs, sortedQuantile(reached, reached.length, share)));
  return { track, early, median, late };
}

function countFinite(values: Float32Array, offset: number, count: number): number {
  let finite = 0;
  for (let i = offset; i < offset + count; i++) if (Number.isFinite(values[i])) finite++;
  return finite;
}

const round1 = (value: number): number => Math.round(value * 10) / 10;
