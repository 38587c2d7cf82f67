import { todayNeeds } from '@/lib/text/today-need';
import type { TodayLine } from '@/lib/text/today-line';

/**
 * Which of two cases stands higher: by need, then the one that has waited longer, then by theatre and by id.
 * @returns below 0 when the first stands higher, above 0 when the second does; 0 only for the same case (an order)
 * @source product rule: sorted by need
 * @accuracy tests/lib/text/today-order.test.ts (property: a total order, an untold alert is never below a calm case)
 * @example
 * [...lines].sort(todayOrder)[0]?.need // => 'alert-not-told'
 */
export function todayOrder(first: TodayLine, second: TodayLine): number {
  const byNeed = todayNeeds.indexOf(first.need) - todayNeeds.indexOf(second.need);
  if (byNeed !== 0) return byNeed;
  return compare(first.since, second.since) || compare(first.place, second.place) || compare(first.caseId, second.caseId);
}

/** By code units, so that every browser agrees. */
function compare(first: string, second: string): number {
  return first < second ? -1 : first > second ? 1 : 0;
}
