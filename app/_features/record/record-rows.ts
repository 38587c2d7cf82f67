import type { EntryKind } from '@/lib/case/entry-bodies';
import type { CasePlan } from '@/lib/case/plan';
import { upcast } from '@/lib/case/upcast';
import type { WireEntry } from '@/lib/contracts/http/replies';
import { entrySentence } from '@/lib/text/entry-sentence';

/** Kinds of entries as a reader looks for them. */
export type EntryGroup = 'runs' | 'baselines' | 'alerts' | 'steps' | 'conditions' | 'corrections' | 'messages' | 'case';

const groups: { readonly [K in EntryKind]: EntryGroup } = {
  'case.planned': 'case',
  'team.assigned': 'case',
  'plan.revised': 'case',
  'case.opened': 'case',
  'timeout.confirmed': 'case',
  'phase.changed': 'case',
  'case.closed': 'case',
  'run.logged': 'runs',
  'run.judged': 'runs',
  'run.corrected': 'corrections',
  'baseline.accepted': 'baselines',
  'baseline.confirmed': 'baselines',
  'examination.recorded': 'case',
  'condition.logged': 'conditions',
  'step.logged': 'steps',
  'distances.measured': 'steps',
  'notice.raised': 'alerts',
  'notice.settled': 'alerts',
  'alert.raised': 'alerts',
  'alert.worsened': 'alerts',
  'alert.located': 'alerts',
  'alert.recovered': 'alerts',
  'alert.withdrawn': 'alerts',
  'alert.told': 'alerts',
  'alert.read-back': 'alerts',
  'alert.acted': 'alerts',
  'alert.ended': 'alerts',
  'alert.painted': 'alerts',
  'advice.given': 'messages',
  'advice.confirmed': 'messages',
  'message.sent': 'messages',
};

/** An entry as the record shows it. */
export interface RecordRow {
  readonly seq: number;
  readonly eventAt: string;
  readonly recordedAt: string;
  readonly group: EntryGroup;
  readonly mark: 'alert' | 'notice' | null;
  readonly sentence: string;
  readonly author: string;
  readonly hash: string;
  /** Number of the entry that corrected this one; null when none did. */
  readonly correctedBy: number | null;
}

/** Every entry with its sentence, oldest first; a corrected run names its correction and stays. */
export function recordRows(entries: readonly WireEntry[], plan: CasePlan, timeZone: string): readonly RecordRow[] {
  const known = entries.map(upcast).filter((entry) => entry !== null);
  const corrections = new Map<number, number>();
  for (const entry of known) if (entry.kind === 'run.corrected') corrections.set(entry.body.runSeq, entry.seq);
  return known.map((entry, index) => ({
    seq: entry.seq,
    eventAt: entry.eventAt,
    recordedAt: entry.recordedAt,
    group: groups[entry.kind],
    mark: entry.kind === 'alert.raised' || entry.kind === 'alert.worsened' ? 'alert' : entry.kind === 'notice.raised' ? 'notice' : null,
    sentence: entrySentence(entry, plan, timeZone),
    author: entry.author.displayName === '' ? entry.author.role : entry.author.displayName,
    hash: entries[index]?.hash ?? '',
    correctedBy: corrections.get(entry.seq) ?? null,
  }));
}
