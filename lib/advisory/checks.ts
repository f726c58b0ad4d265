import { issueChecks } from './checks/issue';
import { trackChecks } from './checks/track';
import { windChecks } from './checks/wind';
import type { Advisory, Warning } from './model';

/** What an advisory can be held against besides itself: the event's clock, and the advisory before. */
export interface CheckContext {
  nowMs?: number;
  previous?: Advisory;
}

/**
 * What to look at before an advisory is issued; nothing here stops one. Every warning has a stable code
 * and the path of the value it is about, such as `points[3].maxWindKt`.
 */
export const checkAdvisory = (advisory: Advisory, context: CheckContext = {}): Warning[] => [...trackChecks(advisory, context), ...windChecks(advisory), ...issueChecks(advisory, context)];
