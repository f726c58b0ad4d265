'use client';
import { useEffect } from 'react';
import { useHold, useLive } from '../live/EventContext';
import { formatCompactCount } from '../../lib/units';
import { words } from '../words';

/** Says each new revision once to those who listen, and tells the server that this screen shows it. */
export function Announcer() {
  const { live } = useHold();
  const impact = useLive((state) => state.impact);
  const number = useLive((state) => (state.impact ? state.advisories[state.impact.advisoryId]?.number : undefined));
  useEffect(() => {
    if (impact) live.session.seen(impact.revision);
  }, [impact, live]);
  const people = impact?.totals.peopleAtOrAbove['34'];
  return (
    <p className="unseen" role="status" aria-live="polite">
      {impact && number && people ? words.announce(number, impact.revision, formatCompactCount(people.mean ?? people.track)) : ''}
    </p>
  );
}
