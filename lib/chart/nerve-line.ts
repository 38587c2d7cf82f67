import type { Priority } from '@/lib/alert/judgement';

/** One stimulation site with the response from there. `ageText` is how long ago that response was recorded. */
export interface NerveLineSite {
  readonly siteId: string;
  readonly name: string;
  readonly positionMm: number;
  readonly text: string;
  readonly ageText: string | null;
  readonly priority: Priority | null;
  /** Priority of the response shown; null where only its time passed a limit. */
  readonly textPriority: Priority | null;
  /** True for a response older than the last risk step, the freshness limit or a run that is not compared. */
  readonly isDim: boolean;
}

/**
 * The nerve between two neighbouring sites, or between the most distal site and the channel.
 * Shares are against baseline, 1 for kept; null where they cannot be told.
 */
export interface NerveLineSegment {
  readonly key: string;
  readonly fromMm: number;
  readonly toMm: number;
  readonly amplitudeShare: number | null;
  readonly velocityShare: number | null;
  readonly text: string;
  readonly shortText: string;
  readonly priority: Priority | null;
  /** Priority of the text; null where only the amplitude passed a limit. */
  readonly textPriority: Priority | null;
  /** True without a comparable run at both ends, each the newest there, after the last risk step and the first run of an open alert. */
  readonly isUntested: boolean;
  /** True while the newest run at either end cannot be set against its baseline. */
  readonly isNotCompared: boolean;
  /** True when the response at either end is dim. */
  readonly isDim: boolean;
  readonly isBroken: boolean;
  readonly isShort: boolean;
}

/** Where the response was recorded, at the end of the line. */
export interface NerveLineEnd {
  readonly caption: string;
  readonly name: string;
  readonly positionMm: number;
}

/** One nerve as one channel sees it, ready to be drawn at any size. */
export interface NerveLineView {
  readonly nerveId: string;
  readonly nerveName: string;
  readonly sites: readonly NerveLineSite[];
  readonly segments: readonly NerveLineSegment[];
  readonly end: NerveLineEnd | null;
  /** The same in a sentence, for those who do not see the picture. */
  readonly description: string;
}
