import type { CaseState } from '@/lib/case/case-state';

/**
 * Whether the baseline of a path was moved after a loss while its notice or alert was open.
 * @param state the case
 * @param pathId one of its paths
 * @param firstBadAt when it was first past a limit
 * @returns true for any electrode and family: being like that baseline is no return
 * @source product rule: moving the working baseline hides nothing
 * @accuracy exact; tests/lib/case/baseline-moved.test.ts
 * @example
 * isRebased(state, 'wrist/adm', '2027-03-14T10:41:00.000Z') // => false
 */
export function isRebased(state: CaseState, pathId: string, firstBadAt: string): boolean {
  return Object.values(state.baselines).some(
    (baseline) => baseline.pathId === pathId && baseline.setAfterPercent !== null && baseline.at >= firstBadAt,
  );
}
