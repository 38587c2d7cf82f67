import type { CaseState, Incident } from '@/lib/case/case-state';
import { isAbnormal } from '@/lib/case/is-abnormal';
import { isRebased } from '@/lib/case/is-rebased';
import { isSince } from '@/lib/case/is-since';

/**
 * Whether what was past a limit looks back inside it, without a test that proves it: the newer runs were known before
 * its late entry came, or are held against a baseline that was moved after the loss.
 * @param state the case with the newest judgement
 * @param incident the open notice or alert
 * @returns true only where every path of it has such a run; its % now is then no answer to the change
 * @source product rule: a late entry that hid an alert shows; moving the working baseline hides nothing
 * @accuracy exact; tests/lib/case/late-entry.test.ts
 * @example
 * isReturnUnproven(state, incident) // => false
 */
export function isReturnUnproven(state: CaseState, incident: Incident): boolean {
  const first = { at: incident.firstBadAt, seq: incident.firstSeq };
  return incident.badPathIds.every((pathId) => {
    const record = state.paths[pathId]?.compared ?? null;
    if (record === null || record.change.percentOfBaseline === null || isAbnormal(record.findings)) return false;
    if (incident.badSeqs.includes(record.seq) || !isSince(record, first)) return false;
    return record.seq < incident.raisedSeq || isRebased(state, pathId, incident.firstBadAt);
  });
}
