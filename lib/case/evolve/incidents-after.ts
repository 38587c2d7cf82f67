import type { PathJudgement } from '@/lib/alert/judgement';
import type { BadSegment, CaseState, Incident, KeptRun } from '@/lib/case/case-state';
import type { EntryBodies } from '@/lib/case/entry-bodies';
import { badSegmentsOf } from '@/lib/case/evolve/bad-segments-of';
import { isAbnormal } from '@/lib/case/is-abnormal';
import { isSince } from '@/lib/case/is-since';
import { pathIdOf, segmentKey } from '@/lib/case/keys';

/** Numbers of abnormal runs an incident remembers. */
const keptBadSeqs = 50;

/**
 * The open notices and alerts after a judged run: which runs, paths and segments were past a limit, and whether the
 * repeat has come.
 * @param state the case with the run's judgement on its paths and segments
 * @param judged the judgement
 * @param kept the run
 * @returns incidents by nerve; nothing opens or ends here
 * @source house rule
 */
export function incidentsAfter(state: CaseState, judged: EntryBodies['run.judged'], kept: KeptRun): CaseState['incidents'] {
  const incidents: Record<string, Incident> = { ...state.incidents };
  for (const incident of Object.values(state.incidents)) {
    const nerve = state.plan.nerves.find((candidate) => candidate.id === incident.nerveId);
    if (nerve === undefined || !nerve.sites.some((site) => site.id === kept.run.siteId)) continue;
    const badPathIds = badPathsOf(judged, kept);
    const others = incident.badSeqs.filter((seq) => seq !== kept.seq);
    incidents[incident.nerveId] = {
      ...incident,
      badSeqs: badPathIds.length > 0 ? [...others, kept.seq].slice(-keptBadSeqs) : others,
      badPathIds: [...new Set([...incident.badPathIds, ...badPathIds])],
      badSegments: union(incident.badSegments, badSegmentsOf(state, nerve.id, kept)),
      repeatDueAt: isRepeat(incident, judged, kept) ? null : incident.repeatDueAt,
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

/** A later comparable run on a path of the evidence; of a slowed segment, one that gives its time again. */
function isRepeat(incident: Incident, judged: EntryBodies['run.judged'], kept: KeptRun): boolean {
  const isLater = kept.seq !== incident.firstSeq && isSince(kept, { at: incident.firstBadAt, seq: incident.firstSeq });
  if (!isLater || !judged.paths.some((path) => isOfEvidence(incident, path))) return false;
  if (incident.finding !== 'segment-slowed') return true;
  const keys = incident.badSegments.filter((segment) => segment.measure === 'time').map((segment) => segment.key);
  return judged.segments.some(
    (segment) => segment.timeChangePercent !== null && keys.includes(segmentKey(segment.channelId, segment.proximalSiteId, segment.distalSiteId)),
  );
}

function isOfEvidence(incident: Incident, path: PathJudgement): boolean {
  return path.kind === 'compared' && path.change.percentOfBaseline !== null && incident.pathIds.includes(path.pathId);
}

function union(known: readonly BadSegment[], found: readonly BadSegment[]): readonly BadSegment[] {
  const isKnown = (segment: BadSegment) => known.some((other) => other.key === segment.key && other.measure === segment.measure);
  return [...known, ...found.filter((segment) => !isKnown(segment))];
}
