import type { Channel } from '@/lib/alert/nerve-plan';
import type { Reading, UnusableReason } from '@/lib/response/reading';
import { decimal, milliseconds, millivolts, nonBreakingSpace } from '@/lib/text/format';

/** Why a response could not be used, in the trade's words. */
export const unusableWords: { readonly [R in UnusableReason]: string } = {
  artefact: 'artefact',
  movement: 'movement',
  cautery: 'cautery',
  'wet-field': 'wet field',
  'poor-contact': 'poor contact',
  'off-scale': 'off scale',
};

/** A current with the digits it needs: one, or two below 1 mA. @param value in mA @returns "18.0 mA", "0.35 mA" @source house rule @example milliamperes(18) // => '18.0 mA' */
export function milliamperes(value: number): string {
  return `${decimal(value, value < 1 ? 2 : 1)}${nonBreakingSpace}mA`;
}

/** An amplitude in the unit of its channel: mV for a muscle, µV for a nerve. @returns "3.5 mV", "12 µV" @source common practice */
export function amplitudeWords(amplitudeUv: number, kind: Channel['kind']): string {
  return kind === 'muscle' ? millivolts(amplitudeUv) : `${decimal(amplitudeUv, 1)}${nonBreakingSpace}µV`;
}

/**
 * What one channel showed, in words; never blank.
 *
 * @param reading a reading of one channel; not modified
 * @param kind of the channel: decides the unit of the amplitude
 * @returns "onset 9.71 ms, 3.5 mV", "no response up to 25.0 mA", "not usable, cautery" or "not read"
 * @source practice of the trade: no response is a value with its highest current, unread is never blank (common practice)
 * @accuracy onset to 0.01 ms, muscle amplitude to 0.1 mV; tests/lib/text/reading-words.test.ts
 * @example
 * readingWords({ kind: 'not-read' }, 'muscle') // => 'not read'
 */
export function readingWords(reading: Reading, kind: Channel['kind']): string {
  switch (reading.kind) {
    case 'measured': {
      const onset = reading.onsetMs === null ? 'onset not read' : `onset ${milliseconds(reading.onsetMs)}`;
      const amplitude = reading.amplitudeUv === null ? 'amplitude not read' : amplitudeWords(reading.amplitudeUv, kind);
      const duration = reading.durationMs === null ? '' : `, negative peak ${milliseconds(reading.durationMs)}`;
      return `${onset}, ${amplitude}${duration}`;
    }
    case 'absent':
      return `no response up to ${milliamperes(reading.highestIntensityMa)}`;
    case 'unusable':
      return `not usable, ${unusableWords[reading.reason]}`;
    case 'not-read':
      return 'not read';
  }
}
