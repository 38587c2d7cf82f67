/** Priorities: something moved / a limit passed once / confirmed. */
export type Priority = 'watch' | 'notice' | 'alert';

/** What was found on one path, worst first. */
export type FindingKind =
  | 'response-lost'
  | 'amplitude-and-onset'
  | 'amplitude-fall'
  | 'segment-slowed'
  | 'onset-late'
  | 'ratio-fall'
  | 'amplitude-watch'
  | 'threshold-rise';

/** A finding with the highest priority it can ever reach by itself. */
export interface Finding {
  readonly kind: FindingKind;
  readonly priority: Exclude<Priority, 'alert'>;
  readonly mayBecomeAlert: boolean;
}

/** Why a run cannot be set against its baseline. */
export type NotComparedReason =
  | 'no-baseline'
  | 'not-timed-out'
  | 'not-read'
  | 'unusable'
  | 'electrode-differs'
  | 'family-differs'
  | 'pulse-width-differs'
  | 'convention-differs'
  | 'current-lower'
  | 'current-not-supramaximal'
  | 'current-raised'
  | 'path-unknown';

/** The change of one path against its baseline; null where it could not be computed. */
export interface PathChange {
  readonly percentOfBaseline: number | null;
  readonly amplitudeChangePercent: number | null;
  readonly amplitudeErrorPercent: number | null;
  readonly isScatterAssumed: boolean;
  readonly onsetChangeMs: number | null;
  readonly onsetChangePercent: number | null;
  readonly onsetErrorMs: number | null;
  readonly durationChangePercent: number | null;
  readonly durationErrorPercent: number | null;
}

/** One path of one run, judged. */
export type PathJudgement =
  | {
      readonly kind: 'compared';
      readonly pathId: string;
      readonly current: 'equal' | 'supramaximal' | 'raised';
      readonly change: PathChange;
      readonly findings: readonly Finding[];
    }
  | { readonly kind: 'not-compared'; readonly pathId: string; readonly reason: NotComparedReason };

/** Why a segment has no velocity. */
export type NoVelocityReason =
  | 'partner-not-tested'
  | 'spans-risk-step'
  | 'distances-not-measured'
  | 'onset-not-read'
  | 'no-response'
  | 'latencies-exchanged'
  | 'latencies-equal';

/** A segment computed from this run and the newest run of a neighbouring site. */
export interface SegmentJudgement {
  readonly nerveId: string;
  readonly channelId: string;
  readonly proximalSiteId: string;
  readonly distalSiteId: string;
  readonly proximalAt: string;
  readonly distalAt: string;
  readonly velocity:
    | {
        readonly kind: 'velocity';
        readonly velocityMps: number;
        readonly standardErrorMps: number;
        readonly distanceMm: number;
        readonly isShort: boolean;
        readonly isImplausible: boolean;
      }
    | { readonly kind: 'not-computable'; readonly reason: NoVelocityReason };
  readonly conductionTimeMs: number | null;
  readonly timeChangeMs: number | null;
  readonly timeChangePercent: number | null;
  readonly ratioChangePercent: number | null;
  readonly findings: readonly Finding[];
}

/** Where along the nerve the change lies, from runs after the first abnormal one only. */
export type Location =
  | { readonly kind: 'segment'; readonly proximalSiteId: string; readonly distalSiteId: string }
  | { readonly kind: 'outside' }
  | { readonly kind: 'not-known'; readonly nextSiteId: string | null };

/**
 * The judge's version, written into every judgement; replay is equal within one version.
 * @source house rule: a whole number from 1, raised when the same runs would be judged otherwise
 */
export const judgeVersion = 2;
