import type { RuleSet } from '@/lib/alert/rule-set';
import { handlingLimits, type AlertRound, type RoundIntervals } from '@/lib/case/course/alert-round';
import { courseInterval } from '@/lib/case/course/course-interval';

/**
 * How long each step of handling took.
 *
 * Method: every interval is counted from the raise. A notice only asks for its repeat, so its steps have no limit.
 *
 * @param round one raise with what was done
 * @param rules the limits of the case
 * @returns intervals in ms with their custom limits
 * @source custom limits: told 60 s, read back 120 s, retest 180 s
 * @accuracy exact to 1 ms; tests/lib/case/course/alert-courses.test.ts
 * @example
 * roundIntervals(round, rules).told?.ms // => 15000
 */
export function roundIntervals(round: AlertRound, rules: RuleSet): RoundIntervals {
  const limit = (seconds: number) => (round.kind === 'notice' ? null : seconds * 1_000);
  const from = round.raisedAt;
  return {
    painted: courseInterval(from, round.paintedAt),
    told: courseInterval(from, round.told?.at ?? null, limit(rules.tellWithinSeconds)),
    readBack: courseInterval(from, round.readBack?.at ?? null, limit(handlingLimits.readBackSeconds)),
    acted: courseInterval(from, round.acted?.at ?? null),
    retest: courseInterval(from, round.retestAt, limit(handlingLimits.retestSeconds)),
  };
}
