import type { CaseState, KeptRun } from '@/lib/case/case-state';
import { alertDrafts } from '@/lib/case/decide/alert-drafts';
import { judgedDraft } from '@/lib/case/decide/judged-draft';
import type { EntryDraft } from '@/lib/case/entry-bodies';
import { isAbnormal } from '@/lib/case/is-abnormal';

/**
 * The notice of an older run that a corrected one had answered: with its answer gone it is open again.
 * @param before the case before the correction
 * @param after the case with the correction
 * @param corrected the run as it was
 * @returns one draft; none where the newest comparable run is not past a limit, or its nerve has a notice or alert open
 * @source product rule: a correction judges its path again
 */
export function uncoveredDrafts(before: CaseState, after: CaseState, corrected: KeptRun): readonly EntryDraft[] {
  const nerve = after.plan.nerves.find((candidate) => candidate.sites.some((site) => site.id === corrected.run.siteId));
  if (nerve === undefined || after.incidents[nerve.id] !== undefined) return [];
  const newest = Object.values(before.paths)
    .filter((record) => record.compared?.seq === corrected.seq)
    .map((record) => after.paths[record.pathId]?.compared ?? null)
    .find((record) => record !== null && record.seq !== corrected.seq && isAbnormal(record.findings));
  const judged = newest === undefined || newest === null ? null : judgedDraft(after, newest.seq);
  return judged === null ? [] : alertDrafts(after, after, judged.body);
}
