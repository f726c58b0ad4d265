import type { Impact } from '../../lib/impact';
import { THRESHOLD_KEYS } from '../../lib/units';
import type { ThresholdKey } from '../../lib/units';

export interface HeadlineCount {
  threshold: ThresholdKey;
  people: number;
  /** 10 and 90 % of members; null while only the forecast track is computed. */
  range: { low: number; high: number } | null;
  change: number | null;
}

export interface Headline {
  basis: 'track' | 'members';
  members: number;
  counts: HeadlineCount[];
  /** Number of the advisory the changes are measured from, and on what. */
  since: { number: string; basis: 'track' | 'members' } | null;
}

/** The three counts. A range is shown only where members made one; a change only on the same basis as the count. */
export function headline(impact: Impact): Headline {
  const members = impact.stage === 'members';
  const change = impact.change && impact.change.basis === impact.stage ? impact.change : null;
  const counts = THRESHOLD_KEYS.map((threshold): HeadlineCount => {
    const spread = impact.totals.peopleAtOrAbove[threshold];
    const ranged = members && spread.p10 !== null && spread.p90 !== null;
    return {
      threshold,
      people: members && spread.mean !== null ? spread.mean : spread.track,
      range: ranged ? { low: spread.p10!, high: spread.p90! } : null,
      change: change ? change.people[threshold] : null,
    };
  });
  return { basis: members ? 'members' : 'track', members: impact.members, counts, since: change && { number: change.sinceNumber, basis: change.basis } };
}
