import type { Reading } from '@/lib/response/reading';

/**
 * Amplitude of a reading for a comparison between sites.
 * @param reading what a channel showed
 * @returns µV; 0 for a response that is absent, null when no amplitude was read
 * @source house rule: absent counts as 0 % of baseline, unread counts as nothing
 * @accuracy exact
 * @example
 * amplitudeOf({ kind: 'absent', highestIntensityMa: 18 }) // => 0
 */
export function amplitudeOf(reading: Reading): number | null {
  if (reading.kind === 'absent') return 0;
  return reading.kind === 'measured' ? reading.amplitudeUv : null;
}
