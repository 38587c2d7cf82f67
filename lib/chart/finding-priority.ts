import type { Finding, Priority } from '@/lib/alert/judgement';
import type { Incident } from '@/lib/case/case-state';

/**
 * The priority a place on the nerve carries: of its own findings, raised to the level of the nerve's open alert.
 *
 * Method: a finding that reached a limit takes the level of the open notice or alert of its nerve; a watch stays a
 * watch. Without a finding there is no priority, also while an alert is open: the place itself is inside the limits.
 *
 * @param findings of the newest comparable run or segment; not modified
 * @param incident the nerve's open notice or alert, undefined without one
 * @returns 'alert', 'notice', 'watch' or null for none
 * @source house rule: one alert per nerve
 * @accuracy tests/lib/chart/finding-priority.test.ts
 * @example
 * findingPriority([], undefined) // => null
 */
export function findingPriority(findings: readonly Finding[], incident: Incident | undefined): Priority | null {
  if (findings.some((finding) => finding.priority === 'notice')) return incident?.level ?? 'notice';
  return findings.length > 0 ? 'watch' : null;
}
