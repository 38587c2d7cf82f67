import type { SegmentText } from '@/lib/chart/segment-text';

/** Whether a measured value says how the nerve is now, was measured before that, or by a run that cannot be compared. */
export type Standing = 'current' | 'older' | 'not-compared';

/**
 * A measured value with how it stands: what is older is said as older.
 * @param measured words of the value and their short form
 * @param standing 'current' leaves the words as they are
 * @returns words and short words; the short form of a value that is not compared says only that
 * @source house rule: the past tense for what may have changed
 * @accuracy exact; tests/lib/chart/standing-text.test.ts
 * @example
 * standingText({ text: '61 m/s', shortText: '61 m/s' }, 'older').text // => 'was 61 m/s'
 */
export function standingText(measured: SegmentText, standing: Standing): SegmentText {
  if (standing === 'current' || measured.text === '') return measured;
  if (standing === 'not-compared') return { text: `${measured.text}, not compared`, shortText: 'not compared' };
  return { text: `was ${measured.text}`, shortText: `was ${measured.shortText}` };
}
