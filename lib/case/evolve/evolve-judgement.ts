import type { PathJudgement } from '@/lib/alert/judgement';
import type { CaseState, ComparedRecord, KeptRun, PathRecord } from '@/lib/case/case-state';
import type { CaseEntry } from '@/lib/case/entry-bodies';
import { incidentsAfter } from '@/lib/case/evolve/incidents-after';
import { isAbnormal } from '@/lib/case/is-abnormal';
import { baselineKey, channelOfPath, segmentKey } from '@/lib/case/keys';
import type { Reading } from '@/lib/response/reading';

/**
 * Copies a judgement onto its paths, segments and the open incident of each nerve. A channel that nobody looked at
 * says nothing: what its path showed before stays.
 * @param state the case with the run
 * @param entry the judgement
 * @returns the state after it
 * @source house rule
 */
export function evolveJudgement(state: CaseState, entry: CaseEntry & { kind: 'run.judged' }): CaseState {
  const kept = state.runs.find((run) => run.seq === entry.body.runSeq);
  if (kept === undefined) return state;
  const paths = { ...state.paths };
  for (const judgement of entry.body.paths) {
    if (judgement.kind === 'not-compared' && judgement.reason === 'not-read') continue;
    paths[judgement.pathId] = pathRecord(state, judgement, kept);
  }
  const segments = { ...state.segments };
  for (const segment of entry.body.segments) {
    const key = segmentKey(segment.channelId, segment.proximalSiteId, segment.distalSiteId);
    const before = segments[key];
    const isOlder = before !== undefined && (before.proximalAt > segment.proximalAt || before.distalAt > segment.distalAt);
    if (!isOlder) segments[key] = segment;
  }
  const judged = { ...state, paths, segments };
  return { ...judged, incidents: incidentsAfter(judged, entry.body, kept) };
}

function pathRecord(state: CaseState, judgement: PathJudgement, kept: KeptRun): PathRecord {
  const before = state.paths[judgement.pathId];
  const reading = readingOf(kept, judgement.pathId);
  const isNewest = before === undefined || kept.at >= before.lastAt;
  const newest = isNewest
    ? {
        lastSeq: kept.seq,
        lastAt: kept.at,
        lastReading: reading,
        lastIntensityMa: kept.run.intensityMa,
        lastNotCompared: judgement.kind === 'not-compared' ? judgement.reason : null,
      }
    : {
        lastSeq: before.lastSeq,
        lastAt: before.lastAt,
        lastReading: before.lastReading,
        lastIntensityMa: before.lastIntensityMa,
        lastNotCompared: before.lastNotCompared,
      };
  const isGood = judgement.kind === 'compared' && judgement.change.percentOfBaseline !== null && !isAbnormal(judgement.findings);
  const lastGoodAt = isGood && kept.at > (before?.lastGoodAt ?? '') ? kept.at : (before?.lastGoodAt ?? null);
  const compared = comparedAfter(before, isOfOlderBaseline(state, judgement.pathId, kept) ? null : judgement, kept, reading);
  return { pathId: judgement.pathId, ...newest, ...compared, lastGoodAt };
}

/** What a late run shows against a baseline that has been moved since is no test against the one of now. */
function isOfOlderBaseline(state: CaseState, pathId: string, { at, run }: KeptRun): boolean {
  const working = state.baselines[baselineKey(pathId, run.electrodeId, run.family)];
  return working !== undefined && at <= working.at;
}

function comparedAfter(before: PathRecord | undefined, judgement: PathJudgement | null, kept: KeptRun, reading: Reading) {
  const compared = before?.compared ?? null;
  const previous = before?.previous ?? null;
  if (judgement === null || judgement.kind === 'not-compared') return { compared, previous };
  const record: ComparedRecord = {
    seq: kept.seq,
    at: kept.at,
    reading,
    change: judgement.change,
    findings: judgement.findings,
  };
  if (compared !== null && compared.seq === kept.seq) return { compared: record, previous };
  if (compared === null || kept.at >= compared.at) return { compared: record, previous: compared };
  // A late entry takes its place before the newest run, where it counts for recovery.
  return { compared, previous: previous === null || previous.seq === kept.seq || kept.at >= previous.at ? record : previous };
}

function readingOf(kept: KeptRun, pathId: string): Reading {
  return kept.run.readings.find((row) => row.channelId === channelOfPath(pathId))?.reading ?? { kind: 'not-read' };
}
