'use client';

import { useCallback, useMemo } from 'react';

import { CaseTitle } from '@/app/_features/follow/case-title';
import { FollowContext, type FollowCase } from '@/app/_features/follow/follow-context';
import { FollowNotices } from '@/app/_features/follow/follow-notices';
import { LivePart } from '@/app/_features/follow/live-part';
import { NotLiveCover } from '@/app/_features/follow/not-live-cover';
import { RecentEntries } from '@/app/_features/follow/recent-entries';
import { TalkPanel } from '@/app/_features/follow/talk-panel';
import { giveCommand } from '@/app/_live/give-command';
import { NotLiveLayer } from '@/app/_live/not-live-layer';
import { useCaseFeed } from '@/app/_live/use-case-feed';
import { useIsLive } from '@/app/_live/use-is-live';
import { useNow } from '@/app/_live/use-now';
import { useProvisionalCase } from '@/app/_live/use-provisional-case';
import { Skeleton } from '@/app/_ui/skeleton';
import { upcast } from '@/lib/case/upcast';
import type { PersonCommand } from '@/lib/contracts/http/commands';
import type { CaseHeadReply } from '@/lib/contracts/http/replies';

/** Left what is live, under the layer that covers it whenever it is not; right the talk with the desk, which also works without a link; the entries below. */
export function FollowedCasePage({ caseId, head }: { readonly caseId: string; readonly head: CaseHeadReply }) {
  const held = useFollowed(caseId, head);
  if (held === null) {
    return (
      <>
        <FollowNotices caseId={caseId} />
        <h1 className="sr-only">Follow</h1>
        <Skeleton label="Fetching the log" rows={9} className="p-6" />
      </>
    );
  }
  return (
    <FollowContext.Provider value={held}>
      <FollowNotices caseId={caseId} />
      <CaseTitle />
      <div className="grid min-w-0 flex-1 lg:grid-rows-[auto_1fr] lg:grid-cols-[minmax(0,1fr)_24rem] 2xl:grid-cols-[minmax(0,1fr)_32rem]">
        <div className="relative min-w-0">
          <div inert={!held.isLive} aria-hidden={!held.isLive}>
            <LivePart />
          </div>
          <NotLiveLayer caseId={caseId} className="hatched absolute inset-0 z-10">
            <NotLiveCover />
          </NotLiveLayer>
        </div>
        <TalkPanel />
        <RecentEntries />
      </div>
    </FollowContext.Provider>
  );
}

function useFollowed(caseId: string, head: CaseHeadReply): FollowCase | null {
  const feed = useCaseFeed(caseId, 'follow');
  const provisional = useProvisionalCase(caseId, head.role);
  const isLive = useIsLive(caseId);
  const browserNowMs = useNow(1000);
  const entries = useMemo(() => feed.entries.map(upcast).filter((entry) => entry !== null), [feed.entries]);
  const give = useCallback((command: PersonCommand) => giveCommand(caseId, command), [caseId]);
  const { state, checkedAt } = feed;
  if (state === null || checkedAt === null || provisional === null) return null;
  const nowMs = isLive && browserNowMs > 0 ? browserNowMs : Date.parse(checkedAt);
  return { caseId, head, timeZone: head.timeZone, feed, state, entries, waitingEntries: provisional.entries, waiting: provisional.waiting, isLive, nowMs, give };
}
