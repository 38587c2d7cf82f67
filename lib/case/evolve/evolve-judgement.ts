import type { PathJudgement } from '@/lib/alert/judgement';
import type { CaseState, ComparedRecord, Incident, KeptRun, PathRecord } from '@/lib/case/case-state';
import type { CaseEntry, EntryBodies } from '@/lib/case/entry-bodies';
import { isAbnormal } from '@/lib/case/is-abnormal';
import { pathIdOf, segmentKey } from '@/lib/case/keys';
import type { Reading } from '@/lib/response/reading';

/** Numbers of abnormal runs an incident remembers. */
const keptBadSeqs = 50;

/** Copies a judgement onto its paths, segments and the open incident of each nerve. @returns the state after it @source house rule */
export function evolveJudgement(state: CaseState, entry: CaseEntry & { kind: 'run.judged' }): CaseState {
  const kept = state.runs.find((run) => run.seq === entry.body.runSeq);
  if (kept === undefined) return state;
  const paths = { ...state.paths };
  for (const judgement of entry.body.paths) {
    paths[judgement.pathId] = pathRecord(paths[judgement.pathId], judgement, kept);
  }
  const segments = { ...state.segments };
  for (const segment of entry.body.segments) {
    segments[segmentKey(segment.channelId, segment.proximalSiteId, segment.distalSiteId)] = segment;
  }
  return { ...state, paths, segments, incidents: incidentsAfter(state, entry.body, kept) };
}

function pathRecord(before: PathRecord | undefined, judgement: PathJudgement, kept: KeptRun): PathRecord {
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
  const isGood = judgement.kind === 'compared' && !isAbnormal(judgement.findings);
  const lastGoodAt = isGood && kept.at > (before?.lastGoodAt ?? '') ? kept.at : (before?.lastGoodAt ?? null);
  return { pathId: judgement.pathId, ...newest, ...comparedAfter(before, judgement, kept, reading), lastGoodAt };
}

function comparedAfter(before: PathRecord | undefined, judgement: PathJudgement, kept: KeptRun, reading: Reading) {
  const compared = before?.compared ?? null;
  const previous = before?.previous ?? null;
  if (judgement.kind === 'not-compared') return { compared, previous };
  const record: ComparedRecord = {
    seq: kept.seq,
    at: kept.at,
    reading,
    change: judgement.change,
    findings: judgement.findings,
  };
  if (compared !== null && compared.seq === kept.seq) return { compared: record, previous };
  if (previous !== null && previous.seq === kept.seq) return { compared, previous: record };
  if (compared !== null && kept.at < compared.at) return { compared, previous };
  return { compared: record, previous: compared };
}

function readingOf(kept: KeptRun, pathId: string): Reading {
  const channelId = pathId.slice(pathId.indexOf('/') + 1);
  return kept.run.readings.find((row) => row.channelId === channelId)?.reading ?? { kind: 'not-read' };
}

function incidentsAfter(state: CaseState, judged: EntryBodies['run.judged'], kept: KeptRun): CaseState['incidents'] {
  const incidents: Record<string, Incident> = { ...state.incidents };
  for (const incident of Object.values(state.incidents)) {
    const nerve = state.plan.nerves.find((candidate) => candidate.id === incident.nerveId);
    if (nerve === undefined || !nerve.sites.some((site) => site.id === kept.run.siteId)) continue;
    const badPathIds = badPathsOf(judged, kept);
    const others = incident.badSeqs.filter((seq) => seq !== kept.seq);
    const isRepeat = kept.seq > incident.firstSeq && judged.paths.some((path) => isRepeatOf(incident, path));
    incidents[incident.nerveId] = {
      ...incident,
      badSeqs: badPathIds.length > 0 ? [...others, kept.seq].slice(-keptBadSeqs) : others,
      badPathIds: [...new Set([...incident.badPathIds, ...badPathIds])],
      repeatDueAt: isRepeat ? null : incident.repeatDueAt,
    };
  }
  return incidents;
}

function badPathsOf(judged: EntryBodies['run.judged'], kept: KeptRun): readonly string[] {
  const ofPaths = judged.paths.filter((path) => path.kind === 'compared' && isAbnormal(path.findings)).map((path) => path.pathId);
  const ofSegments = judged.segments
    .filter((segment) => segment.proximalSiteId === kept.run.siteId && isAbnormal(segment.findings))
    .map((segment) => pathIdOf(kept.run.siteId, segment.channelId));
  return [...ofPaths, ...ofSegments];
}

function isRepeatOf(incident: Incident, path: PathJudgement): boolean {
  return path.kind === 'compared' && incident.pathIds.includes(path.pathId);
}
