/** Which question of the console is open. */
export type LogDialog =
  | { readonly kind: 'told' | 'read-back' | 'action' | 'end'; readonly alertId: string }
  | { readonly kind: 'other-step' | 'timeout' | 'phase' | 'baseline' | 'pair' | 'close' | 'keys' | 'examination' }
  | { readonly kind: 'condition'; readonly condition: ConditionKind }
  | { readonly kind: 'distances'; readonly nerveId: string }
  | { readonly kind: 'correct'; readonly runSeq: number };

/** Conditions that can be logged from the console. */
export type ConditionKind =
  | 'train-of-four'
  | 'tourniquet'
  | 'limb-temperature'
  | 'core-temperature'
  | 'mean-pressure'
  | 'relaxant'
  | 'local-anaesthetic'
  | 'other';
