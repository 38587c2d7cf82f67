import type { CaseState, KeptRun } from '@/lib/case/case-state';
import type { CaseEntry } from '@/lib/case/entry-bodies';

/** Runs kept of each site: enough for a baseline of five and a repeat. */
const keptRunsPerSite = 6;

/** Keeps a logged run. What it means comes with the judgement that follows it. @returns the state after it @source house rule */
export function evolveRun(state: CaseState, entry: CaseEntry & { kind: 'run.logged' }): CaseState {
  const kept: KeptRun = {
    seq: entry.seq,
    at: entry.eventAt,
    run: { ...entry.body, note: entry.body.note ?? null },
    isBeforeTimeout: state.timeoutAt === null || entry.eventAt < state.timeoutAt,
  };
  const ofSite = state.runs.filter((run) => run.run.siteId === kept.run.siteId);
  const dropped = ofSite.length >= keptRunsPerSite ? ofSite[0]?.seq : undefined;
  return { ...state, runs: [...state.runs.filter((run) => run.seq !== dropped), kept], runCount: state.runCount + 1 };
}
