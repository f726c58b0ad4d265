import { words } from '../words';
import styles from './Slack.module.css';
import type { ZoneView } from './zoneView';

/** The time left, in one of three states. Overdue carries a triangle and a word, soon a word: never the colour alone. */
export function Slack({ zone, text }: { zone: ZoneView; text: string }) {
  if (zone.slackHours === null) return <span className={styles.none}>{zone.reached && zone.clearanceHours === null ? words.zones.noClearance : zone.reached ? text : words.zones.notReached}</span>;
  return (
    <span className={styles.slack} data-urgency={zone.urgency}>
      {zone.urgency === 'overdue' && (
        <span className={styles.mark} aria-hidden="true">
          ▲
        </span>
      )}
      {zone.urgency !== 'plain' && <span className="unseen">{words.zones[zone.urgency]} </span>}
      {text}
    </span>
  );
}
