/** What the theatre screen says, one word for each state. "Not paired" and "not live" are the screen's own. */
export type TheatreKind =
  | 'set-up'
  | 'no-baseline'
  | 'stable'
  | 'improved'
  | 'watch'
  | 'notice'
  | 'alert'
  | 'recovered'
  | 'withdrawn'
  | 'not-tested'
  | 'not-compared'
  | 'not-monitorable'
  | 'cannot-be-judged'
  | 'tourniquet-up'
  | 'paused'
  | 'take-down'
  | 'closed';

/** One statement of the theatre screen. Only stable and improved are calm. */
export interface TheatreLine {
  readonly kind: TheatreKind;
  readonly priority: 'high' | 'medium' | 'low' | null;
  readonly isCalm: boolean;
  readonly isFlashing: boolean;
  readonly nerveId: string | null;
  readonly headline: string;
  readonly detail: string;
}

/** The whole theatre screen in words: the worst first, then the others, then short facts. */
export interface TheatreView {
  readonly lead: TheatreLine;
  readonly others: readonly TheatreLine[];
  readonly footer: readonly string[];
}
