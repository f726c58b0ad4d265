import type { Impact } from '../../../lib/impact';
import type { StoredAdvisory } from '../../../lib/wire';
import type { EventRecord } from '../../store';

export interface Exported {
  event: EventRecord;
  impact: Impact;
  advisory: StoredAdvisory;
  /** The event's clock when the file is made. */
  now: string;
  version: string;
}

/** Said on every board, export and print. */
const CAUTION = 'Planning aid. Official forecasts and warnings and local authorities come first. Water kills more people than wind: wind alone never says that a place is safe.';

const hours = (ms: number): string => `${(ms / 3_600_000).toFixed(1)} h`;

/** What every export says about itself, a line each. No commas: a spreadsheet would part the line. */
export function headingOf({ event, impact, advisory, now, version }: Exported): string[] {
  const { storm, number, centre, issuedAt } = advisory;
  return [
    ...(event.exercise ? ['EXERCISE EXERCISE EXERCISE: not a real storm'] : []),
    CAUTION,
    `Event: ${event.name}`,
    `Storm: ${storm.name}${storm.id ? ` (${storm.id})` : ''}. Advisory ${number} of ${centre} issued at ${issuedAt}`,
    `Made at ${now} by the clock of the event: ${hours(Date.parse(now) - Date.parse(issuedAt))} after the advisory was issued`,
    `Revision ${impact.revision}: ${impact.stage === 'members' ? `${impact.members} members` : 'forecast track only (members not computed yet)'}. Computed at ${impact.computedAt}`,
    "Winds: 1-minute sustained knots at 10 m over the place's own surface. Times: UTC. Empty: does not come or not known or not computed",
    `Leeboard ${version}`,
  ];
}

const MOST_NAME_LETTERS = 40;

/** Name of the file, without its ending. A long name of an event is cut, so that the revision never is. */
export const fileStem = ({ event, impact, advisory }: Exported, what: string): string =>
  `${event.exercise ? 'EXERCISE ' : ''}${[...event.name].slice(0, MOST_NAME_LETTERS).join('')} advisory ${advisory.number} revision ${impact.revision} ${what}`.replace(/[^\p{L}\p{N}]+/gu, '-');
