import { readingColumns } from '@/app/_features/log/reading-row';
import { joinClasses } from '@/app/_ui/join-classes';
import type { Channel } from '@/lib/alert/nerve-plan';

interface ReadingHeadingsProps {
  readonly channels: readonly Channel[];
  /** Whether the lines say what the values mean against the baseline. */
  readonly hasPreview: boolean;
}

/** Names of the columns over the lines of a run. Every field has its own full name, so these are for the eye. */
export function ReadingHeadings({ channels, hasPreview }: ReadingHeadingsProps) {
  return (
    <div className={joinClasses(readingColumns, 'pb-1 text-sm text-second')} aria-hidden="true">
      <span />
      <span>Onset, ms</span>
      <span>{`Amplitude, ${amplitudeUnits(channels)}`}</span>
      <span>Neg. peak, ms</span>
      <span>Trace</span>
      <span>{hasPreview ? 'Against baseline' : ''}</span>
    </div>
  );
}

/** mV for muscles, µV for nerves; both where both are recorded. */
function amplitudeUnits(channels: readonly Channel[]): string {
  const hasNerve = channels.some((channel) => channel.kind === 'nerve');
  if (!hasNerve) return 'mV';
  return channels.every((channel) => channel.kind === 'nerve') ? 'µV' : 'mV or µV';
}
