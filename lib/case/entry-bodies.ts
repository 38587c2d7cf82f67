import type { FindingKind, Location, PathJudgement, SegmentJudgement } from '@/lib/alert/judgement';
import type { BaselineFamily, CasePlan } from '@/lib/case/plan';
import type { RunBody } from '@/lib/case/run-body';

/** Phase: decides what counts as monitoring time. */
export type Phase = 'set-up' | 'baseline' | 'monitoring' | 'paused' | 'take-down';

/** A condition of the patient or the theatre, as reported. */
export type Condition =
  | { readonly kind: 'train-of-four'; readonly count: number; readonly ratio: number | null }
  | { readonly kind: 'tourniquet'; readonly isUp: boolean; readonly pressureMmHg: number | null }
  | { readonly kind: 'limb-temperature'; readonly temperatureC: number }
  | { readonly kind: 'core-temperature'; readonly temperatureC: number }
  | { readonly kind: 'mean-pressure'; readonly pressureMmHg: number }
  | { readonly kind: 'relaxant'; readonly text: string }
  | { readonly kind: 'local-anaesthetic'; readonly text: string }
  | { readonly kind: 'other'; readonly text: string };

/** Judged cause of an alert. Common practice. */
export type AlertCause =
  | 'surgical' | 'position' | 'tourniquet' | 'physiological' | 'anaesthetic' | 'technical' | 'undetermined';

/** Which way an alert got worse. */
export type Worsening = 'lost' | 'twenty-points' | 'another-muscle' | 'another-segment' | 'returned';

/** Means and scatter of the accepted runs of one path, with the stimulus of the newest of them. */
export interface BaselineValues {
  readonly pathId: string;
  readonly runSeqs: readonly number[];
  readonly at: string;
  readonly onsetMs: number | null;
  readonly amplitudeUv: number | null;
  readonly durationMs: number | null;
  readonly amplitudeScatter: number;
  readonly isScatterAssumed: boolean;
  readonly intensityMa: number;
  readonly pulseWidthUs: number;
  readonly isSupramaximal: boolean;
  readonly maximalResponseMa: number | null;
}

/** The evidence a notice or an alert is raised with. */
export interface AlertEvidence {
  readonly alertId: string;
  readonly nerveId: string;
  readonly runSeq: number;
  readonly pathIds: readonly string[];
  readonly finding: FindingKind;
  readonly worstPercentOfBaseline: number | null;
  readonly location: Location;
  readonly lastGoodAt: string | null;
  readonly firstBadAt: string;
  readonly stepsBetween: readonly string[];
  readonly judgeVersion: number;
}

/** A person's part in a case, as planned. People are told by role; the name is the account's. */
export interface TeamMember {
  readonly personId: string;
  readonly role: 'neurophysiologist' | 'surgeon' | 'physician';
  readonly displayName: string;
}

/** Strength and sensation of the patient before or after the operation. Grades of the Medical Research Council, 0 to 5. */
export interface Examination {
  readonly when: 'before-operation' | 'after-operation';
  readonly examinedBy: string;
  readonly muscles: readonly { readonly muscle: string; readonly grade: number }[];
  readonly sensation: readonly { readonly area: string; readonly finding: 'normal' | 'reduced' | 'absent' | 'not-testable' }[];
  readonly text: string | null;
}

/** Body of every entry kind, version 1 of each. Never changed: a change is a new version with an upcaster. */
export interface EntryBodies {
  'case.planned': { readonly reference: string; readonly identityCommitment: string; readonly plan: CasePlan };
  'team.assigned': { readonly people: readonly TeamMember[] };
  'plan.revised': { readonly plan: CasePlan };
  'case.opened': { readonly clockOffsetMs: number | null };
  'timeout.confirmed': { readonly side: 'left' | 'right'; readonly text: string | null };
  'phase.changed': { readonly phase: Phase; readonly reason: string | null };
  'run.logged': RunBody;
  'run.judged': {
    readonly runSeq: number;
    readonly judgeVersion: number;
    readonly paths: readonly PathJudgement[];
    readonly segments: readonly SegmentJudgement[];
  };
  'run.corrected': { readonly runSeq: number; readonly run: RunBody | null; readonly reason: string };
  'baseline.accepted': {
    readonly family: BaselineFamily;
    readonly electrodeId: string;
    readonly runSeqs: readonly number[];
    readonly pathIds: readonly string[];
    readonly isOpening: boolean;
    readonly isProvisional: boolean;
    readonly reason: string | null;
    readonly setAfterPercent: number | null;
    readonly values: readonly BaselineValues[];
  };
  'baseline.confirmed': { readonly baselineSeq: number; readonly text: string | null };
  'examination.recorded': Examination;
  'condition.logged': { readonly condition: Condition; readonly reportedBy: string | null };
  'step.logged': {
    readonly stepId: string;
    readonly label: string;
    readonly since: string;
    readonly isRisk: boolean;
    readonly voidsDistances: boolean;
  };
  'distances.measured': {
    readonly nerveId: string;
    readonly positions: readonly { readonly siteId: string; readonly positionMm: number }[];
    readonly reason: string | null;
  };
  'notice.raised': AlertEvidence & { readonly repeatDueAt: string | null };
  'notice.settled': { readonly alertId: string; readonly runSeq: number };
  'alert.raised': AlertEvidence & { readonly isRepeated: boolean };
  'alert.worsened': AlertEvidence & { readonly worsening: readonly Worsening[] };
  'alert.located': { readonly alertId: string; readonly runSeq: number; readonly location: Location };
  'alert.recovered': { readonly alertId: string; readonly runSeq: number; readonly percentOfBaseline: number | null };
  'alert.withdrawn': { readonly alertId: string; readonly runSeq: number };
  'alert.told': { readonly alertId: string; readonly whom: string; readonly how: string; readonly words: string };
  'alert.read-back': { readonly alertId: string; readonly words: string | null };
  'alert.acted': { readonly alertId: string; readonly action: string };
  'alert.ended': {
    readonly alertId: string;
    readonly outcome: 'full' | 'partial' | 'none';
    readonly cause: AlertCause;
    readonly text: string | null;
  };
  'alert.painted': { readonly alertId: string; readonly entrySeq: number; readonly screenId: string; readonly paintedAt: string };
  'advice.given': { readonly text: string };
  'advice.confirmed': { readonly adviceSeq: number; readonly text: string | null };
  'message.sent': { readonly text: string };
  'case.closed': { readonly text: string | null };
}

/** Name of an entry kind. */
export type EntryKind = keyof EntryBodies;

/** An entry before it has a number, a time and a hash. */
export type EntryDraft = { [K in EntryKind]: { readonly kind: K; readonly kindVersion: number; readonly body: EntryBodies[K] } }[EntryKind];

/** What `evolve` reads of a committed entry. */
export type CaseEntry = EntryDraft & {
  readonly seq: number;
  readonly eventAt: string;
  readonly recordedAt: string;
  readonly commandId: string;
  readonly author: { readonly id: string; readonly role: string; readonly displayName: string };
};
