/** Why a response could not be judged although the stimulus was given. Trade's words, common practice. */
export type UnusableReason = 'artefact' | 'movement' | 'cautery' | 'wet-field' | 'poor-contact' | 'off-scale';

/**
 * What one channel showed after one stimulus. "Response" means the evoked response.
 * `measured` holds what was read, a value that was not read is null and at least one is read;
 * `absent` is no response recorded, with the highest current tried; `not-read` is a channel nobody looked at.
 * @source practice of the trade: no response is a value of its own, never blank and never 0 (common practice)
 */
export type Reading =
  | {
      readonly kind: 'measured';
      readonly onsetMs: number | null;
      readonly amplitudeUv: number | null;
      readonly durationMs: number | null;
    }
  | { readonly kind: 'absent'; readonly highestIntensityMa: number }
  | { readonly kind: 'unusable'; readonly reason: UnusableReason }
  | { readonly kind: 'not-read' };

/** A reading together with the channel it was taken from. */
export interface ChannelReading {
  readonly channelId: string;
  readonly reading: Reading;
}
