import type { KeptStep } from '@/lib/case/case-state';
import { isSince } from '@/lib/case/is-since';

/** The onset bracket of a change. */
export interface OnsetBracket {
  readonly lastGoodAt: string | null;
  readonly firstBadAt: string;
}

/**
 * The steps between last good and first bad.
 * @param steps steps of the case in any order; not modified
 * @param bracket last good (null: not known) and first bad
 * @returns their words after "since", in the order of their times
 * @source product rule: onset bracket is last good, first bad, every step between
 * @accuracy exact; tests/lib/case/alert-course.test.ts
 * @example
 * stepsBetween(state.steps, incident) // => ['cautery near nerve', 'nerve lifted']
 */
export function stepsBetween(steps: readonly KeptStep[], { lastGoodAt, firstBadAt }: OnsetBracket): readonly string[] {
  return steps
    .filter((step) => step.at <= firstBadAt && (lastGoodAt === null || step.at > lastGoodAt))
    .sort((first, second) => (isSince(first, second) ? 1 : -1))
    .map((step) => step.since);
}
