import type { CheckContext } from '../checks';
import type { Advisory, Warning } from '../model';

const HOUR_MS = 3_600_000;
/** The analysed position is taken at or up to a few hours before issue. */
const OLDEST_POSITION_HOURS = 12;

/** When the advisory was issued, and whether it follows on from the one before. */
export function issueChecks(advisory: Advisory, { nowMs, previous }: CheckContext): Warning[] {
  const warnings: Warning[] = [];
  const issuedMs = Date.parse(advisory.issuedAt);
  if (nowMs !== undefined && issuedMs > nowMs) warnings.push({ code: 'issued-in-future', path: 'issuedAt', message: `issued at ${advisory.issuedAt}, which is still to come by the event's clock` });
  if (advisory.nextDueAt !== undefined && Date.parse(advisory.nextDueAt) <= issuedMs) warnings.push({ code: 'next-due-past', path: 'nextDueAt', message: `the next advisory is due at ${advisory.nextDueAt}, not after this one was issued` });

  const { storm, number, centre } = advisory;
  for (const [path, text] of Object.entries({ 'storm.name': storm.name, number, centre })) {
    if (/[<>]/.test(text)) warnings.push({ code: 'markup-in-name', path, message: `"${text}" holds marks of a web page (< or >): it is kept and shown as it is; was it copied from a page?` });
  }

  const leadHours = (Date.parse(advisory.points[0]!.validAt) - issuedMs) / HOUR_MS;
  if (leadHours > 0) warnings.push({ code: 'no-position-at-issue', path: 'points[0]', message: `the first position is ${round1(leadHours)} h after issue: none is given at or before it` });
  if (leadHours < -OLDEST_POSITION_HOURS) warnings.push({ code: 'old-position', path: 'points[0]', message: `the first position is ${round1(-leadHours)} h older than the issue time` });

  return previous === undefined ? warnings : [...warnings, ...sequence(advisory, previous)];
}

function sequence(advisory: Advisory, previous: Advisory): Warning[] {
  const warnings: Warning[] = [];
  if (Date.parse(advisory.issuedAt) < Date.parse(previous.issuedAt)) warnings.push({ code: 'older-than-previous', path: 'issuedAt', message: `issued at ${advisory.issuedAt}, before advisory ${previous.number} of ${previous.issuedAt}, which is already in` });
  const { id, name } = advisory.storm;
  const other = previous.storm;
  if (id !== undefined && other.id !== undefined) {
    // With one identifier a new name is the same storm, now named.
    if (id.toUpperCase() !== other.id.toUpperCase()) warnings.push({ code: 'storm-differs', path: 'storm.id', message: `storm ${id} (${name}), but the advisory before was for ${other.id} (${other.name})` });
  } else if (name.toUpperCase() !== other.name.toUpperCase()) {
    warnings.push({ code: 'storm-differs', path: 'storm.name', message: `storm ${name}, but the advisory before was for ${other.name}` });
  }
  return warnings;
}

const round1 = (value: number): number => Math.round(value * 10) / 10;
