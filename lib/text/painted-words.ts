import type { Incident } from '@/lib/case/case-state';
import { clockTime } from '@/lib/text/format';
import { msOfMoment } from '@/lib/units/ms-of-moment';

/** A wall that has not confirmed by then is named at the desk; with a clock that is drawn once a second that is within the 5 s of the product rule. */
const confirmedWithinMs = 3_500;

/** Whether a wall has shown the newest word of a notice or alert. */
export interface PaintedWords {
  readonly text: string;
  /** True while a wall is bound to the case and has not confirmed in time. */
  readonly isMissing: boolean;
}

/**
 * What the desk says of the wall beside an open alert.
 *
 * Method: a wall confirms the entry that raised the alert or made it worse last. Without a wall there is nothing to confirm.
 *
 * @param incident an open notice or alert; not modified
 * @param wall `hasWall` whether a wall is bound to the case, `wordAt` when the newest word of the alert was committed
 * @param nowMs ms since 1970, the server's clock
 * @param timeZone IANA zone of the theatre
 * @returns words without a full stop, or null while there is nothing to say
 * @source product rule: "wall not confirmed" within 5 s
 * @accuracy tests/lib/text/painted-words.test.ts, both sides of the limit
 * @example
 * paintedWords(incident, { hasWall: true, wordAt }, nowMs, 'UTC')?.text // => 'On the wall 10:41:22'
 */
export function paintedWords(incident: Pick<Incident, 'paintedAt'>, wall: { readonly hasWall: boolean; readonly wordAt: string }, nowMs: number, timeZone: string): PaintedWords | null {
  if (incident.paintedAt !== null) return { text: `On the wall ${clockTime(incident.paintedAt, timeZone, { seconds: true })}`, isMissing: false };
  if (!wall.hasWall || nowMs - msOfMoment(wall.wordAt) < confirmedWithinMs) return null;
  return { text: 'Wall not confirmed', isMissing: true };
}
