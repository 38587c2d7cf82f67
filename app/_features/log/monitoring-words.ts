import type { CaseState } from '@/lib/case/case-state';
import type { WireEntry } from '@/lib/contracts/http/replies';
import { clockTime, durationWords } from '@/lib/text/format';

/** Monitoring time so far: from the phases in the log, paused time left out. */
export function monitoringMs(entries: readonly WireEntry[], nowMs: number): number {
  let sumMs = 0;
  let since: number | null = null;
  for (const entry of entries) {
    const ends = entry.kind === 'case.closed';
    if (entry.kind !== 'phase.changed' && !ends) continue;
    const atMs = Date.parse(entry.eventAt);
    if (since !== null) sumMs += Math.max(0, atMs - since);
    since = !ends && entry.body?.['phase'] === 'monitoring' ? atMs : null;
  }
  return since === null ? sumMs : sumMs + Math.max(0, nowMs - since);
}

/** Phase and monitoring time in words. */
export function monitoringWords(state: CaseState, entries: readonly WireEntry[], nowMs: number, timeZone: string): string {
  if (state.status === 'planned') return 'Planned, not opened';
  if (state.status === 'closed') return `Closed ${clockTime(state.closedAt ?? state.phaseAt, timeZone)}`;
  const spent = durationWords(monitoringMs(entries, nowMs));
  const phase = state.phase.charAt(0).toUpperCase() + state.phase.slice(1);
  if (state.phase === 'monitoring') return `Monitoring ${spent}`;
  return monitoringMs(entries, nowMs) > 0 ? `${phase}, monitored ${spent}` : phase;
}
