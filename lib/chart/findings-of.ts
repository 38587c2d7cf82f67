import type { Finding, FindingKind } from '@/lib/alert/judgement';

/** What a finding was measured by: how many fibres answer, or how fast. */
export type Measure = 'amplitude' | 'time';

/** A response that is back at a higher current only is not what its % of baseline says: the amplitude carries it. @source house rule */
const measures: Record<FindingKind, readonly Measure[]> = {
  'response-lost': ['amplitude'],
  'amplitude-and-onset': ['amplitude', 'time'],
  'amplitude-fall': ['amplitude'],
  'segment-slowed': ['time'],
  'onset-late': ['time'],
  'ratio-fall': ['amplitude'],
  'amplitude-watch': ['amplitude'],
  'threshold-rise': ['amplitude'],
};

/**
 * The findings that one measure made: a number takes a priority only from its own.
 * @param findings of a run or a segment; not modified
 * @param measure 'amplitude' or 'time'
 * @returns those findings, in their order; empty when the other measure made them all
 * @source product rule: priority colour is for what passed a limit, nothing else
 * @accuracy exact; tests/lib/chart/findings-of.test.ts
 * @example
 * findingsOf([{ kind: 'amplitude-fall', priority: 'notice', mayBecomeAlert: true }], 'time') // => []
 */
export function findingsOf(findings: readonly Finding[], measure: Measure): readonly Finding[] {
  return findings.filter((finding) => measures[finding.kind].includes(measure));
}
