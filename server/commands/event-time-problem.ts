import { failure, type Failure } from '@/server/failure';

const aheadMs = 2_000;
const behindMs = 24 * 3_600_000;

/** A time that cannot be right: ahead of the server, or older than the longest time an entry may wait (house rule). */
export function eventTimeProblem(eventAt: string, nowMs: number): Failure | null {
  const atMs = Date.parse(eventAt);
  if (atMs > nowMs + aheadMs) {
    return failure('bad-request', 'time-ahead', `Time ahead: ${eventAt} is later than the server's clock; at most 2 s ahead are allowed.`, 'eventAt');
  }
  if (atMs < nowMs - behindMs) {
    return failure('bad-request', 'time-too-old', `Time too old: ${eventAt} is more than 24 h ago; an entry may wait for 24 h at most.`, 'eventAt');
  }
  return null;
}
