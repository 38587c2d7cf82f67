'use client';

import { NotLivePicture } from '@/app/_features/theatre/not-live-picture';
import { notLiveReason } from '@/app/_features/theatre/not-live-reason';
import { TheatrePicture } from '@/app/_features/theatre/theatre-picture';
import { usePaintConfirmation } from '@/app/_features/theatre/use-paint-confirmation';
import type { WallSettings } from '@/app/_features/theatre/wall-settings';
import { NotLiveLayer } from '@/app/_live/not-live-layer';
import { useCaseFeed, type FollowedCase } from '@/app/_live/use-case-feed';
import { useIsLive } from '@/app/_live/use-is-live';
import { useNow } from '@/app/_live/use-now';
import type { CaseState } from '@/lib/case/case-state';
import { shownNerves } from '@/lib/chart/shown-nerves';
import { clockTime } from '@/lib/text/format';
import { theatreView } from '@/lib/text/theatre-view';

interface PairedWallProps {
  readonly caseId: string;
  readonly timeZone: string;
  readonly settings: WallSettings;
}

/** A wall bound to a case: its picture, and over it the layer that covers it whenever it is not live. */
export function PairedWall({ caseId, timeZone, settings }: PairedWallProps) {
  const feed = useCaseFeed(caseId, 'wall');
  const shown = feed.state === null || feed.checkedAt === null ? null : { state: feed.state, checkedAt: feed.checkedAt };
  return (
    <>
      {shown === null ? <main className="sr-only">Waiting for the case</main> : <LivePicture feed={feed} state={shown.state} checkedAt={shown.checkedAt} timeZone={timeZone} settings={settings} />}
      <NotLiveLayer caseId={caseId} className="relative z-10">
        {shown === null ? (
          <NotLivePicture place="Theatre screen" procedure="" reason={notLiveReason(feed.problem)} lastLive={null} lines={[]} settings={settings} />
        ) : (
          <PastPicture problem={feed.problem} state={shown.state} checkedAt={shown.checkedAt} timeZone={timeZone} settings={settings} />
        )}
      </NotLiveLayer>
    </>
  );
}

interface ShownCase {
  readonly state: CaseState;
  /** Database time of the newest check whose head this wall holds. */
  readonly checkedAt: string;
  readonly timeZone: string;
  readonly settings: WallSettings;
}

function LivePicture({ feed, state, checkedAt, timeZone, settings }: ShownCase & { readonly feed: FollowedCase }) {
  const browserNowMs = useNow(1000);
  const isLive = useIsLive(state.caseId);
  // Not live, the picture below the layer stays at its last check: it must not age into something never shown.
  const nowMs = isLive && browserNowMs > 0 ? browserNowMs : Date.parse(checkedAt);
  const view = theatreView(state, nowMs, timeZone);
  usePaintConfirmation(state, view, isLive);
  return (
    <TheatrePicture
      place={placeOf(state)}
      procedure={state.plan.procedure}
      clock={clockTime(new Date(nowMs).toISOString(), timeZone, { seconds: true })}
      isLive={isLive}
      deskWords={feed.deskConnected ? null : deskWords(feed.deskSince, timeZone)}
      view={view}
      nerves={shownNerves(state, view.lead.kind, nowMs)}
      settings={settings}
    />
  );
}

function PastPicture({ problem, state, checkedAt, timeZone, settings }: ShownCase & Pick<FollowedCase, 'problem'>) {
  const view = theatreView(state, Date.parse(checkedAt), timeZone);
  return (
    <NotLivePicture
      place={placeOf(state)}
      procedure={state.plan.procedure}
      reason={notLiveReason(problem)}
      lastLive={clockTime(checkedAt, timeZone, { seconds: true })}
      lines={[view.lead, ...view.others]}
      settings={settings}
    />
  );
}

function placeOf(state: CaseState): string {
  return `${state.plan.theatre}, ${state.plan.side}`;
}

function deskWords(since: string | null, timeZone: string): string {
  return since === null ? 'Desk not connected' : `Desk not connected since ${clockTime(since, timeZone)}`;
}
