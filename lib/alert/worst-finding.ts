import type { Finding, FindingKind } from '@/lib/alert/judgement';

/** Findings from worst to least; the pair of amplitude and onset comes before amplitude alone. */
const order: readonly FindingKind[] = [
  'response-lost',
  'amplitude-and-onset',
  'amplitude-fall',
  'segment-slowed',
  'onset-late',
  'threshold-rise',
  'ratio-fall',
  'amplitude-watch',
];

/**
 * The worst of some findings.
 * @param findings any number, in any order; not modified
 * @returns the worst, null when there is none
 * @source order: product rule, lost first, then amplitude with onset (laryngeal-nerve practice)
 * @accuracy exact; tests/lib/alert/worst-finding.test.ts
 * @example
 * worstFinding([]) // => null
 */
export function worstFinding(findings: readonly Finding[]): Finding | null {
  return worstFirst(findings)[0] ?? null;
}

/**
 * Findings in order, the worst first.
 * @param findings any number, in any order; not modified
 * @returns the same findings, sorted
 * @source order: as for `worstFinding`
 * @accuracy exact; tests/lib/alert/worst-finding.test.ts
 * @example
 * worstFirst([]) // => []
 */
export function worstFirst(findings: readonly Finding[]): readonly Finding[] {
  return [...findings].sort((first, second) => order.indexOf(first.kind) - order.indexOf(second.kind));
}
