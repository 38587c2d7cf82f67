import type { Nerve } from '@/lib/alert/nerve-plan';
import type { CaseState, Incident } from '@/lib/case/case-state';
import { abnormalOf, type AbnormalRun } from '@/lib/case/decide/abnormal-of';
import { companionOf } from '@/lib/case/decide/companion-of';
import { draft } from '@/lib/case/decide/draft';
import { evidenceOf } from '@/lib/case/decide/evidence-of';
import { repeatDueAt } from '@/lib/case/decide/repeat-due-at';
import { worseningOf } from '@/lib/case/decide/worsening-of';
import type { EntryBodies, EntryDraft } from '@/lib/case/entry-bodies';
import { hasRecovered } from '@/lib/case/has-recovered';
import { isComingBack } from '@/lib/case/is-coming-back';
import { isTestOfIncident } from '@/lib/case/is-test-of-incident';
import { locateInCase } from '@/lib/case/locate-in-case';

/**
 * What a judged run does to the notice or alert of its nerve.
 *
 * Method: the first run past a limit is a notice. The next run past a limit that can become an alert confirms it,
 * on the same path or another of the nerve: stretches of one nerve are nested, every one ends at the muscle. What so far
 * was a notice at most confirms nothing graver: that asks for a repeat of its own. A repeat that is back inside the limit
 * with its margin settles a notice; an alert only ends by a person. What a late entry shows is raised like any other and
 * waits for a test that comes after it, also where newer runs are good; what would have confirmed it in time confirms it.
 *
 * @param before the case before the run: what was open then
 * @param after the case with the run and its judgement
 * @param judged the judgement
 * @returns drafts in the order of commit, none when nothing changed
 * @source product rules: watch, notice, alert; one alert per nerve; worsening raises again
 */
export function alertDrafts(before: CaseState, after: CaseState, judged: EntryBodies['run.judged']): readonly EntryDraft[] {
  const kept = after.runs.find((run) => run.seq === judged.runSeq);
  const nerve = after.plan.nerves.find((candidate) => candidate.sites.some((site) => site.id === kept?.run.siteId));
  if (kept === undefined || nerve === undefined) return [];
  const abnormal = abnormalOf(judged, kept);
  const open = before.incidents[nerve.id];
  const incident = after.incidents[nerve.id];
  if (open === undefined || incident === undefined) return abnormal === null ? [] : firstRaised(after, nerve, abnormal);
  // A correction can have taken a recovery back: what it shows now is a return.
  if (abnormal?.isOwnEvidence === true) return abnormalAgain(after, nerve, { ...incident, recoveredAt: open.recoveredAt }, abnormal);
  return insideLimits(after, nerve, incident, judged.runSeq);
}

/** A notice; of a late entry that has its confirmation among the kept runs, the alert it would have been. */
function firstRaised(after: CaseState, nerve: Nerve, abnormal: AbnormalRun): readonly EntryDraft[] {
  const open = { alertId: `${nerve.id}-${(after.alertCounts[nerve.id] ?? 0) + 1}`, incident: null };
  const companion = companionOf(after, nerve, abnormal);
  if (companion === null) return [notice(after, nerve, abnormal, open)];
  const [first, second] = companion.at < abnormal.at ? [companion, abnormal] : [abnormal, companion];
  const { runSeq, finding } = second;
  const percents = [first, second].map((run) => run.worstPercentOfBaseline).filter((percent) => percent !== null);
  const worstPercentOfBaseline = percents.length === 0 ? null : Math.min(...percents);
  const pathIds = [...new Set([...first.pathIds, ...second.pathIds])];
  const evidence = { ...evidenceOf(after, nerve, first, open), runSeq, finding, worstPercentOfBaseline, pathIds };
  return [notice(after, nerve, first, open), draft('alert.raised', { ...evidence, isRepeated: true })];
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
  const isOnsetEarlier = isGrave && incident.recoveredAt === null && evidence.firstBadAt < incident.firstBadAt;
  // Still the alert that was raised, with the onset that a late entry showed.
  if (drafts.length === 0 && isOnsetEarlier) return [draft('alert.raised', { ...evidence, finding: incident.finding, isRepeated: incident.isRepeated })];
  return drafts.length > 0 ? drafts : located(after, nerve, incident, abnormal.runSeq);
}

function insideLimits(after: CaseState, nerve: Nerve, incident: Incident, runSeq: number): readonly EntryDraft[] {
  const drafts = located(after, nerve, incident, runSeq);
  if (!isTestOfIncident(after, incident, runSeq)) return drafts;
  const { alertId } = incident;
  if (incident.level === 'notice') return hasRecovered(after, nerve, incident, 1) ? [draft('notice.settled', { alertId, runSeq })] : drafts;
  if (incident.recoveredAt !== null || !hasRecovered(after, nerve, incident, 2)) return drafts;
  return [...drafts, draft('alert.recovered', { alertId, runSeq, percentOfBaseline: lowestPercent(after, incident) })];
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
