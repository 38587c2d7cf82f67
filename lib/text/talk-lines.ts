import type { CaseEntry } from '@/lib/case/entry-bodies';
import { clockTime } from '@/lib/text/format';

/** One message or one piece of advice. */
export interface TalkLine {
  readonly key: string;
  readonly at: string;
  readonly who: string;
  readonly text: string;
  readonly isAdvice: boolean;
  /** True while it waits in its author's browser. */
  readonly isWaiting: boolean;
  readonly confirmedAt: string | null;
  /** What the desk wrote when it confirmed. */
  readonly confirmedWith: string | null;
}

/**
 * Messages and advice as one thread, oldest first; a confirmation stands with its advice.
 * @param committed entries of the log, oldest first; not modified
 * @param waiting the reader's own entries that are not committed; not modified
 * @returns a new array, what waits last
 * @source product rule: advice that the desk confirms
 * @accuracy exact; tests/lib/text/talk-lines.test.ts
 * @example
 * talkLines(entries, []).at(-1)?.text // => 'Agree'
 */
export function talkLines(committed: readonly CaseEntry[], waiting: readonly CaseEntry[]): readonly TalkLine[] {
  const confirmed = new Map(committed.flatMap((entry) => (entry.kind === 'advice.confirmed' ? [[entry.body.adviceSeq, entry] as const] : [])));
  const lineOf = (entry: CaseEntry, isWaiting: boolean): TalkLine[] => {
    if (entry.kind !== 'message.sent' && entry.kind !== 'advice.given') return [];
    const answer = isWaiting ? undefined : confirmed.get(entry.seq);
    return [
      {
        key: isWaiting ? `${entry.commandId} ${entry.seq}` : String(entry.seq),
        at: entry.eventAt,
        who: entry.author.displayName,
        text: entry.body.text,
        isAdvice: entry.kind === 'advice.given',
        isWaiting,
        confirmedAt: answer?.eventAt ?? null,
        confirmedWith: answer?.body.text ?? null,
      },
    ];
  };
  return [...committed.flatMap((entry) => lineOf(entry, false)), ...waiting.flatMap((entry) => lineOf(entry, true))];
}

/**
 * What stands under a line: that it waits in this browser, or how the desk took the advice.
 * @param timeZone IANA zone of the theatre
 * @returns a sentence without a full stop; empty for a message that was sent
 * @source house rule
 */
export function talkNote({ isAdvice, isWaiting, confirmedAt, confirmedWith }: TalkLine, timeZone: string): string {
  if (isWaiting) return 'Waits in this browser, not sent yet';
  if (!isAdvice) return '';
  if (confirmedAt === null) return 'Not confirmed by the desk yet';
  return `Confirmed by the desk ${clockTime(confirmedAt, timeZone)}${confirmedWith === null ? '' : `: ${confirmedWith}`}`;
}
