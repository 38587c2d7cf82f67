import { evolveAlert } from '@/lib/case/evolve/evolve-alert';
import { evolveBaseline } from '@/lib/case/evolve/evolve-baseline';
import { evolveCorrection } from '@/lib/case/evolve/evolve-correction';
import { evolveJudgement } from '@/lib/case/evolve/evolve-judgement';
import { evolvePlan } from '@/lib/case/evolve/evolve-plan';
import { evolveTalk } from '@/lib/case/evolve/evolve-talk';
import { evolveRun } from '@/lib/case/evolve/evolve-run';
import type { CaseState, Incident, KeptCondition, KeptStep } from '@/lib/case/case-state';
import type { CaseEntry } from '@/lib/case/entry-bodies';
import { stepsBetween } from '@/lib/case/steps-between';

/** Steps the state remembers: enough for every onset bracket, since older ones lie before the last good run. */
const keptStepCount = 40;

/**
 * The state of a case after one more entry.
 *
 * Method: a pure copy of what the entry says; nothing is computed here that a limit is held against. The number
 * and the hash are set by the caller, which knows them also for entries whose body it may not read.
 *
 * @param state state before the entry; not modified
 * @param entry a committed entry of a known kind and version
 * @returns the state after it
 * @source house rule: a case is a fold over its entries
 * @accuracy exact; tests/lib/case/evolve.test.ts
 * @example
 * evolve(state, entry).seq === entry.seq
 */
export function evolve(state: CaseState, entry: CaseEntry): CaseState {
  return { ...evolveBody(state, entry), seq: entry.seq };
}

function evolveBody(state: CaseState, entry: CaseEntry): CaseState {
  switch (entry.kind) {
    case 'case.planned':
    case 'plan.revised':
    case 'distances.measured':
      return evolvePlan(state, entry);
    case 'case.opened':
      return { ...state, status: 'open', phaseAt: entry.eventAt };
    case 'timeout.confirmed':
      return { ...state, timeoutAt: state.timeoutAt ?? entry.eventAt };
    case 'phase.changed':
      return { ...state, phase: entry.body.phase, phaseReason: entry.body.reason, phaseAt: entry.eventAt };
    case 'run.logged':
      return evolveRun(state, entry);
    case 'run.judged':
      return evolveJudgement(state, entry);
    case 'run.corrected':
      return evolveCorrection(state, entry);
    case 'baseline.accepted':
    case 'baseline.confirmed':
      return evolveBaseline(state, entry);
    case 'condition.logged':
      return evolveCondition(state, entry);
    case 'step.logged':
      return evolveStep(state, entry);
    case 'case.closed':
      return { ...state, status: 'closed', closedAt: entry.eventAt };
    case 'team.assigned':
      return { ...state, team: entry.body.people };
    case 'examination.recorded':
      return state;
    case 'message.sent':
    case 'advice.given':
    case 'advice.confirmed':
      return evolveTalk(state, entry);
    default:
      return evolveAlert(state, entry);
  }
}

/** The newest by its own time stands: a late entry does not bring an older value back. */
function evolveCondition(state: CaseState, entry: CaseEntry & { kind: 'condition.logged' }): CaseState {
  const { kind } = entry.body.condition;
  const before = state.conditions[kind];
  if (before !== undefined && before.at > entry.eventAt) return state;
  const kept: KeptCondition = { seq: entry.seq, at: entry.eventAt, condition: entry.body.condition };
  return { ...state, conditions: { ...state.conditions, [kind]: kept } };
}

/** The newest of them, and the last risk step however many came after it. */
function keptSteps(steps: readonly KeptStep[]): readonly KeptStep[] {
  const newest = steps.slice(-keptStepCount);
  const risk = steps.reduce<KeptStep | null>((last, step) => (step.isRisk && (last === null || step.at >= last.at) ? step : last), null);
  return risk === null || newest.includes(risk) ? newest : [risk, ...newest.slice(1)];
}

function evolveStep(state: CaseState, entry: CaseEntry & { kind: 'step.logged' }): CaseState {
  const step: KeptStep = { seq: entry.seq, at: entry.eventAt, since: entry.body.since, isRisk: entry.body.isRisk };
  const steps = keptSteps([...state.steps, step]);
  const incidents = Object.fromEntries(Object.entries(state.incidents).map(([id, incident]) => [id, withLateStep(incident, step, steps)]));
  if (!entry.body.voidsDistances) return { ...state, steps, incidents };
  const nerveIds = state.plan.nerves.filter((nerve) => nerve.role === 'at-risk').map((nerve) => nerve.id);
  const voided = Object.fromEntries(nerveIds.map((id) => [id, entry.eventAt]));
  return { ...state, steps, incidents, distancesVoidSince: { ...state.distancesVoidSince, ...voided } };
}

/** A step whose entry came after the change it lies before belongs to the onset bracket all the same. */
function withLateStep(incident: Incident, step: KeptStep, steps: readonly KeptStep[]): Incident {
  const isBetween = step.at < incident.firstBadAt && stepsBetween([step], incident).length > 0;
  return !isBetween ? incident : { ...incident, stepsBetween: stepsBetween(steps, incident) };
}
