import type { BlindCause } from '@/lib/case/course/blind-cause';
import type { BlindTime } from '@/lib/case/course/blind-times';
import { blindCauses } from '@/lib/case/course/blind-cause';

/** Why nothing could be seen, in the words of the theatre screen. */
export const blindCauseNames: { readonly [C in BlindCause]: string } = {
  'cannot-be-judged': 'Muscle responses could not be judged',
  paused: 'Paused',
  'other-phase': 'Back in set-up or baseline phase',
  'no-baseline': 'No baseline',
  'not-compared': 'Not compared',
  'not-monitorable': 'Not monitorable by amplitude',
  'not-tested-since-step': 'Not tested since a risk step',
  'not-tested-in-time': 'Not tested in time',
};

/** One cause with its sum in ms and its share of the monitoring time in percent. */
export interface BlindRow {
  readonly cause: BlindCause;
  readonly name: string;
  readonly ms: number;
  readonly percent: number;
}

/**
 * The causes of blind time that occurred, the longest first.
 * @param time blind time of the case or of a nerve
 * @param monitoringMs monitoring time in ms
 * @returns rows; empty when nothing was blind
 * @source house rule
 * @accuracy exact; tests/lib/text/record-sentences.test.ts
 */
export function blindRows(time: BlindTime, monitoringMs: number): readonly BlindRow[] {
  return blindCauses
    .flatMap((cause) => {
      const ms = time.msByCause[cause] ?? 0;
      return ms === 0 ? [] : [{ cause, name: blindCauseNames[cause], ms, percent: (100 * ms) / monitoringMs }];
    })
    .sort((first, second) => second.ms - first.ms);
}
