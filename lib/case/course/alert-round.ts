import type { FindingKind } from '@/lib/alert/judgement';
import type { CourseInterval } from '@/lib/case/course/course-interval';
import type { Worsening } from '@/lib/case/entry-bodies';

/** What somebody did about an alert, when, and in which words. */
export interface AlertAct {
  readonly seq: number;
  readonly at: string;
  readonly lateMs: number | null;
  readonly words: string;
}

/** One raise of a notice or alert, with what was done about it until the next raise. */
export interface AlertRound {
  readonly seq: number;
  readonly kind: 'notice' | 'alert' | 'worse';
  /** When the program raised it. */
  readonly raisedAt: string;
  readonly finding: FindingKind;
  readonly percentOfBaseline: number | null;
  readonly worsening: readonly Worsening[];
  /** Of an alert: a second run confirmed it. null for a notice and for a worsening. */
  readonly isRepeated: boolean | null;
  readonly paintedAt: string | null;
  readonly told: AlertAct | null;
  readonly readBack: AlertAct | null;
  readonly acted: AlertAct | null;
  readonly retestAt: string | null;
}

/** The intervals of a round, counted from its raise; null while the second moment has not come. */
export interface RoundIntervals {
  readonly painted: CourseInterval | null;
  readonly told: CourseInterval | null;
  readonly readBack: CourseInterval | null;
  readonly acted: CourseInterval | null;
  readonly retest: CourseInterval | null;
}

/**
 * How soon after an alert is raised it should be read back and tested again, in s. Told stands in the rules of the case.
 * @source custom: 120 s and 180 s, each from the raise
 */
export const handlingLimits = { readBackSeconds: 120, retestSeconds: 180 } as const;
