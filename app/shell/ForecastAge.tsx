import { formatAge } from '../../lib/units';
import type { StoredAdvisory } from '../../lib/wire';
import type { Formats } from '../prefs/format';
import { words } from '../words';
import styles from './Header.module.css';

/** Which forecast this is, how old, and when the next is due: all on the event's clock. */
export function ForecastAge({ advisory, nowMs, formats }: { advisory: StoredAdvisory | null; nowMs: number | null; formats: Formats }) {
  if (!advisory) return <p className={styles.fact}>{words.header.noAdvisory}</p>;
  const hoursSince = (at: string): number | null => (nowMs === null ? null : (nowMs - Date.parse(at)) / 3_600_000);
  const age = hoursSince(advisory.issuedAt);
  const late = advisory.nextDueAt ? hoursSince(advisory.nextDueAt) : null;
  const ageWords = age === null ? '' : age < -1 / 60 ? words.header.ahead(formatAge(-age)) : words.header.ago(formatAge(age));
  return (
    <>
      <p className={styles.fact} title={advisory.centre}>
        <strong>{words.header.advisory(advisory.number)}</strong>
        <span>{words.header.issued(formats.clock(advisory.issuedAt), formats.utc(advisory.issuedAt), ageWords)}</span>
      </p>
      <p className={styles.fact} data-late={late !== null && late > 0}>
        <strong>{advisory.nextDueAt ? words.header.nextDue(formats.clock(advisory.nextDueAt)) : words.header.noNextDue}</strong>
        <span>{late === null ? words.header.settled : late > 0 ? words.header.dueLate(formatAge(late)) : words.header.dueIn(formatAge(-late))}</span>
      </p>
    </>
  );
}
