import { msOfMoment } from '@/lib/units/ms-of-moment';

/** The time from one moment of a case to another. */
export interface CourseInterval {
  readonly fromAt: string;
  readonly toAt: string;
  /** Never negative; null when the second moment lies before the first. */
  readonly ms: number | null;
  /** What was asked for, in ms; null where nothing is. */
  readonly limitMs: number | null;
}

/** Clocks of two machines agree no better than this. House rule. */
const clockAgreementMs = 1_000;

/**
 * The time between two moments.
 * @param fromAt RFC 3339; null when it has not come
 * @param toAt RFC 3339; null when it has not come
 * @param limitMs custom limit in ms; null where there is none
 * @returns the interval; null while one of the moments is missing. A second moment up to 1 s early counts as 0 ms, one
 *   earlier than that has no length: an entry came late
 * @source house rule
 * @accuracy exact to 1 ms; tests/lib/case/course/alert-courses.test.ts
 * @example
 * courseInterval('2027-03-14T10:41:00.000Z', '2027-03-14T10:41:15.000Z', 60_000)?.ms // => 15000
 */
export function courseInterval(fromAt: string | null, toAt: string | null, limitMs: number | null = null): CourseInterval | null {
  if (fromAt === null || toAt === null) return null;
  const ms = msOfMoment(toAt) - msOfMoment(fromAt);
  return { fromAt, toAt, ms: ms >= 0 ? ms : ms >= -clockAgreementMs ? 0 : null, limitMs };
}

/** Whether an interval kept its limit. @returns null where there is no limit or no length @source custom limits */
export function isInTime(interval: CourseInterval | null): boolean | null {
  if (interval === null || interval.ms === null || interval.limitMs === null) return null;
  return interval.ms <= interval.limitMs;
}
