import { defaultRuleSet } from '@/lib/alert/rule-set';
import type { CaseState } from '@/lib/case/case-state';
import type { CasePlan } from '@/lib/case/plan';

const emptyPlan: CasePlan = {
  templateId: 'none',
  procedure: '',
  title: '',
  side: 'left',
  theatre: '',
  nerves: [],
  channels: [],
  paths: [],
  steps: [],
  rules: defaultRuleSet,
  electrodes: [],
  defaultPulseWidthUs: 200,
  defaultFamily: 'exposed',
  closingSiteId: 'none',
  trap: '',
};

/** The hash that entry 1 names as the one before it: 64 zeros. */
export const hashBeforeFirst = '0'.repeat(64);

/**
 * A case before its first entry.
 * @param caseId UUID of the case
 * @returns state with seq 0, planned, an empty plan and nothing tested
 * @source house rule
 * @accuracy exact; tests/lib/case/evolve.test.ts
 * @example
 * initialState('c').seq // => 0
 */
export function initialState(caseId: string): CaseState {
  return {
    caseId,
    seq: 0,
    hash: hashBeforeFirst,
    status: 'planned',
    plannedAt: '',
    reference: '',
    plan: emptyPlan,
    phase: 'set-up',
    phaseReason: null,
    phaseAt: '',
    timeoutAt: null,
    closedAt: null,
    distancesVoidSince: {},
    runs: [],
    paths: {},
    segments: {},
    baselines: {},
    openingBaselines: {},
    conditions: {},
    steps: [],
    incidents: {},
    alertCounts: {},
    withdrawn: [],
    runCount: 0,
    team: [],
    advice: [],
    unanswered: {},
  };
}
