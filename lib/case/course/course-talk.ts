import { lateMsOf } from '@/lib/case/course/late-after-ms';
import type { CaseEntry } from '@/lib/case/entry-bodies';

/** A message, or advice of the physician with its confirmation by the desk. */
export interface CourseTalk {
  readonly seq: number;
  readonly at: string;
  readonly lateMs: number | null;
  readonly kind: 'message' | 'advice';
  readonly byRole: string;
  readonly text: string;
  /** Of advice: when the desk confirmed it and what it wrote; null while it waits. */
  readonly confirmed: { readonly at: string; readonly text: string | null } | null;
}

/**
 * Everything that was written between the people of the case.
 * @param entries readable entries in the order of the log; not modified
 * @returns messages and advice in the order of the log
 * @source house rule
 * @accuracy exact; tests/lib/case/course/case-course.test.ts
 * @example
 * courseTalk(entries).filter((one) => one.kind === 'advice')
 */
export function courseTalk(entries: readonly CaseEntry[]): readonly CourseTalk[] {
  const confirmations = new Map<number, CourseTalk['confirmed']>();
  for (const entry of entries) {
    if (entry.kind !== 'advice.confirmed' || confirmations.has(entry.body.adviceSeq)) continue;
    confirmations.set(entry.body.adviceSeq, { at: entry.eventAt, text: entry.body.text });
  }
  return entries.flatMap((entry) => {
    if (entry.kind !== 'message.sent' && entry.kind !== 'advice.given') return [];
    const kind = entry.kind === 'message.sent' ? 'message' : 'advice';
    const { seq, eventAt: at, author, body } = entry;
    return [{ seq, at, lateMs: lateMsOf(entry), kind, byRole: author.role, text: body.text, confirmed: confirmations.get(seq) ?? null }] as const;
  });
}
