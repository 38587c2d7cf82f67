import type { Nerve } from '@/lib/alert/nerve-plan';
import type { CaseState, Incident } from '@/lib/case/case-state';
import { abnormalOf, type AbnormalRun } from '@/lib/case/decide/abnormal-of';
import { draft } from '@/lib/case/decide/draft';
import { evidenceOf } from '@/lib/case/decide/evidence-of';
import { repeatDueAt } from '@/lib/case/decide/repeat-due-at';
import { worseningOf } from '@/lib/case/decide/worsening-of';
import type { EntryDraft } from '@/lib/case/entry-bodies';
import { hasRecovered } from '@/lib/case/has-recovered';
import { isComingBack } from '@/lib/case/is-coming-back';
import { locateInCase } from '@/lib/case/locate-in-case';

/**
 * What a judged run does to the notice or alert of its nerve.
 *
 * Method: the first run past a limit is a notice. The next run past a limit that can become an alert confirms it,
 * on the same path or another of the nerve: stretches of one nerve are nested, every one ends at the muscle. A
 * repeat that is back inside the limit with its margin settles a notice; an alert only ends by a person.
 *
 * @param before the case before the run: what was open then
 * @param after the case with the run and its judgement
 * @param runSeq number of the judged run
 * @returns drafts in the order of commit, none when nothing changed
 * @source product rules: watch, notice, alert; one alert per nerve; worsening raises again
 */
export function alertDrafts(before: CaseState, after: CaseState, runSeq: number): readonly EntryDraft[] {
  const kept = after.runs.find((run) => run.seq === runSeq);
  const nerve = after.plan.nerves.find((candidate) => candidate.sites.some((site) => site.id === kept?.run.siteId));
  if (kept === undefined || nerve === undefined) return [];
  const abnormal = abnormalOf(after, nerve, kept);
  const incident = before.incidents[nerve.id];
  if (incident === undefined) return abnormal === null ? [] : [notice(after, nerve, abnormal)];
  if (abnormal !== null && abnormal.isOwnEvidence) return abnormalAgain(after, nerve, incident, abnormal);
  return insideLimits(after, nerve, incident, runSeq);
}

function notice(after: CaseState, nerve: Nerve, abnormal: AbnormalRun): EntryDraft {
  const alertId = `${nerve.id}-${(after.alertCounts[nerve.id] ?? 0) + 1}`;
  const evidence = evidenceOf(after, nerve, abnormal, { alertId, incident: null });
  return draft('notice.raised', { ...evidence, repeatDueAt: repeatDueAt(after, nerve, abnormal) });
}

function abnormalAgain(after: CaseState, nerve: Nerve, incident: Incident, abnormal: AbnormalRun): readonly EntryDraft[] {
  const evidence = evidenceOf(after, nerve, abnormal, { alertId: incident.alertId, incident });
  const isConfirming = abnormal.mayBecomeAlert && nerve.role === 'at-risk' && abnormal.runSeq !== incident.firstSeq;
  if (isConfirming && !incident.isRepeated) return [draft('alert.raised', { ...evidence, isRepeated: true })];
  if (incident.level === 'alert') {
    const worsening = worseningOf(after, nerve, incident, abnormal, evidence);
    if (worsening.length > 0) return [draft('alert.worsened', { ...evidence, worsening })];
  }
  return located(after, nerve, incident, abnormal.runSeq);
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
  const location = locateInCase(after, nerve, incident.locateFromSeq);
  if (location === null || JSON.stringify(location) === JSON.stringify(incident.location)) return [];
  return [draft('alert.located', { alertId: incident.alertId, runSeq, location })];
}

function lowestPercent(after: CaseState, incident: Incident): number | null {
  const percents = incident.badPathIds
    .map((pathId) => after.paths[pathId]?.compared?.change.percentOfBaseline ?? null)
    .filter((percent) => percent !== null);
  return percents.length === 0 ? null : Math.min(...percents);
}
