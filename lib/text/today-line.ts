import type { CaseState } from '@/lib/case/case-state';
import { clockTime } from '@/lib/text/format';
import { handlingWords } from '@/lib/text/handling-words';
import { incidentHeadline } from '@/lib/text/incident-headline';
import { incidentsInOrder } from '@/lib/text/incidents-in-order';
import { pastHeadline } from '@/lib/text/past-headline';
import { stateMark, type StateMark } from '@/lib/text/state-mark';
import type { TheatreLine } from '@/lib/text/theatre-line';
import { theatreView } from '@/lib/text/theatre-view';
import type { TodayContext } from '@/lib/text/today-context';
import { connectedWords, deskWords, testedWords, waitingTasks } from '@/lib/text/today-facts';
import { todayNeed, type TodayNeed } from '@/lib/text/today-need';
import { momentOfMs } from '@/lib/units/moment-of-ms';

/** One case among several, in words. */
export interface TodayLine {
  readonly caseId: string;
  readonly place: string;
  readonly need: TodayNeed;
  /** When that need began, RFC 3339: who waits longest stands first. Empty when it is not known. */
  readonly since: string;
  readonly isLive: boolean;
  readonly mark: StateMark;
  readonly priority: TheatreLine['priority'];
  readonly isCalm: boolean;
  readonly headline: string;
  /** The finding's place and since when; while not live, the time of what is said. */
  readonly why: string;
  /** "Not told yet" or "Told 10:42"; null without an open notice or alert. */
  readonly handling: string | null;
  /** Every other statement that is not calm, each in one sentence. */
  readonly others: readonly string[];
  readonly phase: string;
  readonly tested: string;
  readonly desk: string;
  readonly people: string;
  readonly tasks: readonly string[];
}

/**
 * One case for somebody who follows several: its state as the wall says it, why, and what waits.
 *
 * Method: the words of the theatre screen, never calmer. A case that is not live speaks in the past tense, keeps the mark
 * of an alert that was open, and is never calm.
 *
 * @param state the committed case; not modified
 * @param context who looks, when, and whether the case is live; not modified
 * @returns the line
 * @source product rules: Today, not live
 * @accuracy tests/lib/text/today-line.test.ts, cases worked by hand
 * @example
 * todayLine(state, context).headline // => 'Ulnar at 36 % of baseline'
 */
export function todayLine(state: CaseState, context: TodayContext): TodayLine {
  const { nowMs, timeZone, isLive } = context;
  const { lead, others } = theatreView(state, nowMs, timeZone);
  const incidents = incidentsInOrder(state);
  const shown = incidents.find((incident) => incident.nerveId === lead.nerveId && ['alert', 'notice', 'recovered'].includes(lead.kind)) ?? null;
  const tasks = waitingTasks(state, context);
  const untold = incidents.filter((incident) => incident.level === 'alert' && incident.toldAt === null && incident.recoveredAt === null);
  const need = todayNeed({
    kinds: [lead.kind],
    hasUntoldAlert: untold.length > 0,
    isLive,
    hasMessageForViewer: tasks.messageForViewerAt !== null,
    isDeskConnected: !isLive || context.deskConnected,
    hasOpenTask: tasks.oldestTaskAt !== null,
  });
  return {
    caseId: state.caseId,
    place: state.plan.theatre,
    need,
    since: sinceOf(need, state, context, tasks),
    isLive,
    ...stateWords(lead, context),
    handling: shown === null ? null : handlingWords(shown, timeZone),
    others: others.map((line) => otherWords(state, line, context)),
    phase: phaseWords(state, timeZone),
    tested: testedWords(state, context),
    desk: deskWords(context),
    people: connectedWords(context),
    tasks: tasks.sentences,
  };
}

function stateWords(lead: TheatreLine, { isLive, nowMs, timeZone }: TodayContext): Pick<TodayLine, 'mark' | 'priority' | 'isCalm' | 'headline' | 'why'> {
  if (isLive) return { mark: stateMark(lead), priority: lead.priority, isCalm: lead.isCalm, headline: lead.headline, why: lead.detail };
  const past = { ...lead, isCalm: false };
  const time = clockTime(momentOfMs(nowMs), timeZone, { seconds: true });
  return { mark: stateMark(past), priority: lead.priority, isCalm: false, headline: pastHeadline(lead), why: `Not live. State at ${time}. It may have changed.` };
}

function otherWords(state: CaseState, line: TheatreLine, { isLive, timeZone }: TodayContext): string {
  const incident = line.nerveId === null ? undefined : state.incidents[line.nerveId];
  const isIncident = incident !== undefined && ['alert', 'notice', 'recovered'].includes(line.kind);
  const words = isIncident ? `${incident.level === 'alert' ? 'Alert' : 'Notice'}: ${incidentHeadline(state, incident)}. ${handlingWords(incident, timeZone)}` : line.headline;
  return isLive ? words : `Shown then: ${words}`;
}

function phaseWords(state: CaseState, timeZone: string): string {
  if (state.status === 'planned') return 'Planned, not opened';
  if (state.status === 'closed') return `Closed ${clockTime(state.closedAt ?? state.phaseAt, timeZone)}`;
  return `${state.phase.charAt(0).toUpperCase()}${state.phase.slice(1)} since ${clockTime(state.phaseAt, timeZone)}`;
}

function sinceOf(need: TodayNeed, state: CaseState, { nowMs, deskSince }: TodayContext, tasks: ReturnType<typeof waitingTasks>): string {
  const oldest = (times: readonly (string | null)[]) => times.filter((time) => time !== null).sort()[0] ?? state.phaseAt;
  const incidents = Object.values(state.incidents);
  switch (need) {
    case 'alert-not-told':
      return oldest(incidents.filter((one) => one.level === 'alert' && one.toldAt === null).map((one) => one.raisedAt));
    case 'alert-told':
    case 'notice':
    case 'cannot-be-judged':
      return oldest(incidents.map((one) => one.raisedAt));
    case 'not-live':
      return momentOfMs(nowMs);
    case 'message-waits':
      return oldest([tasks.messageForViewerAt]);
    case 'desk-away':
      return oldest([deskSince]);
    case 'advice-or-baseline-waits':
      return oldest([tasks.oldestTaskAt]);
    default:
      return state.phaseAt;
  }
}
