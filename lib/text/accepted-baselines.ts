import type { CaseState } from '@/lib/case/case-state';
import { clockTime, nonBreakingSpace, signed } from '@/lib/text/format';
import { familyNames } from '@/lib/text/run-sentence';
import { siteName } from '@/lib/text/site-name';

/** One acceptance of baselines that is in force on at least one path. */
export interface AcceptedBaseline {
  /** Number of its entry: what a physician accepts. */
  readonly seq: number;
  readonly isProvisional: boolean;
  /** Family, electrode, sites, time, and what was lost before it was set. */
  readonly words: string;
}

/**
 * The baselines that runs are compared with now, each acceptance once, the newest first.
 * @param timeZone IANA zone of the theatre
 * @returns a new array; empty before the first acceptance
 * @source product rule: a baseline set after a loss says so for the rest of the case
 * @accuracy exact; tests/lib/text/accepted-baselines.test.ts
 * @example
 * acceptedBaselines(state, 'UTC')[0]?.isProvisional // => true
 */
export function acceptedBaselines(state: CaseState, timeZone: string): readonly AcceptedBaseline[] {
  const baselines = Object.values(state.baselines);
  const seqs = [...new Set(baselines.map(({ seq }) => seq))].sort((first, second) => second - first);
  return seqs.flatMap((seq) => {
    const accepted = baselines.filter((baseline) => baseline.seq === seq);
    const [first] = accepted;
    if (first === undefined) return [];
    const electrode = state.plan.electrodes.find(({ id }) => id === first.electrodeId)?.name ?? first.electrodeId;
    const sites = [...new Set(accepted.map(({ pathId }) => siteName(state.plan, pathId.slice(0, pathId.indexOf('/')))))].join('; ');
    const newest = accepted.map(({ at }) => at).sort().at(-1) ?? first.at;
    const loss = first.setAfterPercent === null ? '' : `, set after ${signed(first.setAfterPercent, 0)}${nonBreakingSpace}%`;
    const corrected = accepted.some(({ isMarkedByCorrection }) => isMarkedByCorrection) ? ', used a run that was corrected' : '';
    const family = familyNames[first.family];
    const words = `${family.charAt(0).toUpperCase()}${family.slice(1)}, ${electrode}, ${clockTime(newest, timeZone)}: ${sites}${loss}${corrected}`;
    return [{ seq, isProvisional: accepted.some(({ isProvisional }) => isProvisional), words }];
  });
}
