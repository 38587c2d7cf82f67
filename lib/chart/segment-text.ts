/** The words of a segment, and the same where there is little room. */
export interface SegmentText {
  readonly text: string;
  readonly shortText: string;
}
