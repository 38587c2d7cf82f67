import type { CaseState, PathRecord } from '@/lib/case/case-state';
import type { CaseEntry } from '@/lib/case/entry-bodies';

/** Replaces or withdraws a run: its judgements go, baselines that used it are marked. @returns the state after it @source house rule */
export function evolveCorrection(state: CaseState, entry: CaseEntry & { kind: 'run.corrected' }): CaseState {
  const { runSeq, run } = entry.body;
  const runs =
    run === null
      ? state.runs.filter((kept) => kept.seq !== runSeq)
      : state.runs.map((kept) => (kept.seq === runSeq ? { ...kept, run: { ...run, note: run.note ?? null } } : kept));
  const paths = Object.fromEntries(Object.entries(state.paths).map(([id, record]) => [id, without(record, runSeq)]));
  const baselines = Object.fromEntries(
    Object.entries(state.baselines).map(([key, baseline]) => [
      key,
      baseline.runSeqs.includes(runSeq) ? { ...baseline, isMarkedByCorrection: true } : baseline,
    ]),
  );
  const incidents = Object.fromEntries(
    Object.entries(state.incidents).map(([id, incident]) => [
      id,
      { ...incident, badSeqs: incident.badSeqs.filter((seq) => seq !== runSeq) },
    ]),
  );
  return { ...state, runs, paths, baselines, incidents };
}

function without(record: PathRecord, runSeq: number): PathRecord {
  if (record.compared?.seq === runSeq) return { ...record, compared: record.previous, previous: null };
  if (record.previous?.seq === runSeq) return { ...record, previous: null };
  return record;
}
