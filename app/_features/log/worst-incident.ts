import type { CaseState, Incident } from '@/lib/case/case-state';

/** Open notices and alerts, the most needed first: alerts before notices, untold before told, oldest first. */
export function incidentsInOrder(state: CaseState): readonly Incident[] {
  const rank = (incident: Incident) => (incident.level === 'alert' ? 0 : 2) + (incident.toldAt === null && incident.recoveredAt === null ? 0 : 1);
  return Object.values(state.incidents).sort((first, second) => rank(first) - rank(second) || first.firstBadAt.localeCompare(second.firstBadAt));
}

/** The one that the keys T, B, A and E speak of; null when nothing is open. */
export function worstIncident(state: CaseState): Incident | null {
  return incidentsInOrder(state)[0] ?? null;
}
