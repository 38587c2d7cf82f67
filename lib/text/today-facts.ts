import type { CaseState } from '@/lib/case/case-state';
import { clockTime, durationWords } from '@/lib/text/format';
import { lastTestAt } from '@/lib/text/last-test-at';
import type { TodayContext } from '@/lib/text/today-context';
import { msOfMoment } from '@/lib/units/ms-of-moment';

/** What waits for somebody, in words, and since when. */
export interface WaitingTasks {
  readonly sentences: readonly string[];
  /** The oldest message of another role that nobody answered; null when none waits for the viewer. */
  readonly messageForViewerAt: string | null;
  /** The oldest of unconfirmed advice and provisional baseline; null when neither waits. */
  readonly oldestTaskAt: string | null;
}

type Context = Pick<TodayContext, 'nowMs' | 'timeZone' | 'isLive' | 'viewer'>;

/**
 * What waits in a case: the oldest unanswered message, the oldest advice the desk has not confirmed, a baseline that no
 * physician accepted.
 * @returns sentences without a full stop and the times they begin at
 * @source product rule: Today
 * @accuracy whole units, cut; tests/lib/text/today-line.test.ts
 */
export function waitingTasks(state: CaseState, context: Context): WaitingTasks {
  const { viewer } = context;
  const waiting = Object.entries(state.unanswered).map(([role, { at }]) => ({ role, at }));
  const message = waiting.reduce<(typeof waiting)[number] | null>((oldest, one) => (oldest === null || one.at < oldest.at ? one : oldest), null);
  const adviceAt = state.advice.filter((one) => one.confirmedAt === null).map((one) => one.at).sort()[0] ?? null;
  const baselineAt = provisionalBaselineAt(state);
  const sentences = [
    message === null ? null : `${message.role === viewer.role ? 'Your message' : `Message of the ${message.role}`} not answered ${forWords(message.at, context)}`,
    adviceAt === null ? null : `Advice not confirmed by the desk ${forWords(adviceAt, context)}`,
    baselineAt === null ? null : `Baseline of ${clockTime(baselineAt, context.timeZone)} provisional, ${viewer.role === 'physician' ? 'waits for you' : 'waits for the physician'}`,
  ];
  return {
    sentences: sentences.filter((sentence) => sentence !== null),
    messageForViewerAt: waiting.filter(({ role }) => role !== viewer.role).map(({ at }) => at).sort()[0] ?? null,
    oldestTaskAt: [adviceAt, baselineAt].filter((at) => at !== null).sort()[0] ?? null,
  };
}

/** The oldest working baseline that no physician has accepted. @returns its time as RFC 3339, or null when none waits @source product rule */
function provisionalBaselineAt(state: CaseState): string | null {
  return Object.values(state.baselines).filter((baseline) => baseline.isProvisional).map((baseline) => baseline.at).sort()[0] ?? null;
}

/** How old the last test is. @returns "Last test 19 s ago"; while not live its time, because an age would claim to know @source product rule: "tested" speaks of the nerve */
export function testedWords(state: CaseState, { nowMs, timeZone, isLive }: Context): string {
  const at = lastTestAt(state);
  if (at === null) return 'Not tested yet';
  return isLive ? `Last test ${durationWords(nowMs - msOfMoment(at))} ago` : `Last test known ${clockTime(at, timeZone, { seconds: true })}`;
}

/** Whether somebody sits at the desk. @returns a sentence without a full stop; "not known" while not live @source product rule */
export function deskWords({ deskConnected, deskSince, timeZone, isLive }: Pick<TodayContext, 'deskConnected' | 'deskSince' | 'timeZone' | 'isLive'>): string {
  if (!isLive) return 'Desk not known';
  const words = deskConnected ? 'Desk connected' : 'Desk not connected';
  return deskSince === null ? words : `${words} since ${clockTime(deskSince, timeZone)}`;
}

/**
 * Who has the case open besides the one who looks and the one at the desk, of whom `deskWords` speaks.
 * @returns "Surgeon, supervising physician connected" without a full stop
 * @source product rule: presence is shown
 * @accuracy exact; tests/lib/text/today-line.test.ts
 */
export function connectedWords({ peopleConnected, deskConnected, viewer, isLive }: Pick<TodayContext, 'peopleConnected' | 'deskConnected' | 'viewer' | 'isLive'>): string {
  if (!isLive) return 'Who is connected not known';
  const others = new Map(peopleConnected.filter(({ personId }) => personId !== viewer.personId).map((person) => [person.personId, person]));
  const atDesk = deskConnected ? [...others.values()].find(({ role }) => role === 'neurophysiologist') : undefined;
  const names = [...others.values()].filter((person) => person !== atDesk).map(({ displayName }) => displayName);
  return names.length === 0 ? 'Nobody else connected' : `${names.join(', ')} connected`;
}

function forWords(at: string, { nowMs, timeZone, isLive }: Context): string {
  return isLive ? `for ${durationWords(nowMs - msOfMoment(at))}` : `then, since ${clockTime(at, timeZone)}`;
}
