import type { CaseState, Incident } from '@/lib/case/case-state';
import { incidentsInOrder } from '@/lib/text/incidents-in-order';

/** The one that the keys T, B, A and E speak of; null when nothing is open. */
export function worstIncident(state: CaseState): Incident | null {
  return incidentsInOrder(state)[0] ?? null;
}
