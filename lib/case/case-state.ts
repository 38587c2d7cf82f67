import type { Location, FindingKind, NotComparedReason, PathChange, SegmentJudgement, Finding } from '@/lib/alert/judgement';
import type { BaselineValues, Condition, Phase, TeamMember } from '@/lib/case/entry-bodies';
import type { BaselineFamily, CasePlan } from '@/lib/case/plan';
import type { RunBody } from '@/lib/case/run-body';
import type { Reading } from '@/lib/response/reading';

/** A logged run as the state keeps it: the newest few of each path. */
export interface KeptRun {
  readonly seq: number;
  readonly at: string;
  readonly run: RunBody;
  readonly isBeforeTimeout: boolean;
}

/** What one path showed last, and against what. */
export interface PathRecord {
  readonly pathId: string;
  /** Newest run of any kind on this path. */
  readonly lastSeq: number;
  readonly lastAt: string;
  readonly lastReading: Reading;
  readonly lastIntensityMa: number;
  readonly lastNotCompared: NotComparedReason | null;
  /** Newest comparable run, null before the first. */
  readonly compared: ComparedRecord | null;
  /** The comparable run before it, for "two runs inside the limit". */
  readonly previous: ComparedRecord | null;
  /** Newest comparable run without a finding of notice or more. */
  readonly lastGoodAt: string | null;
}

/** A comparable run of a path. */
export interface ComparedRecord {
  readonly seq: number;
  readonly at: string;
  readonly reading: Reading;
  readonly change: PathChange;
  readonly findings: readonly Finding[];
}

/** Baseline of one path, electrode and family: mean of the accepted runs. */
export interface Baseline extends BaselineValues {
  readonly key: string;
  readonly electrodeId: string;
  readonly family: BaselineFamily;
  readonly seq: number;
  readonly setAfterPercent: number | null;
  /** Accepted by the desk alone; a physician's acceptance ends it. */
  readonly isProvisional: boolean;
  readonly isMarkedByCorrection: boolean;
}

/** A segment past its limit: its key, and whether its conduction time or its amplitude ratio showed it. */
export interface BadSegment {
  readonly key: string;
  readonly measure: 'time' | 'ratio';
}

/** An open notice or alert of one nerve. */
export interface Incident {
  readonly alertId: string;
  readonly nerveId: string;
  readonly level: 'notice' | 'alert';
  readonly isRepeated: boolean;
  readonly finding: FindingKind;
  readonly firstSeq: number;
  /** Numbers of the runs that were past a limit since the first, at most 50. */
  readonly badSeqs: readonly number[];
  /** Every path that was past a limit since the first, also those not named in the evidence. */
  readonly badPathIds: readonly string[];
  /** Segments that were past a limit since the first, and by what: they have to come back too. */
  readonly badSegments: readonly BadSegment[];
  /** False while everything seen is a notice at most: then the first graver run asks for a repeat of its own. */
  readonly mayBecomeAlert: boolean;
  /** Runs from this number and time on say where the change lies: the first abnormal one, or the one it returned with. */
  readonly locateFromSeq: number;
  readonly locateFromAt: string;
  readonly firstBadAt: string;
  /** When the first abnormal run arrived: later than it was made when the desk had no link or the entry came late. */
  readonly receivedAt: string;
  readonly raisedAt: string;
  /** Number of the entry that raised it or made it worse last: what a wall confirms to have painted. */
  readonly raisedSeq: number;
  /** When a wall had painted that entry; null while none has said so. */
  readonly paintedAt: string | null;
  readonly repeatDueAt: string | null;
  readonly pathIds: readonly string[];
  readonly worstPercentOfBaseline: number | null;
  readonly isLost: boolean;
  readonly location: Location;
  readonly lastGoodAt: string | null;
  readonly stepsBetween: readonly string[];
  readonly toldAt: string | null;
  readonly toldPercentOfBaseline: number | null;
  readonly readBackAt: string | null;
  readonly actedAt: string | null;
  readonly action: string | null;
  readonly recoveredAt: string | null;
}

/** A surgical step as the state keeps it. */
export interface KeptStep {
  readonly seq: number;
  readonly at: string;
  readonly since: string;
  readonly isRisk: boolean;
}

/** A condition as the state keeps it: the newest of each kind. */
export interface KeptCondition {
  readonly seq: number;
  readonly at: string;
  readonly condition: Condition;
}

/** Advice of the physician as the state keeps it: what waits for the desk, and the newest few that do not. */
export interface KeptAdvice {
  readonly seq: number;
  readonly at: string;
  readonly text: string;
  readonly byRole: string;
  readonly confirmedAt: string | null;
}

/** An alert that was taken back because its entry was corrected. */
export interface WithdrawnAlert {
  readonly alertId: string;
  readonly nerveId: string;
  readonly at: string;
}

/** The state of a case: a bounded fold over its entries. */
export interface CaseState {
  readonly caseId: string;
  readonly seq: number;
  readonly hash: string;
  readonly status: 'planned' | 'open' | 'closed';
  readonly plannedAt: string;
  readonly reference: string;
  readonly plan: CasePlan;
  readonly phase: Phase;
  readonly phaseReason: string | null;
  readonly phaseAt: string;
  readonly timeoutAt: string | null;
  readonly closedAt: string | null;
  readonly distancesVoidSince: Readonly<Record<string, string>>;
  /** Kept runs in the order they were logged: the newest six of each site. */
  readonly runs: readonly KeptRun[];
  readonly paths: Readonly<Record<string, PathRecord>>;
  /** Newest segment of each nerve, channel and pair of sites. */
  readonly segments: Readonly<Record<string, SegmentJudgement>>;
  readonly baselines: Readonly<Record<string, Baseline>>;
  readonly openingBaselines: Readonly<Record<string, Baseline>>;
  readonly conditions: Readonly<Record<string, KeptCondition>>;
  readonly steps: readonly KeptStep[];
  readonly incidents: Readonly<Record<string, Incident>>;
  readonly alertCounts: Readonly<Record<string, number>>;
  readonly withdrawn: readonly WithdrawnAlert[];
  readonly runCount: number;
  readonly team: readonly TeamMember[];
  readonly advice: readonly KeptAdvice[];
  /** The oldest message of each role that nobody of another role has answered. */
  readonly unanswered: Readonly<Record<string, { readonly seq: number; readonly at: string }>>;
}
