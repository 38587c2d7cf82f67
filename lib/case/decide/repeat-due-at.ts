import type { Nerve } from '@/lib/alert/nerve-plan';
import type { CaseState } from '@/lib/case/case-state';
import type { AbnormalRun } from '@/lib/case/decide/abnormal-of';
import { momentOfMs } from '@/lib/units/moment-of-ms';
import { msOfMoment } from '@/lib/units/ms-of-moment';

/**
 * Until when a notice waits for its repeat before it becomes an alert marked "not repeated".
 * @returns a moment; null for a finding that is a notice at most, and for a control nerve
 * @source custom: 30 s for a lost response, else 90 s
 */
export function repeatDueAt(state: CaseState, nerve: Nerve, abnormal: AbnormalRun): string | null {
  if (!abnormal.mayBecomeAlert || nerve.role === 'control') return null;
  const { repeatLostWithinSeconds, repeatWithinSeconds } = state.plan.rules;
  const seconds = abnormal.finding === 'response-lost' ? repeatLostWithinSeconds : repeatWithinSeconds;
  return momentOfMs(msOfMoment(abnormal.at) + seconds * 1000);
}
