import type { FindingKind, Location } from '@/lib/alert/judgement';
import type { AlertCause, AlertEvidence, CaseEntry, Worsening } from '@/lib/case/entry-bodies';
import type { CasePlan } from '@/lib/case/plan';
import { actionNames } from '@/lib/text/action-names';
import { clockTime, percent } from '@/lib/text/format';
import { channelName } from '@/lib/text/run-sentence';
import { siteName, siteNames } from '@/lib/text/site-name';

type AlertEntry = Extract<CaseEntry, { kind: `alert.${string}` | `notice.${string}` }>;

/** What was found, in the trade's words. Common practice. */
export const findingNames: { readonly [F in FindingKind]: string } = {
  'response-lost': 'response lost',
  'amplitude-and-onset': 'amplitude down and onset late together',
  'amplitude-fall': 'amplitude down',
  'segment-slowed': 'segment slower',
  'onset-late': 'onset late',
  'ratio-fall': 'lower proximally',
  'amplitude-watch': 'amplitude lower',
  'threshold-rise': 'more current needed',
};

/** Which way an alert got worse, in words. House rule. */
export const worseningNames: { readonly [W in Worsening]: string } = {
  lost: 'lost',
  'twenty-points': 'further down',
  'another-muscle': 'another muscle',
  'another-segment': 'another segment',
  returned: 'back after recovery',
};

/** How an alert ended. Common practice. */
export const outcomeNames = { full: 'full recovery', partial: 'partial recovery', none: 'no recovery' } as const;

/** Judged causes in the trade's words. Common practice. */
export const causeNames: { readonly [C in AlertCause]: string } = {
  surgical: 'surgical',
  position: 'position',
  tourniquet: 'tourniquet',
  physiological: 'physiological',
  anaesthetic: 'anaesthetic',
  technical: 'technical',
  undetermined: 'undetermined',
};

/**
 * One entry of a notice or an alert in a sentence, with the same action names as the buttons.
 *
 * @param entry an entry whose kind begins with notice or alert
 * @param plan the plan of the case
 * @param timeZone IANA zone of the hospital
 * @returns a sentence without a full stop
 * @source trade's own words: told, read back, action, outcome and cause (common practice)
 * @accuracy tests/lib/text/entry-sentence.test.ts
 * @example
 * alertSentence(entry, plan, 'Europe/London') // => 'Read back, ulnar'
 */
export function alertSentence(entry: AlertEntry, plan: CasePlan, timeZone: string): string {
  const nerve = nerveOf(entry.body.alertId, plan);
  const said = (words: string | null) => (words === null ? '' : `: “${words}”`);
  switch (entry.kind) {
    case 'notice.raised':
      return `Notice, ${nerve}: ${evidence(entry.body, plan, timeZone)}. Repeat at the same current`;
    case 'alert.raised':
      return `Alert, ${nerve}: ${evidence(entry.body, plan, timeZone)}. ${entry.body.isRepeated ? 'Confirmed' : 'Not repeated'}`;
    case 'alert.worsened':
      return `Alert worse, ${nerve}: ${entry.body.worsening.map((word) => worseningNames[word]).join(', ')}. ${evidence(entry.body, plan, timeZone)}`;
    case 'alert.located':
      return `Alert located, ${nerve}: ${locationWords(entry.body.location, plan)}`;
    case 'alert.recovered': {
      const now = entry.body.percentOfBaseline;
      return `Back inside its limits, ${nerve}${now === null ? '' : `: ${percent(now)} of baseline`}. Alert open until it is ended`;
    }
    case 'alert.painted':
      return `Painted on the theatre screen, ${nerve}, ${clockTime(entry.body.paintedAt, timeZone, { seconds: true })}`;
    case 'notice.settled':
      return `Notice settled, ${nerve}: run ${entry.body.runSeq} was inside the limits`;
    case 'alert.withdrawn':
      return `Alert withdrawn, ${nerve}: run ${entry.body.runSeq} was corrected`;
    case 'alert.told':
      return `${actionNames.told}, ${nerve}: ${entry.body.whom}, ${entry.body.how}: “${entry.body.words}”`;
    case 'alert.read-back':
      return `${actionNames.readBack}, ${nerve}${said(entry.body.words)}`;
    case 'alert.acted':
      return `${actionNames.acted}, ${nerve}: ${entry.body.action}`;
    case 'alert.ended': {
      const text = entry.body.text === null ? '' : `. ${entry.body.text}`;
      return `${actionNames.ended}, ${nerve}: ${outcomeNames[entry.body.outcome]}, cause ${causeNames[entry.body.cause]}${text}`;
    }
  }
}

function nerveOf(alertId: string, plan: CasePlan): string {
  const nerveId = alertId.slice(0, alertId.lastIndexOf('-'));
  const name = plan.nerves.find((nerve) => nerve.id === nerveId)?.name ?? nerveId;
  return name.charAt(0).toLowerCase() + name.slice(1);
}

function evidence(body: AlertEvidence, plan: CasePlan, timeZone: string): string {
  const paths = body.pathIds.map((pathId) => {
    const cut = pathId.indexOf('/');
    return `${channelName(plan, pathId.slice(cut + 1))} from ${siteName(plan, pathId.slice(0, cut))}`;
  });
  const amount = body.worstPercentOfBaseline === null ? '' : `, ${percent(body.worstPercentOfBaseline)} of baseline`;
  const good = body.lastGoodAt === null ? 'No good run before it' : `Last good ${clockTime(body.lastGoodAt, timeZone)}`;
  const steps = body.stepsBetween.length === 0 ? '' : `, after ${body.stepsBetween.join(', ')}`;
  const where = paths.length === 0 ? '' : `, ${paths.join(', ')}`;
  return `${findingNames[body.finding]}${amount}${where}. ${good}, first seen ${clockTime(body.firstBadAt, timeZone)}${steps}`;
}

function locationWords(location: Location, plan: CasePlan): string {
  switch (location.kind) {
    case 'segment':
      return `between ${siteNames(plan, location.proximalSiteId, location.distalSiteId)}`;
    case 'outside':
      return 'not between the tested sites';
    case 'not-known':
      return location.nextSiteId === null ? 'not known yet' : `not known yet, test ${siteName(plan, location.nextSiteId)} next`;
  }
}
