import type { CaseCommand } from '@/lib/case/commands';
import type { CasePlan } from '@/lib/case/plan';
import type { PlanCaseRequest } from '@/lib/contracts/http/commands';

/** Who acts in a demo: the only two that write. */
export type DemoAuthor = 'desk' | 'physician';

/**
 * A command as a scenario writes it: what only the log knows is left open. A confirmation means the newest that waits;
 * what the surgeon is told is the sentence that the desk shows.
 */
export type DemoCommand =
  | Exclude<CaseCommand, { name: 'plan-case' | 'miss-repeat' | 'note-painted' | 'confirm-advice' | 'confirm-baseline' | 'tell-alert' }>
  | { readonly name: 'confirm-advice'; readonly text: string | null }
  | { readonly name: 'confirm-baseline'; readonly text: string | null }
  | { readonly name: 'tell-alert'; readonly alertId: string; readonly whom: string; readonly how: string };

/** One act: how long it is waited for at speed 1, who acts, and what is asked of the case. */
export interface Moment {
  readonly afterSeconds: number;
  readonly by: DemoAuthor;
  readonly command: DemoCommand;
  /** What is going on, said once before the first act of a part. */
  readonly heading: string | null;
}

/** A case that can be played: its plan, an invented patient, and every act in order. */
export interface Scenario {
  readonly name: string;
  readonly summary: string;
  readonly plan: CasePlan;
  readonly identity: PlanCaseRequest['identity'];
  readonly moments: readonly Moment[];
}
