import type { CaseState, Incident } from '@/lib/case/case-state';
import { isReturnUnproven } from '@/lib/case/is-return-unproven';
import { msOfMoment } from '@/lib/units/ms-of-moment';

/**
 * Whether a notice waited for its repeat in vain.
 *
 * Method: a late entry whose newer runs are inside the limit was repeated, so "not repeated" would be untrue. It stays a
 * notice until its path is tested once more.
 *
 * @param state the case
 * @param incident an open notice or alert
 * @param nowMs ms since 1970
 * @returns true from the due millisecond on
 * @source custom: repeat within 30 s for a lost response, else 90 s
 * @accuracy exact to 1 ms; tests/lib/case/due-timers.test.ts
 * @example
 * isRepeatOverdue(state, incident, nowMs) // => false
 */
export function isRepeatOverdue(state: CaseState, incident: Incident, nowMs: number): boolean {
  if (incident.level !== 'notice' || incident.repeatDueAt === null) return false;
  return nowMs >= msOfMoment(incident.repeatDueAt) && !isReturnUnproven(state, incident);
}
