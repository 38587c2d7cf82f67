import type { CaseState } from '@/lib/case/case-state';
import type { ChainHead } from '@/lib/record/entry';

/** A case as this process last knew it: the fold, and the head that the next entry is chained on. */
export interface KeptCase {
  readonly state: CaseState;
  readonly head: ChainHead;
}
