/** A run by its time and number. */
export interface RunMark {
  readonly at: string;
  readonly seq: number;
}

/**
 * Whether a run was made at or after another: by the time of the stimulus, and by number where the times are equal.
 * @param run the run in question
 * @param mark the run it is held against
 * @returns true for the same run and for every later one; a late entry of an earlier time is not later
 * @source house rule: the number says when an entry arrived, not when its stimulus was given
 * @accuracy exact; tests/lib/case/late-entry.test.ts
 * @example
 * isSince({ at: '2027-03-14T10:41:00.000Z', seq: 31 }, { at: '2027-03-14T10:41:00.000Z', seq: 30 }) // => true
 */
export function isSince(run: RunMark, mark: RunMark): boolean {
  return run.at > mark.at || (run.at === mark.at && run.seq >= mark.seq);
}
