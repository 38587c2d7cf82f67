import type { RuleSet } from '@/lib/alert/rule-set';

/** One end of a segment: the newest run there, and its baseline if the run is comparable. */
export interface SegmentEnd {
  readonly siteId: string;
  readonly at: string;
  readonly onsetMs: number | null;
  /** 0 for an absent response, null when not read. */
  readonly amplitudeUv: number | null;
  readonly isComparable: boolean;
  readonly baselineOnsetMs: number | null;
  readonly baselineAmplitudeUv: number | null;
  readonly baselineScatter: number;
  readonly baselineRunCount: number;
}

/** A pair of neighbouring sites as one channel sees it. */
export interface SegmentPairInput {
  readonly nerveId: string;
  readonly channelId: string;
  readonly proximal: SegmentEnd;
  readonly distal: SegmentEnd;
  /** null where the distances are void or not measured. */
  readonly distanceMm: number | null;
  readonly spansRiskStep: boolean;
  readonly rules: RuleSet;
}
