import type { Location } from '@/lib/alert/judgement';
import type { AlertRound } from '@/lib/case/course/alert-round';
import type { AlertCause } from '@/lib/case/entry-bodies';

/** One compared run of a path of an alert. */
export interface PathValue {
  readonly runSeq: number;
  readonly at: string;
  readonly percentOfBaseline: number | null;
  readonly onsetChangeMs: number | null;
  readonly isLost: boolean;
}

/** What a path of an alert showed while it was open. */
export interface PathCourse {
  readonly pathId: string;
  /** The lowest amplitude; null when none was compared. */
  readonly worst: PathValue | null;
  /** The latest onset; null when none was compared. */
  readonly slowest: PathValue | null;
  /** The newest by its own time. */
  readonly last: PathValue | null;
}

/** A step inside the onset bracket. */
export interface BracketStep {
  readonly seq: number;
  readonly at: string;
  readonly since: string;
  readonly isRisk: boolean;
  /** It was entered after the notice was raised, so the evidence of that time does not name it. */
  readonly isEnteredLater: boolean;
}

/** How a notice or alert came to its end; null while it is open. */
export type AlertEnd =
  | {
      readonly kind: 'ended';
      readonly at: string;
      readonly seq: number;
      readonly outcome: 'full' | 'partial' | 'none';
      readonly cause: AlertCause;
      readonly text: string | null;
    }
  | { readonly kind: 'settled'; readonly at: string; readonly seq: number }
  | { readonly kind: 'withdrawn'; readonly at: string; readonly seq: number; readonly runSeq: number };

/** One notice or alert from its first bad run to its end. */
export interface AlertCourse {
  readonly alertId: string;
  readonly nerveId: string;
  readonly level: 'notice' | 'alert';
  readonly rounds: readonly AlertRound[];
  readonly lastGoodAt: string | null;
  readonly firstBadAt: string;
  /** When its first bad run arrived, and how late; null when it was not late. */
  readonly receivedAt: string;
  readonly lateMs: number | null;
  readonly steps: readonly BracketStep[];
  /** When the run was made that answered the notice: it confirmed it or settled it. */
  readonly repeatedAt: string | null;
  readonly location: Location;
  readonly paths: readonly PathCourse[];
  readonly recoveredAt: string | null;
  readonly end: AlertEnd | null;
  /** Numbers of all its entries. */
  readonly entrySeqs: readonly number[];
}
