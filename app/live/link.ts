/** The state of the line to the server, with the moment (ms on this machine) it came about. */
export type Link =
  | { state: 'connecting'; sinceMs: number }
  | { state: 'live'; sinceMs: number }
  | { state: 'reconnecting'; sinceMs: number }
  | { state: 'refused'; sinceMs: number; code: string; message: string };

/** After this long without a line the figures on the screen may have been overtaken. */
export const STALE_AFTER_MS = 30_000;

export interface LinkStatus {
  state: 'connecting' | 'live' | 'reconnecting' | 'stale' | 'refused';
  sinceMs: number;
}

/**
 * What the screen says of its line: a short break is "reconnecting", a long one "stale since". The server tells its clock every
 * ten seconds (last heard at `heardMs`): a line that is silent for long is stale, whatever the socket says.
 */
export function linkStatus(link: Link, heardMs: number | null, nowMs: number): LinkStatus {
  if (link.state === 'live' && heardMs !== null && nowMs - Math.max(heardMs, link.sinceMs) >= STALE_AFTER_MS) return { state: 'stale', sinceMs: heardMs };
  const long = nowMs - link.sinceMs >= STALE_AFTER_MS;
  if (long && (link.state === 'reconnecting' || link.state === 'connecting')) return { state: 'stale', sinceMs: link.sinceMs };
  return { state: link.state, sinceMs: link.sinceMs };
}
