import { cannotBeJudged } from '@/lib/case/cannot-be-judged';
import type { CaseState } from '@/lib/case/case-state';
import { nerveStatus } from '@/lib/case/nerve-status';
import { clockTime, durationWords } from '@/lib/text/format';
import { incidentLine } from '@/lib/text/incident-line';
import { nerveStatusLine } from '@/lib/text/nerve-status-line';
import { theatreFooter } from '@/lib/text/theatre-footer';
import type { TheatreKind, TheatreLine, TheatreView } from '@/lib/text/theatre-line';
import { msOfMoment } from '@/lib/units/ms-of-moment';

/** A withdrawn alert is named this long. Product rule: 60 s. */
const withdrawnShownMs = 60_000;
/** Without a train-of-four for this long a total loss is high. Product rule: 60 s. */
const trainNeededWithinMs = 60_000;

/** Worst first. Inside one rank the order of the nerves in the plan stays. */
const rank: readonly TheatreKind[] = [
  'closed', 'alert', 'cannot-be-judged', 'notice', 'recovered', 'withdrawn', 'set-up', 'take-down', 'paused', 'no-baseline',
  'tourniquet-up', 'not-compared', 'not-monitorable', 'watch', 'not-tested', 'improved', 'stable',
];

/**
 * The theatre screen in words, from the state of the case and the time alone.
 *
 * Method: every statement that holds, the worst first. An open alert leads whatever the phase. Calm is only said when
 * every nerve at risk earned it; otherwise the first nerve that did not is named. In take-down nothing is judged any
 * more: besides what is still open it says only that monitoring ended.
 *
 * @param state the case
 * @param nowMs ms since 1970, the server's clock
 * @param timeZone IANA zone of the hospital
 * @returns lead, other statements that are not calm, and short facts
 * @source product rules: theatre states, stable must be earned, an open alert stays
 * @accuracy tests/lib/text/theatre-view.test.ts; recomputed independently by fast-check
 * @example
 * theatreView(state, nowMs, 'Europe/London').lead.headline // => 'Stable'
 */
export function theatreView(state: CaseState, nowMs: number, timeZone: string): TheatreView {
  const footer = theatreFooter(state, nowMs, timeZone);
  const lines = theatreLines(state, nowMs, timeZone).sort((first, second) => rank.indexOf(first.kind) - rank.indexOf(second.kind));
  const [lead, ...rest] = lines;
  if (lead === undefined) return { lead: plain('set-up', 'Set-up', 'No nerve in the plan yet.'), others: [], footer };
  if (lead.kind === 'closed') return { lead, others: [], footer: [] };
  return { lead, others: rest.filter((line) => !line.isCalm), footer };
}

function plain(kind: TheatreKind, headline: string, detail: string, priority: TheatreLine['priority'] = null): TheatreLine {
  return { kind, priority, isCalm: false, isFlashing: false, nerveId: null, headline, detail };
}

function theatreLines(state: CaseState, nowMs: number, timeZone: string): TheatreLine[] {
  if (state.status === 'closed') {
    return [plain('closed', `Case closed ${clockTime(state.closedAt ?? state.phaseAt, timeZone)}`, 'Not monitored.')];
  }
  const incidents = Object.values(state.incidents);
  const lines = incidents.map((incident) => incidentLine(state, incident, timeZone));
  if (state.status === 'planned') return [...lines, plain('set-up', 'Set-up', 'Case not opened yet. Not monitored.')];
  lines.push(...withdrawnLines(state, nowMs));
  const phase = phaseLine(state, timeZone);
  // Monitoring is over: nothing is asked for any more. What is still open stays until the desk ends it.
  if (phase?.kind === 'take-down') return [...lines, phase];
  lines.push(...judgeLines(state, nowMs, timeZone), ...cuffLines(state, nowMs));
  if (phase !== null) return [...lines, phase];
  return [...lines, ...nerveLines(state, nowMs, timeZone)];
}

function phaseLine(state: CaseState, timeZone: string): TheatreLine | null {
  const since = clockTime(state.phaseAt, timeZone);
  switch (state.phase) {
    case 'set-up':
      return plain('set-up', 'Set-up', `Since ${since}. Not monitored yet.`);
    case 'paused':
      return plain('paused', 'Paused', `${state.phaseReason ?? 'Reason not given'}, since ${since}. Not monitored.`);
    case 'take-down':
      return plain('take-down', 'Take-down', `Monitoring ended ${since}. Not monitored.`);
    case 'baseline':
    case 'monitoring':
      return null;
  }
}

/** Every nerve at risk without an open change; one that is back inside its limits has to be tested on like the others. */
function nerveLines(state: CaseState, nowMs: number, timeZone: string): readonly TheatreLine[] {
  const quiet = state.plan.nerves.filter((nerve) => {
    const incident = state.incidents[nerve.id];
    return nerve.role === 'at-risk' && (incident === undefined || incident.recoveredAt !== null);
  });
  return quiet.map((nerve) => nerveStatusLine(state, nerveStatus(state, nerve, nowMs), nowMs, timeZone));
}

function withdrawnLines(state: CaseState, nowMs: number): readonly TheatreLine[] {
  return state.withdrawn
    .filter((alert) => nowMs - msOfMoment(alert.at) < withdrawnShownMs)
    .map((alert) => {
      const name = state.plan.nerves.find((nerve) => nerve.id === alert.nerveId)?.name ?? alert.nerveId;
      return { ...plain('withdrawn', `${name} alert withdrawn`, 'Entry corrected.', 'low'), nerveId: alert.nerveId };
    });
}

function judgeLines(state: CaseState, nowMs: number, timeZone: string): readonly TheatreLine[] {
  const lost = cannotBeJudged(state);
  if (lost === null) return [];
  const isMeasured = lost.trainOfFourAt !== null && lost.trainOfFourAt >= lost.since;
  const isOverdue = !isMeasured && nowMs - msOfMoment(lost.since) > trainNeededWithinMs;
  const detail = isMeasured
    ? `Control lost too since ${clockTime(lost.since, timeZone)}.`
    : 'Control lost too. Train-of-four needed.';
  return [plain('cannot-be-judged', 'Muscle responses cannot be judged', detail, isOverdue ? 'high' : 'medium')];
}

function cuffLines(state: CaseState, nowMs: number): readonly TheatreLine[] {
  const kept = state.conditions['tourniquet'];
  if (kept?.condition.kind !== 'tourniquet' || !kept.condition.isUp) return [];
  const minutes = durationWords(nowMs - msOfMoment(kept.at));
  return [plain('tourniquet-up', `Tourniquet up ${minutes}`, 'The cuff alone can weaken responses.', 'low')];
}
