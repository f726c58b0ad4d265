import type { ReactNode } from 'react';
import type { Impact } from '../../lib/impact';
import { formatChange, formatCompactCount, formatCount } from '../../lib/units';
import { words } from '../words';
import styles from './Headline.module.css';
import { headline } from './headlineView';

/** Three counts of people, each with its range and what moved. */
export function Headline({ impact, children }: { impact: Impact | null; children: ReactNode }) {
  const view = impact && headline(impact);
  return (
    <section className={styles.headline} aria-label={words.headline.title}>
      <div className={styles.top}>
        {view ? <h2 className={styles.title}>{words.headline.title}</h2> : <p className="dim">{words.headline.empty}</p>}
        {children}
      </div>
      {view && (
        <>
          <dl className={styles.counts}>
            {view.counts.map((count) => (
              <div key={count.threshold} className={styles.count} data-band={count.threshold}>
                <dt>{words.headline.orMore(`${count.threshold} kt`)}</dt>
                <dd className={styles.figure}>
                  <strong>{formatCompactCount(count.people)}</strong>
                  {count.change !== null && <span className={styles.change}>{formatChange(rounded(count.change))}</span>}
                </dd>
                <dd className={styles.range}>{count.range ? words.headline.range(formatCompactCount(count.range.low), formatCompactCount(count.range.high)) : '\u00a0'}</dd>
              </div>
            ))}
          </dl>
          <p className={styles.note}>
            {view.basis === 'members' ? words.headline.members(formatCount(view.members)) : words.headline.track}{' '}
            {view.since ? words.headline.change(view.since.number) : impact.change ? words.headline.otherBasis(impact.change.sinceNumber) : words.headline.noChange}
          </p>
        </>
      )}
    </section>
  );
}

/** A change is not surer than the counts it comes from: three figures. */
const rounded = (change: number): number => (Math.abs(change) < 1000 ? Math.round(change) : Number(change.toPrecision(3)));
