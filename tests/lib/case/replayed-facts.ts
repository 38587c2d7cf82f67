import { applyEntry } from '@/lib/case/apply-entry';
import type { CaseState } from '@/lib/case/case-state';
import { initialState } from '@/lib/case/initial-state';
import type { WireEntry } from '@/lib/contracts/http/replies';

/**
 * What a log says when it is replayed: the facts that no later version may read otherwise. The state may gain fields and
 * the words of the screen may get better; these stay.
 */
export function replayedFacts(entries: readonly WireEntry[]) {
  let state = initialState(entries[0]!.caseId);
  const course: string[] = [];
  for (const entry of entries) {
    state = applyEntry(state, entry);
    course.push(`${entry.seq} ${entry.kind}: ${state.status}, ${state.phase}${incidentsOf(state)}`);
  }
  return { course, ...endOf(state) };
}

function incidentsOf(state: CaseState): string {
  return Object.values(state.incidents)
    .map((incident) => {
      const { location } = incident;
      const where = location.kind === 'segment' ? `${location.proximalSiteId} to ${location.distalSiteId}` : location.kind;
      const words = [incident.alertId, incident.level, incident.finding, where, `from ${incident.firstBadAt}`, `last good ${incident.lastGoodAt}`];
      const marks = [incident.isRepeated && 'repeated', incident.isLost && 'lost', incident.toldAt && 'told', incident.recoveredAt && 'recovered'];
      return `; ${[...words, ...marks.filter(Boolean)].join(', ')}`;
    })
    .join('');
}

function endOf(state: CaseState) {
  const sites = state.plan.nerves.flatMap((nerve) => nerve.sites.map((site) => `${site.id} ${site.positionMm}`));
  const baselines = Object.values(state.baselines).map((one) => `${one.key}: ${one.onsetMs} ms, ${one.amplitudeUv} µV of ${one.runSeqs.join(', ')}`);
  const paths = Object.values(state.paths).map((one) => `${one.pathId}: ${one.compared?.change.percentOfBaseline} % at ${one.compared?.at}`);
  const { seq, hash, reference, timeoutAt, closedAt, runCount, alertCounts, withdrawn, conditions } = state;
  return { seq, hash, reference, timeoutAt, closedAt, runCount, alertCounts, withdrawn, conditions, sites, baselines, paths };
}
