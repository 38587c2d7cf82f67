import type { CaseState, Incident } from '@/lib/case/case-state';

/**
 * Open notices and alerts, the most needed first: alerts before notices, untold before told, oldest first.
 * @returns the incidents of the case in a new array
 * @source house rule
 * @accuracy exact; tests/lib/text/today-line.test.ts
 */
export function incidentsInOrder(state: CaseState): readonly Incident[] {
  const rank = (incident: Incident) => (incident.level === 'alert' ? 0 : 2) + (incident.toldAt === null && incident.recoveredAt === null ? 0 : 1);
  return Object.values(state.incidents).sort((first, second) => rank(first) - rank(second) || first.firstBadAt.localeCompare(second.firstBadAt));
}
