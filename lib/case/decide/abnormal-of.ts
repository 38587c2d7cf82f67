import type { Finding, FindingKind } from '@/lib/alert/judgement';
import { worstFinding } from '@/lib/alert/worst-finding';
import type { KeptRun } from '@/lib/case/case-state';
import type { EntryBodies } from '@/lib/case/entry-bodies';
import { isAbnormal } from '@/lib/case/is-abnormal';
import { pathIdOf } from '@/lib/case/keys';

/** A run that is past a limit on its nerve: which paths, how bad. */
export interface AbnormalRun {
  readonly runSeq: number;
  readonly at: string;
  readonly pathIds: readonly string[];
  /** Those of the paths whose finding is not a notice at most. */
  readonly alertPathIds: readonly string[];
  readonly finding: FindingKind;
  readonly mayBecomeAlert: boolean;
  readonly worstPercentOfBaseline: number | null;
  /** False when only a segment is past its limit whose proximal end was run earlier: such a run cannot confirm. */
  readonly isOwnEvidence: boolean;
}

/** What one path shows past a limit. */
interface AbnormalPath {
  readonly pathId: string;
  readonly findings: readonly Finding[];
  readonly percentOfBaseline: number | null;
  readonly isOwn: boolean;
}

/**
 * What of a judged run is past a limit.
 *
 * Method: from the judgement itself, so that a run whose entry came late is not missed because a newer one was seen.
 *
 * @param judged the judgement of the run
 * @param kept the run
 * @returns the abnormal paths and the worst finding; null when nothing is past a limit
 * @source house rule
 */
export function abnormalOf(judged: EntryBodies['run.judged'], kept: KeptRun): AbnormalRun | null {
  const paths = [...ownPaths(judged, kept), ...proximalPaths(judged, kept)];
  const findings = paths.flatMap((path) => path.findings);
  const worst = worstFinding(findings);
  if (worst === null) return null;
  const percents = paths.map((path) => path.percentOfBaseline).filter((percent) => percent !== null);
  return {
    runSeq: kept.seq,
    at: kept.at,
    pathIds: [...new Set(paths.map((path) => path.pathId))],
    alertPathIds: [...new Set(paths.filter((path) => path.findings.some((finding) => finding.mayBecomeAlert)).map((path) => path.pathId))],
    finding: worst.kind,
    mayBecomeAlert: findings.some((finding) => finding.mayBecomeAlert),
    worstPercentOfBaseline: percents.length === 0 ? null : Math.min(...percents),
    isOwnEvidence: paths.some((path) => path.isOwn),
  };
}

function ownPaths(judged: EntryBodies['run.judged'], kept: KeptRun): readonly AbnormalPath[] {
  return judged.paths
    .map((path) => {
      const ofSegments = judged.segments.filter(
        (segment) => segment.proximalSiteId === kept.run.siteId && pathIdOf(segment.proximalSiteId, segment.channelId) === path.pathId,
      );
      const ofPath = path.kind === 'compared' ? path.findings : [];
      return {
        pathId: path.pathId,
        findings: [...ofPath, ...ofSegments.flatMap((segment) => segment.findings)],
        percentOfBaseline: path.kind === 'compared' ? path.change.percentOfBaseline : null,
        isOwn: true,
      };
    })
    .filter((path) => isAbnormal(path.findings));
}

/** What is slow or weak across a segment shows in the response from its proximal end. */
function proximalPaths(judged: EntryBodies['run.judged'], kept: KeptRun): readonly AbnormalPath[] {
  return judged.segments
    .filter((segment) => segment.distalSiteId === kept.run.siteId && isAbnormal(segment.findings))
    .map((segment) => ({
      pathId: pathIdOf(segment.proximalSiteId, segment.channelId),
      findings: segment.findings,
      percentOfBaseline: null,
      isOwn: false,
    }));
}
