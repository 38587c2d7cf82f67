import type { BadSegment, CaseState, KeptRun } from '@/lib/case/case-state';
import { isAbnormal } from '@/lib/case/is-abnormal';
import { isEndOfSegment } from '@/lib/case/is-end-of-segment';
import { segmentPathId } from '@/lib/case/keys';

/**
 * The segments of a nerve that a run showed past a limit.
 *
 * Method: a slowed one always; a ratio only where the response from its proximal end is not past a limit by itself,
 * because then that response is what has to come back.
 *
 * @param state the case with the run's judgement
 * @param nerveId slug of the nerve
 * @param kept the run
 * @returns keys with their measures, empty when there is none
 * @source house rule
 */
export function badSegmentsOf(state: CaseState, nerveId: string, kept: KeptRun): readonly BadSegment[] {
  return Object.entries(state.segments)
    .filter(([, segment]) => segment.nerveId === nerveId && isAbnormal(segment.findings))
    .filter(([, segment]) => isEndOfSegment(segment, kept))
    .flatMap(([key, segment]): BadSegment[] => {
      if (segment.findings.some((finding) => finding.kind === 'segment-slowed')) return [{ key, measure: 'time' }];
      return isAbnormal(state.paths[segmentPathId(key)]?.compared?.findings ?? []) ? [] : [{ key, measure: 'ratio' }];
    });
}
