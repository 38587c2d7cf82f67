import type { CaseState, KeptAdvice } from '@/lib/case/case-state';
import type { CaseEntry } from '@/lib/case/entry-bodies';

type TalkEntry = CaseEntry & { kind: 'message.sent' | 'advice.given' | 'advice.confirmed' };

/** Confirmed advice that the state remembers. */
const keptConfirmed = 5;

/** Keeps what waits for an answer: advice for the desk, and the oldest message of each role. @returns the state after it @source house rule */
export function evolveTalk(state: CaseState, entry: TalkEntry): CaseState {
  const answered = { ...state, unanswered: unansweredAfter(state, entry) };
  if (entry.kind === 'message.sent') return answered;
  if (entry.kind === 'advice.given') {
    const given: KeptAdvice = { seq: entry.seq, at: entry.eventAt, text: entry.body.text, byRole: entry.author.role, confirmedAt: null };
    return { ...answered, advice: kept([...state.advice, given]) };
  }
  const { adviceSeq } = entry.body;
  return { ...answered, advice: kept(state.advice.map((one) => (one.seq === adviceSeq ? { ...one, confirmedAt: entry.eventAt } : one))) };
}

function kept(advice: readonly KeptAdvice[]): readonly KeptAdvice[] {
  const confirmed = advice.filter((one) => one.confirmedAt !== null).slice(-keptConfirmed);
  return advice.filter((one) => one.confirmedAt === null || confirmed.includes(one));
}

/** Whoever writes answers every other role; a message waits from its own time on. */
function unansweredAfter(state: CaseState, entry: TalkEntry): CaseState['unanswered'] {
  const { role } = entry.author;
  const own = state.unanswered[role] ?? (entry.kind === 'message.sent' ? { seq: entry.seq, at: entry.eventAt } : undefined);
  return own === undefined ? {} : { [role]: own };
}
