/** Largest deviation of an amplitude from run to run, as a share: inside the 3 to 14 % that a session shows (see the baseline scatter). */
const amplitudeShare = 0.02;
/** Largest deviation of an onset mark, ms: two small steps of a marker (house rule). */
const onsetMs = 0.012;

/** How one reading deviates from the model. */
export interface Deviation {
  readonly amplitudeShare: number;
  readonly onsetMs: number;
}

/** The deviation of the reading with this ordinal: the same at each playing, without order, and 0 on average. */
export function scatter(ordinal: number): Deviation {
  return { amplitudeShare: amplitudeShare * unrest(2 * ordinal), onsetMs: onsetMs * unrest(2 * ordinal + 1) };
}

/** A number from −1 to 1 from the bits of an ordinal, mixed by two multiplications. */
function unrest(ordinal: number): number {
  const first = Math.imul((ordinal + 1) ^ 0x9e3779b9, 0x85ebca6b);
  const second = Math.imul(first ^ (first >>> 13), 0xc2b2ae35);
  return ((second ^ (second >>> 16)) >>> 0) / 0x7fffffff - 1;
}
