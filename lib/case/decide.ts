import type { CaseCommand, Refusal } from '@/lib/case/commands';
import type { CaseState } from '@/lib/case/case-state';
import type { DecideContext } from '@/lib/case/decide/decide-context';
import { decideAlert } from '@/lib/case/decide/decide-alert';
import { decideBaselineConfirmation } from '@/lib/case/decide/decide-baseline-confirmation';
import { decideBaseline } from '@/lib/case/decide/decide-baseline';
import { decideCorrection } from '@/lib/case/decide/decide-correction';
import { decideDistances } from '@/lib/case/decide/decide-distances';
import { decideLifecycle } from '@/lib/case/decide/decide-lifecycle';
import { decidePlan } from '@/lib/case/decide/decide-plan';
import { decideRun } from '@/lib/case/decide/decide-run';
import { decideStep } from '@/lib/case/decide/decide-step';
import { decideTalk } from '@/lib/case/decide/decide-talk';
import { draft } from '@/lib/case/decide/draft';
import type { EntryDraft } from '@/lib/case/entry-bodies';

/** Entries to commit, or a refusal that changes nothing. */
export type Decision =
  | { readonly kind: 'accepted'; readonly drafts: readonly EntryDraft[] }
  | { readonly kind: 'refused'; readonly refusal: Refusal };

/**
 * What a command does to a case.
 *
 * Method: pure; the same in server and browser. Everything that is computed is rounded once here and written into
 * the entries. A well-formed run is never refused for the case's state; it is logged and judged "not compared" with
 * its reason. A closed case takes late runs and the handling of what they show, and nothing else.
 *
 * @param state the case before the command; not modified
 * @param command what is asked
 * @param context event time (RFC 3339 UTC), arrival in ms since 1970, role of the author
 * @returns drafts in the order of commit, or a refusal with a sentence
 * @source product rules; limits custom
 * @accuracy tests/lib/case/decide.test.ts
 * @example
 * decide(state, { name: 'send-message', text: 'Agree' }, { eventAt, nowMs }).kind // => 'accepted'
 */
export function decide(state: CaseState, command: CaseCommand, context: DecideContext): Decision {
  const outcome = outcomeOf(state, command, context);
  return Array.isArray(outcome) ? { kind: 'accepted', drafts: outcome } : { kind: 'refused', refusal: outcome as Refusal };
}

/** A run that waited at a desk without a link is never refused for the case's state; what it raises can be handled. */
function isTakenAfterClose(command: CaseCommand): boolean {
  return ['log-run', 'note-painted', 'tell-alert', 'read-back-alert', 'act-on-alert', 'end-alert'].includes(command.name);
}

function outcomeOf(state: CaseState, command: CaseCommand, context: DecideContext): readonly EntryDraft[] | Refusal {
  if (command.name === 'plan-case') return decidePlan(state, command);
  if (state.seq === 0) return { code: 'not-planned', message: 'Case not planned: it has no plan yet' };
  if (state.status === 'closed' && !isTakenAfterClose(command)) {
    return { code: 'case-closed', message: 'Case closed: a closed case takes late runs and the handling of what they show, nothing else' };
  }
  switch (command.name) {
    case 'revise-plan':
      return decidePlan(state, command);
    case 'open-case':
    case 'confirm-timeout':
    case 'change-phase':
    case 'close-case':
      return decideLifecycle(state, command);
    case 'log-run':
      return decideRun(state, command, context);
    case 'correct-run':
      return decideCorrection(state, command, context);
    case 'accept-baseline':
      return decideBaseline(state, command, context);
    case 'log-step':
      return decideStep(state, command);
    case 'measure-distances':
      return decideDistances(state, command);
    case 'log-condition':
      return [draft('condition.logged', { condition: command.condition, reportedBy: command.reportedBy })];
    case 'record-examination':
      return [draft('examination.recorded', command.examination)];
    case 'confirm-baseline':
      return decideBaselineConfirmation(state, command);
    case 'send-message':
    case 'give-advice':
    case 'confirm-advice':
      return decideTalk(state, command);
    default:
      return decideAlert(state, command, context);
  }
}
