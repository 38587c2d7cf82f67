import type { CaseEntry } from '@/lib/case/entry-bodies';
import { msOfMoment } from '@/lib/units/ms-of-moment';

/**
 * An entry that arrived this long after its time is called late.
 * @source custom: 60 s
 */
export const lateAfterMs = 60_000;

/**
 * How late an entry arrived.
 * @param entry an entry with its own time and the time it was recorded
 * @returns ms from its time to its recording; null when it was not late
 * @source custom: 60 s
 * @example
 * lateMsOf(entry) // => null
 */
export function lateMsOf(entry: Pick<CaseEntry, 'eventAt' | 'recordedAt'>): number | null {
  const ms = msOfMoment(entry.recordedAt) - msOfMoment(entry.eventAt);
  return ms >= lateAfterMs ? ms : null;
}
