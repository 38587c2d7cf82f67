import type { AlertCause, Condition, Examination, Phase, TeamMember } from '@/lib/case/entry-bodies';
import type { BaselineFamily, CasePlan } from '@/lib/case/plan';
import type { RunBody } from '@/lib/case/run-body';

/** What a person, or a timer of the server, asks of a case. */
export type CaseCommand =
  | {
      readonly name: 'plan-case';
      readonly plan: CasePlan;
      readonly reference: string;
      readonly identityCommitment: string;
      readonly team?: readonly TeamMember[];
    }
  | { readonly name: 'revise-plan'; readonly plan: CasePlan }
  | { readonly name: 'open-case'; readonly clockOffsetMs: number | null }
  | { readonly name: 'confirm-timeout'; readonly side: 'left' | 'right'; readonly text: string | null }
  | { readonly name: 'change-phase'; readonly phase: Phase; readonly reason: string | null }
  | { readonly name: 'log-run'; readonly run: RunBody }
  | { readonly name: 'correct-run'; readonly runSeq: number; readonly run: RunBody | null; readonly reason: string }
  | {
      readonly name: 'accept-baseline';
      readonly family: BaselineFamily;
      readonly electrodeId: string;
      readonly reason: string | null;
    }
  | { readonly name: 'log-condition'; readonly condition: Condition; readonly reportedBy: string | null }
  | { readonly name: 'log-step'; readonly stepId: string; readonly label: string | null }
  | {
      readonly name: 'measure-distances';
      readonly nerveId: string;
      readonly positions: readonly { readonly siteId: string; readonly positionMm: number }[];
      readonly reason: string | null;
    }
  | { readonly name: 'tell-alert'; readonly alertId: string; readonly whom: string; readonly how: string; readonly words: string }
  | { readonly name: 'read-back-alert'; readonly alertId: string; readonly words: string | null }
  | { readonly name: 'act-on-alert'; readonly alertId: string; readonly action: string }
  | {
      readonly name: 'end-alert';
      readonly alertId: string;
      readonly outcome: 'full' | 'partial' | 'none';
      readonly cause: AlertCause;
      readonly text: string | null;
    }
  | { readonly name: 'send-message'; readonly text: string }
  | { readonly name: 'give-advice'; readonly text: string }
  | { readonly name: 'confirm-advice'; readonly adviceSeq: number; readonly text: string | null }
  | { readonly name: 'confirm-baseline'; readonly baselineSeq: number; readonly text: string | null }
  | { readonly name: 'record-examination'; readonly examination: Examination }
  | { readonly name: 'close-case'; readonly text: string | null }
  | { readonly name: 'miss-repeat'; readonly alertId: string }
  | { readonly name: 'note-painted'; readonly alertId: string; readonly entrySeq: number; readonly screenId: string; readonly paintedAt: string };

/** Name of a command. */
export type CaseCommandName = CaseCommand['name'];

/** Why a command was refused, as a sentence for the person who gave it. */
export interface Refusal {
  readonly code: string;
  readonly message: string;
}
