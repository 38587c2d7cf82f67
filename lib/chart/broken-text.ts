import type { PathRecord } from '@/lib/case/case-state';
import type { SegmentText } from '@/lib/chart/segment-text';

/**
 * What stands under a break: no response, with the highest current tried.
 * @param record the path without a response; undefined when there is none
 * @returns text and short text; the current in mA as it was logged
 * @source product rule: a break says the highest current tried
 * @accuracy exact
 * @example
 * brokenText(record).text // => 'no response up to 25 mA'
 */
export function brokenText(record: PathRecord | undefined): SegmentText {
  const reading = record?.compared?.reading;
  if (reading?.kind !== 'absent') return { text: 'no response', shortText: 'none' };
  const current = `${reading.highestIntensityMa}\u00a0mA`;
  return { text: `no response up to ${current}`, shortText: `none to ${current}` };
}
