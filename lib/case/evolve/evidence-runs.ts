import type { BadSegment, CaseState, Incident } from '@/lib/case/case-state';
import type { AlertEvidence, CaseEntry } from '@/lib/case/entry-bodies';
import { badSegmentsOf } from '@/lib/case/evolve/bad-segments-of';

/** The incident's runs and paths with those of an alert: of a late entry, the run that confirms it was known before. @returns fields of the incident @source house rule */
export function withRun(state: CaseState, incident: Incident, { runSeq, pathIds }: AlertEvidence): Pick<Incident, 'badSeqs' | 'badPathIds'> {
  const isNew = !incident.badSeqs.includes(runSeq) && state.runs.some((run) => run.seq === runSeq);
  return {
    badSeqs: isNew ? [...incident.badSeqs, runSeq] : incident.badSeqs,
    badPathIds: [...new Set([...incident.badPathIds, ...pathIds])],
  };
}

/** What is past a limit again says where the change lies now; what is not, came back. @returns fields of the incident @source house rule */
export function returned(
  state: CaseState,
  { body, eventAt }: CaseEntry & { kind: 'alert.worsened' },
): Pick<Incident, 'locateFromSeq' | 'locateFromAt' | 'badPathIds' | 'badSegments'> {
  const locateFromAt = state.runs.find((run) => run.seq === body.runSeq)?.at ?? eventAt;
  return { locateFromSeq: body.runSeq, locateFromAt, badPathIds: body.pathIds, badSegments: segmentsOfRun(state, body) };
}

/** The segments that the run of a notice or alert showed past a limit. @returns empty when the run is no longer kept @source house rule */
export function segmentsOfRun(state: CaseState, body: AlertEvidence): readonly BadSegment[] {
  const kept = state.runs.find((run) => run.seq === body.runSeq);
  return kept === undefined ? [] : badSegmentsOf(state, body.nerveId, kept);
}
