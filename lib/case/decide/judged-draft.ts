import { judgeVersion } from '@/lib/alert/judgement';
import type { CaseState } from '@/lib/case/case-state';
import { draft } from '@/lib/case/decide/draft';
import type { EntryDraft } from '@/lib/case/entry-bodies';
import { judgeInCase } from '@/lib/case/judge-in-case';

/** The judgement of a kept run as an entry. @returns null when the run is no longer kept @source house rule */
export function judgedDraft(state: CaseState, runSeq: number): EntryDraft | null {
  const kept = state.runs.find((run) => run.seq === runSeq);
  if (kept === undefined) return null;
  const { paths, segments } = judgeInCase(state, { at: kept.at, run: kept.run });
  return draft('run.judged', { runSeq, judgeVersion, paths, segments });
}
