import { failure, type Failure } from '@/server/failure';

/** Clocks differ by this much without anyone noticing. House rule. */
const slackMs = 2_000;
/** A desk whose clock was a little ahead sends again until its time has come; with a longer wait its later entries would be held up too. House rule. */
const longestWaitMs = 60_000;
const dayMs = 24 * 3_600_000;

/**
 * A time that cannot be right. A little ahead of the server: not now, the same may be sent again and is taken when its
 * time has come. Further ahead: refused, because what follows would look older than it. In the past every time is right
 * from `sinceMs` on, however long an entry has waited: for an entry that is when its case was planned, for a planning,
 * which never waits, a day ago.
 */
export function eventTimeProblem(eventAt: string, nowMs: number, sinceMs: number = nowMs - dayMs): Failure | null {
  const atMs = Date.parse(eventAt);
  const aheadMs = atMs - nowMs;
  if (aheadMs > longestWaitMs) {
    return failure('bad-request', 'time-ahead', `Time ahead: ${eventAt} is ${inWords(aheadMs)} later than the server's clock; 2 s are allowed. Set the clock of this computer and log it again.`, 'eventAt');
  }
  if (aheadMs > slackMs) {
    return failure('not-saved', 'not-saved', `Not saved yet: ${eventAt} is ${inWords(aheadMs)} later than the server's clock; 2 s are allowed. It is safe to send the same again, and it is taken when that time has come.`, 'eventAt');
  }
  if (atMs < sinceMs - longestWaitMs) {
    return failure('bad-request', 'time-too-old', `Time too old: ${eventAt} is before ${new Date(sinceMs).toISOString()}, from when on it can have happened. Set the clock of this computer and log it again.`, 'eventAt');
  }
  return null;
}

function inWords(ms: number): string {
  if (ms < 120_000) return `${Math.ceil(ms / 1000)} s`;
  if (ms < 2 * 3_600_000) return `${Math.round(ms / 60_000)} min`;
  return ms < 2 * dayMs ? `${Math.round(ms / 3_600_000)} h` : `${Math.round(ms / dayMs)} days`;
}
