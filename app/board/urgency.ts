/** Overdue and soon are the only two states that ask for attention. */
export type Urgency = 'overdue' | 'soon' | 'plain';

/** Less than the usual six hours between advisories is left: the next forecast may come too late to decide by. */
export const SOON_HOURS = 6;

export function urgencyOf(slackHours: number | null): Urgency {
  if (slackHours === null) return 'plain';
  if (slackHours < 0) return 'overdue';
  return slackHours < SOON_HOURS ? 'soon' : 'plain';
}
