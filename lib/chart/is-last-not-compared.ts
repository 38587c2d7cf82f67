import type { PathRecord } from '@/lib/case/case-state';

/**
 * Whether what a path shows is older than its newest run, because that run cannot be compared.
 * @param record what the path showed last; undefined before its first run
 * @returns true while the newest run is not compared; false before the first run
 * @source product rule: otherwise "not compared" with the reason
 * @accuracy exact; tests/lib/chart/nerve-line-view.test.ts
 * @example
 * isLastNotCompared(undefined) // => false
 */
export function isLastNotCompared(record: PathRecord | undefined): boolean {
  return record !== undefined && record.lastNotCompared !== null;
}
