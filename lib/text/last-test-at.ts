import type { CaseState } from '@/lib/case/case-state';

/**
 * When a response was last looked for and read, on any path: a test that found no response counts, one that was not read does not.
 * @returns RFC 3339 in UTC, or null before the first test
 * @source house rule: "tested" speaks of the nerve
 * @accuracy exact; tests/lib/text/today-line.test.ts
 * @example
 * lastTestAt(state) // => '2027-03-14T10:30:04.000Z'
 */
export function lastTestAt(state: CaseState): string | null {
  const times = Object.values(state.paths)
    .filter(({ lastReading }) => lastReading.kind === 'measured' || lastReading.kind === 'absent')
    .map(({ lastAt }) => lastAt)
    .sort();
  return times.at(-1) ?? null;
}
