import type { CaseState } from '@/lib/case/case-state';

/**
 * From when on a run says something about the nerve as it is now.
 *
 * Method: the time of the last risk step, or of the first abnormal run of the nerve's open notice or alert, whichever
 * is later. A run at that very time counts. Age alone is not judged here.
 *
 * @param state the case; not modified
 * @param nerveId a nerve of the plan
 * @returns RFC 3339 UTC time; empty (earlier than every time) when nothing happened yet
 * @source product rule: a pair that spans a risk step is no evidence; location comes from runs after the first abnormal one
 * @accuracy tests/lib/chart/nerve-line-view.test.ts
 * @example
 * testedSince(state, 'ulnar') // => '2027-03-14T09:41:20.000Z'
 */
export function testedSince(state: CaseState, nerveId: string): string {
  const steps = state.steps.filter((step) => step.isRisk).map((step) => step.at);
  const firstBadAt = state.incidents[nerveId]?.firstBadAt;
  return [...steps, ...(firstBadAt === undefined ? [] : [firstBadAt])].reduce((latest, at) => (at > latest ? at : latest), '');
}
