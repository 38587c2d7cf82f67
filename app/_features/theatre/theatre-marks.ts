import type { MarkKind } from '@/app/_ui/priority-mark';
import type { TheatreLine } from '@/lib/text/theatre-line';

/** The shape beside a state. A state without priority that is not calm never gets the calm shape. */
export function theatreMark(line: TheatreLine): MarkKind {
  if (line.priority !== null) return line.priority;
  if (line.isCalm) return 'calm';
  if (line.kind === 'paused' || line.kind === 'tourniquet-up') return 'paused';
  if (line.kind === 'closed' || line.kind === 'take-down' || line.kind === 'withdrawn' || line.kind === 'recovered') return 'plain';
  return 'outline';
}
