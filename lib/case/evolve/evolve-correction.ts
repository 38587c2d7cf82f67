import type { Baseline, CaseState, KeptRun, PathRecord } from '@/lib/case/case-state';
import type { CaseEntry } from '@/lib/case/entry-bodies';
import { isAbnormal } from '@/lib/case/is-abnormal';
import { isEndOfSegment } from '@/lib/case/is-end-of-segment';
import { isTestOfIncident } from '@/lib/case/is-test-of-incident';

/**
 * Replaces or withdraws a run: its judgements and the segments computed from it go, baselines that used it are marked.
 * A corrected run is judged again by the entry that follows; only a withdrawn one is no evidence any more.
 * @param state the case
 * @param entry the correction
 * @returns the state after it
 * @source house rule
 */
export function evolveCorrection(state: CaseState, entry: CaseEntry & { kind: 'run.corrected' }): CaseState {
  const { runSeq, run } = entry.body;
  const gone = state.runs.find((kept) => kept.seq === runSeq);
  const runs =
    run === null
      ? state.runs.filter((kept) => kept.seq !== runSeq)
      : state.runs.map((kept) => (kept.seq === runSeq ? { ...kept, run: { ...run, note: run.note ?? null } } : kept));
  const marked = {
    baselines: mapValues(state.baselines, (baseline) => markedBaseline(baseline, runSeq)),
    openingBaselines: mapValues(state.openingBaselines, (baseline) => markedBaseline(baseline, runSeq)),
  };
  if (gone === undefined) return { ...state, runs, ...marked };
  const paths = mapValues(state.paths, (record) => without(record, gone));
  const segments = mapValues(state.segments, (segment) => (isEndOfSegment(segment, gone) ? null : segment));
  const incidents = mapValues(state.incidents, (incident) => ({
    ...incident,
    badSeqs: run === null ? incident.badSeqs.filter((seq) => seq !== runSeq) : incident.badSeqs,
    // A recovery that rested on the run has to be shown again.
    recoveredAt: isTestOfIncident(state, incident, runSeq) ? null : incident.recoveredAt,
  }));
  return { ...state, runs, ...marked, paths, segments, incidents };
}

/** The record with every value changed; what becomes null is left out. */
function mapValues<T>(record: Readonly<Record<string, T>>, change: (value: T) => T | null): Record<string, T> {
  return Object.fromEntries(
    Object.entries(record).flatMap(([key, value]) => {
      const changed = change(value);
      return changed === null ? [] : [[key, changed]];
    }),
  );
}

function markedBaseline(baseline: Baseline, runSeq: number): Baseline {
  return baseline.runSeqs.includes(runSeq) ? { ...baseline, isMarkedByCorrection: true } : baseline;
}

/** A path without one of its runs: the run before it stands again, or nothing was tested. */
function without(record: PathRecord, gone: KeptRun): PathRecord | null {
  const [compared = null, previous = null] = [record.compared, record.previous].filter((kept) => kept !== null && kept.seq !== gone.seq);
  const good = [compared, previous].find((kept) => kept !== null && kept.change.percentOfBaseline !== null && !isAbnormal(kept.findings));
  const lastGoodAt = record.lastGoodAt === gone.at ? (good?.at ?? null) : record.lastGoodAt;
  const kept = { ...record, compared, previous, lastGoodAt };
  if (record.lastSeq !== gone.seq) return kept;
  if (compared === null) return null;
  return { ...kept, lastSeq: compared.seq, lastAt: compared.at, lastReading: compared.reading, lastNotCompared: null };
}
