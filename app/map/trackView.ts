import type { Advisory } from '../../lib/advisory';
import { centreAt, makeTrack } from '../../lib/track';
import { nearestTurn } from './mercator';

export interface TrackPoint {
  id: string;
  lon: number;
  lat: number;
  atMs: number;
  maxWindKt: number;
  /** Lies ahead on the event's clock. */
  ahead: boolean;
}

/** A track ready to draw. Longitudes run on past 180 rather than jump. */
export interface TrackView {
  points: TrackPoint[];
  /** Where the storm has been: earlier first positions, then the forecast up to now. */
  past: [number, number][];
  ahead: [number, number][];
  /** The centre now; null before the first and after the last point. */
  now: [number, number] | null;
}

const HOUR_MS = 3_600_000;

/** The smooth way between the points, hour by hour. `earlier` are the advisories before this one, oldest first. */
export function trackView(advisory: Advisory, earlier: readonly Advisory[], nowMs: number): TrackView {
  const track = makeTrack(advisory);
  const from = track.issuedAtMs + track.startLeadHours * HOUR_MS;
  const to = track.issuedAtMs + track.endLeadHours * HOUR_MS;
  const place = (ms: number): [number, number] | null => {
    const centre = centreAt(track, (ms - track.issuedAtMs) / HOUR_MS);
    return centre && [centre.lon, centre.lat];
  };
  const times = new Set<number>([from, to, ...advisory.points.map((point) => Date.parse(point.validAt))]);
  for (let ms = from; ms <= to; ms += HOUR_MS) times.add(ms);
  if (nowMs > from && nowMs < to) times.add(nowMs);
  const way = [...times].sort((a, b) => a - b).map((ms) => ({ ms, at: place(ms) }));
  const now = place(nowMs);
  const before = earlier.map((one) => one.points[0]).filter((point) => Date.parse(point.validAt) < from);
  const past = [...before.map((point): [number, number] => [point.lon, point.lat]), ...way.filter(({ ms }) => ms <= nowMs).map(({ at }) => at!)];
  return {
    points: advisory.points.map((point) => ({ id: point.validAt, lon: point.lon, lat: point.lat, atMs: Date.parse(point.validAt), maxWindKt: point.maxWindKt, ahead: Date.parse(point.validAt) > nowMs })),
    past: runOn(past),
    ahead: runOn(way.filter(({ ms }) => ms >= nowMs).map(({ at }) => at!)),
    now,
  };
}

/** The same places with each longitude on the turn nearest to the one before. */
function runOn(places: [number, number][]): [number, number][] {
  let near = places[0]?.[0] ?? 0;
  return places.map(([lon, lat]) => {
    near = nearestTurn(lon, near);
    return [near, lat];
  });
}
