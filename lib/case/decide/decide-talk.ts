import type { CaseState } from '@/lib/case/case-state';
import type { CaseCommand, Refusal } from '@/lib/case/commands';
import { draft } from '@/lib/case/decide/draft';
import type { EntryDraft } from '@/lib/case/entry-bodies';

type TalkCommand = CaseCommand & { name: 'send-message' | 'give-advice' | 'confirm-advice' };

/** Pieces of advice that may wait for the desk at a time. House rule. */
const mostWaitingAdvice = 20;

/** Messages, advice and its confirmation by the desk. @returns drafts or a refusal @source product rule: advice that the desk confirms */
export function decideTalk(state: CaseState, command: TalkCommand): readonly EntryDraft[] | Refusal {
  if (command.name === 'send-message') return [draft('message.sent', { text: command.text })];
  const waiting = state.advice.filter((advice) => advice.confirmedAt === null);
  if (command.name === 'give-advice') {
    if (waiting.length < mostWaitingAdvice) return [draft('advice.given', { text: command.text })];
    return { code: 'advice-waits', message: `Advice waits: ${waiting.length} are not confirmed by the desk, ${mostWaitingAdvice} are allowed. Call the desk` };
  }
  const { adviceSeq, text } = command;
  if (waiting.some((advice) => advice.seq === adviceSeq)) return [draft('advice.confirmed', { adviceSeq, text })];
  return { code: 'no-advice', message: `No advice waits: entry ${adviceSeq} is no advice, or it is confirmed already` };
}
