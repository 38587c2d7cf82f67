import type { TheatreLine } from '@/lib/text/theatre-line';

const openWords = { high: 'Alert was open', medium: 'Notice was open', low: 'Watch was open' } as const;

/**
 * The last known state in the past tense: what was open stays named as open then, everything else as what was shown.
 * @param line a statement of the last checked state; not modified
 * @returns a sentence without a full stop
 * @source product rule: not live is said in the past tense
 * @accuracy exact; tests/lib/text/past-headline.test.ts
 * @example
 * pastHeadline(line) // => 'Alert was open: ulnar at 38 % of baseline'
 */
export function pastHeadline(line: TheatreLine): string {
  const words = line.headline.charAt(0).toLowerCase() + line.headline.slice(1);
  const isOpen = line.kind === 'alert' || line.kind === 'notice' || line.kind === 'watch';
  return isOpen && line.priority !== null ? `${openWords[line.priority]}: ${words}` : `Shown then: ${words}`;
}

/** Whether the line keeps its mark and its size while it is not live. @returns true for an open alert or notice @source product rule */
export function staysLarge(line: TheatreLine): boolean {
  return line.priority === 'high' || line.priority === 'medium';
}
