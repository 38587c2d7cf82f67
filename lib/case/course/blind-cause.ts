import type { Nerve } from '@/lib/alert/nerve-plan';
import { cannotBeJudged } from '@/lib/case/cannot-be-judged';
import type { CaseState } from '@/lib/case/case-state';
import { nerveStatus } from '@/lib/case/nerve-status';

/** Why nothing could be seen of a nerve. */
export type BlindCause =
  | 'cannot-be-judged'
  | 'paused'
  | 'other-phase'
  | 'no-baseline'
  | 'not-compared'
  | 'not-monitorable'
  | 'not-tested-since-step'
  | 'not-tested-in-time';

/** The causes in the order in which the theatre screen names them: where several hold, the first one is counted. */
export const blindCauses: readonly BlindCause[] = [
  'cannot-be-judged', 'paused', 'other-phase', 'no-baseline', 'not-compared', 'not-monitorable', 'not-tested-since-step', 'not-tested-in-time',
];

/**
 * Why nothing can be said of a nerve now.
 *
 * Method: asks what the theatre screen asks (`nerveStatus`, `cannotBeJudged`, the phase). An open notice or alert does
 * not end it: a nerve whose change is known can be untested too.
 *
 * @param state the case
 * @param nerve one of its nerves
 * @param nowMs ms since 1970
 * @returns the first cause that holds; null while every required path is fresh and comparable
 * @source product rule: stable must be earned; freshness custom
 * @accuracy exact; tests/lib/case/course/blind-times.test.ts, second by second by an oracle
 * @example
 * blindCause(state, ulnar, nowMs) // => 'not-tested-since-step'
 */
export function blindCause(state: CaseState, nerve: Nerve, nowMs: number): BlindCause | null {
  if (cannotBeJudged(state) !== null) return 'cannot-be-judged';
  if (state.phase === 'paused') return 'paused';
  if (state.phase !== 'monitoring') return 'other-phase';
  const status = nerveStatus(state, nerve, nowMs);
  if (status.baselineSiteCount < status.siteCount) return 'no-baseline';
  if (status.notCompared !== null) return 'not-compared';
  if (status.isNotMonitorable) return 'not-monitorable';
  if (status.untestedSiteIds.length === 0) return null;
  const step = status.lastRiskStep;
  const isSinceStep = step !== null && (status.oldestComparedAt === null || status.oldestComparedAt <= step.at);
  return isSinceStep ? 'not-tested-since-step' : 'not-tested-in-time';
}
