import { ReadingHeadings } from '@/app/_features/log/reading-headings';
import { ReadingRow } from '@/app/_features/log/reading-row';
import { notReadDraft } from '@/app/_features/log/run-draft';
import type { RunFormParts } from '@/app/_features/log/use-run-form';

interface ReadingRowsProps {
  readonly form: RunFormParts;
  readonly onFocusChannel: (channelId: string) => void;
}

/** One line for each channel that records from the chosen site, with what it would mean against the baseline. */
export function ReadingRows({ form, onFocusChannel }: ReadingRowsProps) {
  const { draft, channels, sentences, judged } = form;
  const { siteId, intensity } = draft.settings;
  if (channels.length === 0) return <p className="text-second">No channel records from this site</p>;
  return (
    <div className="overflow-x-auto">
      <ReadingHeadings channels={channels} hasPreview />
      {channels.map((channel) => {
        const path = judged?.paths.find((one) => one.pathId === `${siteId}/${channel.id}`);
        const segments = judged?.segments.filter((segment) => segment.channelId === channel.id) ?? [];
        const segment = segments.find((candidate) => candidate.proximalSiteId === siteId) ?? segments[0] ?? null;
        return (
          <ReadingRow
            key={channel.id}
            channel={channel}
            typed={draft.channels[channel.id] ?? notReadDraft}
            intensity={intensity}
            sentences={sentences}
            preview={path === undefined ? null : { path, segment }}
            onType={(typed) => form.typeChannel(channel.id, typed)}
            onFocus={() => onFocusChannel(channel.id)}
          />
        );
      })}
    </div>
  );
}
