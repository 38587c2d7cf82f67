import type { CaseState, Incident } from '@/lib/case/case-state';
import type { CaseCommand, Refusal } from '@/lib/case/commands';
import type { DecideContext } from '@/lib/case/decide/decide-context';
import { draft } from '@/lib/case/decide/draft';
import { judgeVersion } from '@/lib/alert/judgement';
import type { EntryDraft } from '@/lib/case/entry-bodies';
import { isRepeatOverdue } from '@/lib/case/is-repeat-overdue';
import { msOfMoment } from '@/lib/units/ms-of-moment';

type AlertCommand = CaseCommand & {
  name: 'tell-alert' | 'read-back-alert' | 'act-on-alert' | 'end-alert' | 'miss-repeat' | 'note-painted';
};

/** Told, read back, surgeon's action, end, and the repeat that did not come. @returns drafts or a refusal @source product rule: handling */
export function decideAlert(state: CaseState, command: AlertCommand, context: DecideContext): readonly EntryDraft[] | Refusal {
  const incident = Object.values(state.incidents).find((open) => open.alertId === command.alertId);
  if (incident === undefined) {
    return { code: 'alert-not-open', message: `Alert not open: ${command.alertId} is unknown or has ended` };
  }
  switch (command.name) {
    case 'tell-alert': {
      const { alertId, whom, how, words } = command;
      return [draft('alert.told', { alertId, whom, how, words })];
    }
    case 'read-back-alert':
      if (incident.toldAt === null) {
        return { code: 'not-told', message: 'Not told yet: log that the surgeon was told before the read-back' };
      }
      return [draft('alert.read-back', { alertId: command.alertId, words: command.words })];
    case 'act-on-alert':
      return [draft('alert.acted', { alertId: command.alertId, action: command.action })];
    case 'end-alert':
      return [draft('alert.ended', { alertId: command.alertId, outcome: command.outcome, cause: command.cause, text: command.text })];
    case 'note-painted': {
      const { alertId, entrySeq, screenId, paintedAt } = command;
      // The first wall that shows it counts, and only for the newest word of the alert.
      const isNews = entrySeq >= incident.raisedSeq && incident.paintedAt === null;
      return isNews ? [draft('alert.painted', { alertId, entrySeq, screenId, paintedAt })] : [];
    }
    case 'miss-repeat':
      return missRepeat(state, incident, context);
  }
}

function missRepeat(state: CaseState, incident: Incident, context: DecideContext): readonly EntryDraft[] | Refusal {
  if (incident.level !== 'notice' || incident.repeatDueAt === null) {
    return { code: 'repeat-not-due', message: 'Repeat not due: the notice was repeated or is an alert already' };
  }
  if (context.nowMs < msOfMoment(incident.repeatDueAt)) {
    return { code: 'repeat-not-due', message: `Repeat not due before ${incident.repeatDueAt}` };
  }
  if (!isRepeatOverdue(state, incident, context.nowMs)) {
    return { code: 'repeat-not-due', message: 'Repeat not due: a newer run of the same path is known' };
  }
  const { alertId, nerveId, firstSeq, pathIds, finding, worstPercentOfBaseline, location } = incident;
  const { lastGoodAt, firstBadAt, stepsBetween } = incident;
  const evidence = { alertId, nerveId, runSeq: firstSeq, pathIds, finding, worstPercentOfBaseline, location };
  return [draft('alert.raised', { ...evidence, lastGoodAt, firstBadAt, stepsBetween, judgeVersion, isRepeated: false })];
}
