import type { CaseCommand } from '@/lib/case/commands';
import type { CaseState } from '@/lib/case/case-state';
import { isRepeatOverdue } from '@/lib/case/is-repeat-overdue';
import { momentOfMs } from '@/lib/units/moment-of-ms';

/** A command of time, with an id derived from its fact: many processes that see it act once. */
export interface DueTimer {
  readonly commandId: string;
  readonly eventAt: string;
  readonly command: CaseCommand;
}

/**
 * What has come due in a case: notices whose repeat did not come.
 * @param state the case
 * @param nowMs ms since 1970
 * @returns commands to give now, empty when nothing is due
 * @source custom: repeat within 30 s for a lost response, else 90 s
 * @accuracy exact to 1 ms; tests/lib/case/due-timers.test.ts
 * @example
 * dueTimers(state, nowMs).map((timer) => timer.commandId) // => ['repeat/ulnar-1/31']
 */
export function dueTimers(state: CaseState, nowMs: number): readonly DueTimer[] {
  if (state.status !== 'open') return [];
  return Object.values(state.incidents)
    .filter((incident) => isRepeatOverdue(state, incident, nowMs))
    .map((incident) => ({
      commandId: `repeat/${incident.alertId}/${incident.firstSeq}`,
      eventAt: momentOfMs(nowMs),
      command: { name: 'miss-repeat', alertId: incident.alertId },
    }));
}
