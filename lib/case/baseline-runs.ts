import { comparability } from '@/lib/change/comparability';
import type { CaseState, KeptRun } from '@/lib/case/case-state';
import type { BaselineFamily } from '@/lib/case/plan';

/**
 * The baseline runs waiting to be accepted.
 *
 * Method: purpose "baseline", after the time-out, with this electrode and family, newer than the last acceptance;
 * of each site only those like its newest one in pulse width and current.
 *
 * @param state the case
 * @returns runs in the order they were logged, empty when there are none
 * @source house rule: a baseline is a mean of like runs
 * @accuracy exact; tests/lib/case/baseline.test.ts
 * @example
 * baselineRuns(state, 'surface', 'through-skin')
 */
export function baselineRuns(state: CaseState, electrodeId: string, family: BaselineFamily): readonly KeptRun[] {
  const lastAccepted = Math.max(
    0,
    ...Object.values(state.baselines)
      .filter((baseline) => baseline.electrodeId === electrodeId && baseline.family === family)
      .map((baseline) => baseline.seq),
  );
  const candidates = state.runs.filter(
    (kept) =>
      kept.seq > lastAccepted &&
      !kept.isBeforeTimeout &&
      kept.run.purpose === 'baseline' &&
      kept.run.electrodeId === electrodeId &&
      kept.run.family === family,
  );
  return candidates.filter((kept) => {
    const newest = candidates.findLast((other) => other.run.siteId === kept.run.siteId);
    return newest !== undefined && isLike(kept, newest);
  });
}

function isLike(kept: KeptRun, newest: KeptRun): boolean {
  const conditions = ({ run }: KeptRun) => ({
    electrode: run.electrodeId,
    family: run.family,
    pulseWidthUs: run.pulseWidthUs,
    convention: 'same channel',
    intensityMa: run.intensityMa,
    isSupramaximal: run.isSupramaximal,
    maximalResponseMa: run.maximalResponseMa,
  });
  return comparability(conditions(kept), conditions(newest)).kind === 'comparable';
}
