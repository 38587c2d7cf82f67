import type { CaseState } from '@/lib/case/case-state';
import type { Condition } from '@/lib/case/entry-bodies';
import { conditionWords } from '@/lib/text/condition-words';

/** One condition as a list shows it; value and time are null when it was never measured. */
export interface ConditionRow {
  readonly kind: Condition['kind'];
  readonly name: string;
  readonly value: string | null;
  /** When it was measured, RFC 3339 UTC. */
  readonly at: string | null;
}

const usual: readonly (readonly [Condition['kind'], string])[] = [
  ['train-of-four', 'Train-of-four'],
  ['tourniquet', 'Tourniquet'],
  ['limb-temperature', 'Limb skin'],
  ['mean-pressure', 'Mean pressure'],
];

/**
 * The newest of each condition, those first that every case asks for: what was never measured has its row too.
 * @param conditions the newest condition of each kind; not modified
 * @returns at least four rows, in a fixed order, then what else was logged
 * @source the four that every case asks for: common practice
 * @accuracy exact; tests/lib/text/condition-rows.test.ts
 * @example
 * conditionRows({}).length // => 4
 */
export function conditionRows(conditions: CaseState['conditions']): readonly ConditionRow[] {
  const others = Object.values(conditions).filter(({ condition }) => !usual.some(([kind]) => kind === condition.kind));
  return [...usual, ...others.map(({ condition }) => [condition.kind, ''] as const)].map(([kind, name]) => {
    const kept = conditions[kind];
    if (kept === undefined) return { kind, name, value: null, at: null };
    return { kind, ...conditionWords(kept.condition), at: kept.at };
  });
}
