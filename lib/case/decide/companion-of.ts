import type { Nerve } from '@/lib/alert/nerve-plan';
import type { CaseState } from '@/lib/case/case-state';
import { abnormalOf, type AbnormalRun } from '@/lib/case/decide/abnormal-of';
import { judgedDraft } from '@/lib/case/decide/judged-draft';
import { isAbnormal } from '@/lib/case/is-abnormal';
import { msOfMoment } from '@/lib/units/ms-of-moment';

/**
 * The run that a late one would have confirmed, or been confirmed by, had it come in time.
 *
 * Method: another kept run of the nerve past a limit that can become an alert, with no run of the paths of either
 * inside its limit between the two. Asked only of a run that newer ones of its paths came after: any other is
 * answered by what follows it.
 *
 * @param state the case with the late run's judgement
 * @param nerve the nerve
 * @param late the late run that is past a limit
 * @returns the nearest such run in time; null when there is none, or when the run is not late
 * @source product rule: a late entry that hid an alert shows
 */
export function companionOf(state: CaseState, nerve: Nerve, late: AbnormalRun): AbnormalRun | null {
  if (!late.mayBecomeAlert || !late.isOwnEvidence || nerve.role === 'control' || !isLate(state, late)) return null;
  const others = state.runs.filter((run) => run.seq !== late.runSeq && nerve.sites.some((site) => site.id === run.run.siteId));
  const judged = others.flatMap((kept) => {
    const body = judgedDraft(state, kept.seq)?.body;
    return body === undefined ? [] : [{ kept, body, abnormal: abnormalOf(body, kept) }];
  });
  const isSettledBetween = (companion: AbnormalRun) => {
    const [from, to] = companion.at < late.at ? [companion, late] : [late, companion];
    const pathIds = [...from.pathIds, ...to.pathIds];
    return judged.some(
      ({ kept, body }) =>
        kept.at > from.at && kept.at < to.at && body.paths.some((path) => path.kind === 'compared' && !isAbnormal(path.findings) && pathIds.includes(path.pathId)),
    );
  };
  const distanceMs = (one: AbnormalRun) => Math.abs(msOfMoment(one.at) - msOfMoment(late.at));
  return judged
    .map(({ abnormal }) => abnormal)
    .filter((abnormal) => abnormal !== null)
    .filter((abnormal) => abnormal.mayBecomeAlert && abnormal.isOwnEvidence && !isSettledBetween(abnormal))
    .reduce<AbnormalRun | null>((nearest, one) => (nearest === null || distanceMs(one) < distanceMs(nearest) ? one : nearest), null);
}

function isLate(state: CaseState, { at, runSeq, pathIds }: AbnormalRun): boolean {
  return pathIds.every((pathId) => {
    const newest = state.paths[pathId]?.compared ?? null;
    return newest !== null && newest.seq !== runSeq && newest.at > at;
  });
}
