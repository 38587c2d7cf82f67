import type { CaseState } from '@/lib/case/case-state';
import type { CaseCommand, Refusal } from '@/lib/case/commands';
import { draft } from '@/lib/case/decide/draft';
import type { EntryDraft } from '@/lib/case/entry-bodies';

type LifecycleCommand = CaseCommand & { name: 'open-case' | 'confirm-timeout' | 'change-phase' | 'close-case' };

/** Opening, time-out, phases and closing. @returns drafts or a refusal @source product rule: states and phases of a case */
export function decideLifecycle(state: CaseState, command: LifecycleCommand): readonly EntryDraft[] | Refusal {
  switch (command.name) {
    case 'open-case':
      if (state.status === 'open') return { code: 'already-open', message: 'Case already open' };
      return [draft('case.opened', { clockOffsetMs: command.clockOffsetMs })];
    case 'confirm-timeout':
      return confirmTimeout(state, command);
    case 'change-phase':
      return changePhase(state, command);
    case 'close-case':
      return closeCase(state, command);
  }
}

function confirmTimeout(state: CaseState, command: CaseCommand & { name: 'confirm-timeout' }): readonly EntryDraft[] | Refusal {
  if (state.timeoutAt !== null) return { code: 'timeout-done', message: 'Time-out already confirmed' };
  if (command.side !== state.plan.side) {
    return {
      code: 'side-differs',
      message: `Side differs: the time-out says ${command.side}, the plan says ${state.plan.side}. Revise the plan or ask again`,
    };
  }
  return [draft('timeout.confirmed', { side: command.side, text: command.text })];
}

function changePhase(state: CaseState, command: CaseCommand & { name: 'change-phase' }): readonly EntryDraft[] | Refusal {
  if (state.status !== 'open') return { code: 'not-open', message: 'Case not open: open it before a phase begins' };
  if (command.phase === state.phase) return { code: 'same-phase', message: `Phase is ${command.phase} already` };
  if (command.phase === 'paused' && command.reason === null) {
    return { code: 'reason-needed', message: 'Reason missing: say why monitoring is paused, the wall shows it' };
  }
  return [draft('phase.changed', { phase: command.phase, reason: command.reason })];
}

function closeCase(state: CaseState, command: CaseCommand & { name: 'close-case' }): readonly EntryDraft[] | Refusal {
  if (state.status !== 'open') return { code: 'not-open', message: 'Case not open: only an open case can be closed' };
  const open = Object.values(state.incidents).filter((incident) => incident.level === 'alert');
  if (open.length > 0) {
    const list = open.map((incident) => incident.alertId).join(', ');
    return { code: 'alert-open', message: `Alert open: ${list}. End each alert with its outcome before the case is closed` };
  }
  return [draft('case.closed', { text: command.text })];
}
