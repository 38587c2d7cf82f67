import type { AlertCourse } from '@/lib/case/course/alert-course';
import type { CaseCourse } from '@/lib/case/course/case-course';
import { mainRound } from '@/lib/text/record-alert-words';
import { channelName } from '@/lib/text/run-sentence';
import { siteName } from '@/lib/text/site-name';

/**
 * What a record of this kind usually holds and this one does not.
 *
 * Method: looks for entries that are missing; it does not say whether they were needed.
 *
 * @param course the course of the case
 * @returns sentences with full stops; empty when nothing is missing
 * @source common practice: opening and closing test from the most proximal site, control, examination before and after, told and read back
 * @accuracy tests/lib/text/record-sentences.test.ts
 * @example
 * recordNotDone(course) // => ['No examination after the operation is recorded.']
 */
export function recordNotDone(course: CaseCourse): readonly string[] {
  return [...aboutCase(course), ...aboutTests(course), ...course.alerts.filter((alert) => alert.level === 'alert' && alert.end?.kind !== 'withdrawn').flatMap(aboutAlert), ...aboutTalk(course)];
}

function aboutCase(course: CaseCourse): readonly string[] {
  const { times, examinations, conditions, baselines } = course;
  const unconfirmed = baselines.filter((one) => one.isProvisional && one.confirmedAt === null);
  const has = (when: string) => examinations.some((entry) => entry.body.when === when);
  return [
    ...(times.timeoutAt === null ? ['No time-out is recorded.'] : []),
    ...(has('before-operation') ? [] : ['No examination before the operation is recorded.']),
    ...(has('after-operation') ? [] : ['No examination after the operation is recorded.']),
    ...(conditions.some((entry) => entry.body.condition.kind === 'train-of-four') ? [] : ['No train-of-four is recorded.']),
    ...(unconfirmed.length === 0 ? [] : [`${unconfirmed.length === 1 ? 'One baseline was' : `${unconfirmed.length} baselines were`} accepted provisionally and not accepted by a physician.`]),
  ];
}

function aboutTests(course: CaseCourse): readonly string[] {
  const { plan } = course.final;
  const name = (path: { siteId: string; channelId: string }) => `${siteName(plan, path.siteId)} to ${channelName(plan, path.channelId)}`;
  const required = plan.paths.filter((path) => path.isRequired);
  const ends = course.nerves.flatMap((nerve) => nerve.paths);
  const without = required.filter((path) => (ends.find((one) => one.pathId === path.id)?.opening ?? null) === null);
  const stale = ends.filter((one) => one.isRequired && one.opening !== null && !one.isAfterLastRiskStep);
  const closing = plan.nerves.flatMap((nerve) => nerve.sites).some((site) => site.id === plan.closingSiteId);
  const isClosingTested = ends.some((one) => one.siteId === plan.closingSiteId && one.isAfterLastRiskStep && one.closing !== null);
  return [
    ...(without.length === 0 ? [] : [`No baseline: ${without.map(name).join(', ')}.`]),
    ...(stale.length === 0 ? [] : [`Not tested after the last risk step: ${stale.map(name).join(', ')}.`]),
    ...(closing && !isClosingTested && course.runs.length > 0 ? [`No closing test from ${siteName(plan, plan.closingSiteId)} after the last risk step.`] : []),
  ];
}

function aboutAlert(alert: AlertCourse): readonly string[] {
  const round = mainRound(alert);
  const missing = [
    ...(alert.rounds.some((one) => one.paintedAt !== null) ? [] : ['no wall said that it was painted']),
    ...(alert.rounds.some((one) => one.told !== null && one.kind !== 'notice') ? [] : ['not told']),
    ...(alert.rounds.some((one) => one.readBack !== null) ? [] : ['not read back']),
    ...(alert.rounds.some((one) => one.acted !== null) ? [] : ['no surgeon’s action']),
    ...(alert.rounds.filter((one) => one.kind === 'worse' && one.told === null).length === 0 ? [] : ['a worsening not told']),
  ];
  return missing.length === 0 || round === null ? [] : [`Alert ${alert.alertId}: ${missing.join(', ')}.`];
}

function aboutTalk(course: CaseCourse): readonly string[] {
  const waiting = course.talk.filter((one) => one.kind === 'advice' && one.confirmed === null);
  return waiting.length === 0 ? [] : [`${waiting.length === 1 ? 'One piece of advice was' : `${waiting.length} pieces of advice were`} not confirmed by the desk.`];
}
