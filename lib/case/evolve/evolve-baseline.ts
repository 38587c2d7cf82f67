import type { Baseline, CaseState, PathRecord } from '@/lib/case/case-state';
import type { CaseEntry } from '@/lib/case/entry-bodies';
import { baselineKey } from '@/lib/case/keys';

/**
 * Makes the accepted values the working baseline of their paths; the first one of a path is its opening baseline.
 * What was compared with an older baseline is not carried over: calm has to be earned against the new one.
 * @returns the state after it
 * @source product rule: opening baseline is kept for ever
 */
export function evolveBaseline(state: CaseState, entry: CaseEntry & { kind: 'baseline.accepted' | 'baseline.confirmed' }): CaseState {
  if (entry.kind === 'baseline.confirmed') return confirmed(state, entry.body.baselineSeq);
  const { family, electrodeId, setAfterPercent, isProvisional, values } = entry.body;
  const baselines = { ...state.baselines };
  const openingBaselines = { ...state.openingBaselines };
  const paths: Record<string, PathRecord> = { ...state.paths };
  for (const value of values) {
    const key = baselineKey(value.pathId, electrodeId, family);
    const baseline: Baseline = { ...value, key, electrodeId, family, seq: entry.seq, setAfterPercent, isProvisional, isMarkedByCorrection: false };
    baselines[key] = baseline;
    openingBaselines[key] ??= baseline;
    const record = paths[value.pathId];
    const isOpenIncident = Object.values(state.incidents).some((incident) => incident.pathIds.includes(value.pathId));
    if (record !== undefined && !isOpenIncident) {
      paths[value.pathId] = { ...record, compared: null, previous: null, lastNotCompared: null, lastGoodAt: value.at };
    }
  }
  return { ...state, baselines, openingBaselines, paths };
}

function confirmed(state: CaseState, baselineSeq: number): CaseState {
  const confirm = (baselines: CaseState['baselines']) =>
    Object.fromEntries(Object.entries(baselines).map(([key, one]) => [key, one.seq === baselineSeq ? { ...one, isProvisional: false } : one]));
  return { ...state, baselines: confirm(state.baselines), openingBaselines: confirm(state.openingBaselines) };
}
