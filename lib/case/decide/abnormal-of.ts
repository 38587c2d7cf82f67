import type { Finding, FindingKind, SegmentJudgement } from '@/lib/alert/judgement';
import type { Nerve } from '@/lib/alert/nerve-plan';
import { worstFinding } from '@/lib/alert/worst-finding';
import type { CaseState, KeptRun } from '@/lib/case/case-state';
import { isAbnormal } from '@/lib/case/is-abnormal';
import { pathIdOf } from '@/lib/case/keys';

/** A run that is past a limit on its nerve: which paths, how bad. */
export interface AbnormalRun {
  readonly runSeq: number;
  readonly at: string;
  readonly siteId: string;
  readonly pathIds: readonly string[];
  readonly finding: FindingKind;
  readonly mayBecomeAlert: boolean;
  readonly worstPercentOfBaseline: number | null;
  /** False when only a segment is past its limit whose proximal end was run earlier: such a run cannot confirm. */
  readonly isOwnEvidence: boolean;
}

/**
 * What of a judged run is past a limit.
 * @param state the case with the run's judgement
 * @param nerve the nerve of the run's site
 * @param kept the run
 * @returns the abnormal paths and the worst finding; null when nothing is past a limit
 * @source house rule
 */
export function abnormalOf(state: CaseState, nerve: Nerve, kept: KeptRun): AbnormalRun | null {
  const pathIds: string[] = [];
  const findings: Finding[] = [];
  const percents: number[] = [];
  let isOwnEvidence = false;
  for (const { channelId } of kept.run.readings) {
    const pathId = pathIdOf(kept.run.siteId, channelId);
    const record = recordOfRun(state, pathId, kept.seq);
    const ofPath = record === null ? [] : record.findings;
    const ofProximal = segmentsOf(state, nerve, channelId).filter((segment) => isEnd(segment.proximalSiteId, segment.proximalAt, kept));
    const own = [...ofPath, ...ofProximal.flatMap((segment) => segment.findings)];
    if (isAbnormal(own)) {
      isOwnEvidence = true;
      pathIds.push(pathId);
      findings.push(...own);
      const percent = record?.change.percentOfBaseline ?? null;
      if (percent !== null) percents.push(percent);
    }
    for (const segment of segmentsOf(state, nerve, channelId)) {
      if (!isEnd(segment.distalSiteId, segment.distalAt, kept) || !isAbnormal(segment.findings)) continue;
      // What is slow or weak across a segment shows in the response from its proximal end.
      pathIds.push(pathIdOf(segment.proximalSiteId, channelId));
      findings.push(...segment.findings);
    }
  }
  const worst = worstFinding(findings);
  if (worst === null) return null;
  return {
    runSeq: kept.seq,
    at: kept.at,
    siteId: kept.run.siteId,
    pathIds: [...new Set(pathIds)],
    finding: worst.kind,
    mayBecomeAlert: findings.some((finding) => finding.mayBecomeAlert),
    worstPercentOfBaseline: percents.length === 0 ? null : Math.min(...percents),
    isOwnEvidence,
  };
}

function recordOfRun(state: CaseState, pathId: string, runSeq: number) {
  const record = state.paths[pathId];
  if (record?.compared?.seq === runSeq) return record.compared;
  return record?.previous?.seq === runSeq ? record.previous : null;
}

function segmentsOf(state: CaseState, nerve: Nerve, channelId: string): readonly SegmentJudgement[] {
  return Object.values(state.segments).filter((segment) => segment.nerveId === nerve.id && segment.channelId === channelId);
}

function isEnd(siteId: string, at: string, kept: KeptRun): boolean {
  return siteId === kept.run.siteId && at === kept.at;
}
