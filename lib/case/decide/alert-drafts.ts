import type { Nerve } from '@/lib/alert/nerve-plan';
import type { CaseState, Incident } from '@/lib/case/case-state';
import { abnormalOf, type AbnormalRun } from '@/lib/case/decide/abnormal-of';
import type { DecideContext } from '@/lib/case/decide/decide-context';
import { draft } from '@/lib/case/decide/draft';
import { evidenceOf } from '@/lib/case/decide/evidence-of';
import { evolveDraft } from '@/lib/case/decide/evolve-draft';
import { repeatDueAt } from '@/lib/case/decide/repeat-due-at';
import { worseningOf } from '@/lib/case/decide/worsening-of';
import type { EntryBodies, EntryDraft } from '@/lib/case/entry-bodies';
import { hasRecovered } from '@/lib/case/has-recovered';
import { isComingBack } from '@/lib/case/is-coming-back';
import { locateInCase } from '@/lib/case/locate-in-case';

/**
 * What a judged run does to the notice or alert of its nerve.
 *
 * Method: the first run past a limit is a notice. The next run past a limit that can become an alert confirms it,
 * on the same path or another of the nerve: stretches of one nerve are nested, every one ends at the muscle. What so far
 * was a notice at most confirms nothing graver: that asks for a repeat of its own. A repeat that is back inside the limit
 * with its margin settles a notice; an alert only ends by a person.
 *
 * @param before the case before the run: what was open then
 * @param after the case with the run and its judgement
 * @param judged the judgement
 * @param context times of the command
 * @returns drafts in the order of commit, none when nothing changed
 * @source product rules: watch, notice, alert; one alert per nerve; worsening raises again
 */
export function alertDrafts(
  before: CaseState,
  after: CaseState,
  judged: EntryBodies['run.judged'],
  context: DecideContext,
): readonly EntryDraft[] {
  const kept = after.runs.find((run) => run.seq === judged.runSeq);
  const nerve = after.plan.nerves.find((candidate) => candidate.sites.some((site) => site.id === kept?.run.siteId));
  if (kept === undefined || nerve === undefined) return [];
  const abnormal = abnormalOf(judged, kept);
  const incident = before.incidents[nerve.id] === undefined ? undefined : after.incidents[nerve.id];
  if (incident === undefined) return abnormal === null ? [] : firstNotice(after, nerve, abnormal, context);
  if (abnormal !== null && abnormal.isOwnEvidence) return abnormalAgain(after, nerve, incident, abnormal);
  return insideLimits(after, nerve, incident, judged.runSeq);
}

/** A late entry can already have its repeat: then the notice is raised and settled at once, and both stand in the log. */
function firstNotice(after: CaseState, nerve: Nerve, abnormal: AbnormalRun, context: DecideContext): readonly EntryDraft[] {
  const alertId = `${nerve.id}-${(after.alertCounts[nerve.id] ?? 0) + 1}`;
  const raised = notice(after, nerve, abnormal, { alertId, incident: null });
  const withNotice = evolveDraft(after, raised, context);
  const incident = withNotice.incidents[nerve.id];
  if (incident === undefined || !hasRecovered(withNotice, nerve, incident, 1)) return [raised];
  return [raised, draft('notice.settled', { alertId, runSeq: abnormal.runSeq })];
}

function notice(after: CaseState, nerve: Nerve, abnormal: AbnormalRun, open: { alertId: string; incident: Incident | null }): EntryDraft {
  return draft('notice.raised', { ...evidenceOf(after, nerve, abnormal, open), repeatDueAt: repeatDueAt(after, nerve, abnormal) });
}

function abnormalAgain(after: CaseState, nerve: Nerve, incident: Incident, abnormal: AbnormalRun): readonly EntryDraft[] {
  const open = { alertId: incident.alertId, incident };
  const evidence = evidenceOf(after, nerve, abnormal, open);
  const isGrave = abnormal.mayBecomeAlert && nerve.role === 'at-risk' && abnormal.runSeq !== incident.firstSeq;
  if (isGrave && !incident.mayBecomeAlert) return [notice(after, nerve, abnormal, open)];
  const drafts: EntryDraft[] = isGrave && !incident.isRepeated ? [draft('alert.raised', { ...evidence, isRepeated: true })] : [];
  if (incident.level === 'alert') {
    const worsening = worseningOf(after, nerve, incident, abnormal, evidence);
    if (worsening.length > 0) drafts.push(draft('alert.worsened', { ...evidence, worsening }));
  }
  return drafts.length > 0 ? drafts : located(after, nerve, incident, abnormal.runSeq);
}

function insideLimits(after: CaseState, nerve: Nerve, incident: Incident, runSeq: number): readonly EntryDraft[] {
  const drafts = [...located(after, nerve, incident, runSeq)];
  if (incident.level === 'notice') {
    if (hasRecovered(after, nerve, incident, 1)) return [draft('notice.settled', { alertId: incident.alertId, runSeq })];
    return drafts;
  }
  if (incident.recoveredAt === null && hasRecovered(after, nerve, incident, 2)) {
    const percentOfBaseline = lowestPercent(after, incident);
    drafts.push(draft('alert.recovered', { alertId: incident.alertId, runSeq, percentOfBaseline }));
  }
  return drafts;
}

function located(after: CaseState, nerve: Nerve, incident: Incident, runSeq: number): readonly EntryDraft[] {
  // A path that came back says that the nerve recovers, not that the change moved: what was found stays.
  if (isComingBack(after, incident)) return [];
  const location = locateInCase(after, nerve, { at: incident.locateFromAt, seq: incident.locateFromSeq });
  if (location === null || JSON.stringify(location) === JSON.stringify(incident.location)) return [];
  return [draft('alert.located', { alertId: incident.alertId, runSeq, location })];
}

function lowestPercent(after: CaseState, incident: Incident): number | null {
  const percents = incident.badPathIds
    .map((pathId) => after.paths[pathId]?.compared?.change.percentOfBaseline ?? null)
    .filter((percent) => percent !== null);
  return percents.length === 0 ? null : Math.min(...percents);
}
