/** How far a value of a row went: drawn in colour and in bold, and said in the note. */
export type RowTone = 'plain' | 'low' | 'medium' | 'high';

/** One channel of one run. */
export interface RunRow {
  readonly kind: 'run';
  readonly key: string;
  readonly seq: number;
  readonly at: string;
  readonly siteName: string;
  readonly channelName: string;
  readonly intensity: string;
  readonly onset: string;
  readonly change: string;
  readonly changeTone: RowTone;
  readonly amplitude: string;
  readonly percent: string;
  readonly percentTone: RowTone;
  readonly velocity: string;
  readonly velocityTone: RowTone;
  readonly note: string;
  readonly isFirst: boolean;
  readonly isCorrected: boolean;
  readonly isWaiting: boolean;
}

/** Any other entry, as a sentence. */
export interface SentenceRow {
  readonly kind: 'sentence';
  readonly key: string;
  readonly seq: number;
  readonly at: string;
  readonly text: string;
  readonly isWaiting: boolean;
}

export type LogRow = RunRow | SentenceRow;
