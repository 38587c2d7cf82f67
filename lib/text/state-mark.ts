import type { TheatreLine } from '@/lib/text/theatre-line';

/** The shape that stands beside a state, for those who cannot tell colours apart. */
export type StateMark = 'high' | 'medium' | 'low' | 'plain' | 'calm' | 'outline' | 'paused';

/**
 * The shape beside a state. A state without priority that is not calm never gets the calm shape.
 * @param line a statement of the case; not modified
 * @returns the name of a shape
 * @source product rule: priority is never colour alone, only stable and improved look calm
 * @accuracy exact; tests/lib/text/past-headline.test.ts
 */
export function stateMark(line: Pick<TheatreLine, 'kind' | 'priority' | 'isCalm'>): StateMark {
  if (line.priority !== null) return line.priority;
  if (line.isCalm) return 'calm';
  if (line.kind === 'paused' || line.kind === 'tourniquet-up') return 'paused';
  if (line.kind === 'closed' || line.kind === 'take-down' || line.kind === 'withdrawn' || line.kind === 'recovered') return 'plain';
  return 'outline';
}
