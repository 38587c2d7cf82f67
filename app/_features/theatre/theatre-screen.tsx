'use client';

import { PairedWall } from '@/app/_features/theatre/paired-wall';
import { PairingPicture } from '@/app/_features/theatre/pairing-picture';
import { useScreen, type ScreenStanding } from '@/app/_features/theatre/use-screen';
import { useWallSettings } from '@/app/_features/theatre/use-wall-settings';
import { clockTime } from '@/lib/text/format';

/** The theatre screen: its code while it belongs to no case, its case once it is paired. Read-only and silent. */
export function TheatreScreen() {
  const settings = useWallSettings();
  const standing = useScreen();
  const { reply } = standing;
  return (
    <div data-theme={settings.theme}>
      {reply?.kind === 'paired' ? (
        <PairedWall key={reply.caseId} caseId={reply.caseId} timeZone={reply.timeZone} settings={settings} />
      ) : (
        <PairingPicture
          pairing={reply === null ? null : { code: reply.code, words: reply.words }}
          ended={endedWords(standing)}
          problem={standing.problem}
          settings={settings}
        />
      )}
    </div>
  );
}

function endedWords({ ended }: ScreenStanding): string | null {
  if (ended === null) return null;
  const time = clockTime(ended.at, ended.timeZone);
  return ended.reason === 'case-closed' ? `Case closed ${time}` : `Taken off the case ${time}`;
}
