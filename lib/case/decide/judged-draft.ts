import { judgeVersion } from '@/lib/alert/judgement';
import type { CaseState } from '@/lib/case/case-state';
import type { EntryBodies, EntryDraft } from '@/lib/case/entry-bodies';
import { draft } from '@/lib/case/decide/draft';
import { judgeInCase } from '@/lib/case/judge-in-case';

/** The judgement of a run: its body for what follows from it, and the entry. */
export interface Judged {
  readonly body: EntryBodies['run.judged'];
  readonly entry: EntryDraft;
}

/**
 * The judgement of a kept run as an entry.
 * @param state the case with the run
 * @param runSeq number of its entry
 * @returns body and draft; null when the run is no longer kept
 * @source house rule
 */
export function judgedDraft(state: CaseState, runSeq: number): Judged | null {
  const kept = state.runs.find((run) => run.seq === runSeq);
  if (kept === undefined) return null;
  const { paths, segments } = judgeInCase(state, { at: kept.at, run: kept.run });
  const body = { runSeq, judgeVersion, paths, segments };
  return { body, entry: draft('run.judged', body) };
}
