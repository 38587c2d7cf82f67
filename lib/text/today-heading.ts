import type { TodayLine } from '@/lib/text/today-line';
import type { TodayNeed } from '@/lib/text/today-need';

/** Cases one person can follow closely. Recommended by the trade's society guidelines: no more than three at once (common practice). */
export const mostFollowed = 3;

const needing: readonly TodayNeed[] = ['alert-not-told', 'cannot-be-judged', 'alert-told', 'not-live', 'notice', 'message-waits'];

/**
 * How many cases are live and how many of them need the one who looks.
 * @param lines the cases that stand on the page; not modified
 * @returns "4 live cases, 2 need you", without a full stop
 * @source house rule
 * @accuracy exact; tests/lib/text/today-heading.test.ts
 * @example
 * todayHeading([]) // => 'No live case'
 */
export function todayHeading(lines: readonly Pick<TodayLine, 'need'>[]): string {
  if (lines.length === 0) return 'No live case';
  const count = lines.filter(({ need }) => needing.includes(need)).length;
  const cases = lines.length === 1 ? '1 live case' : `${lines.length} live cases`;
  if (count === 0) return cases;
  return `${cases}, ${count} ${count === 1 ? 'needs' : 'need'} you`;
}

/**
 * The warning above three followed cases.
 * @param caseCount cases followed at once, a count
 * @returns a sentence, or null up to three
 * @source product rule: warns above three followed cases (common practice)
 * @accuracy exact; tests/lib/text/today-heading.test.ts
 * @example
 * tooManyWords(4) // => '4 cases at once: no more than 3 are recommended. Hand some over to another physician.'
 */
export function tooManyWords(caseCount: number): string | null {
  if (caseCount <= mostFollowed) return null;
  return `${caseCount} cases at once: no more than ${mostFollowed} are recommended. Hand some over to another physician.`;
}
