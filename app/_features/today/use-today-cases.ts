'use client';

import { checkThatCounts, useLiveStore, type CaseFeed } from '@/app/_live/live-store';
import { isLiveAt } from '@/app/_live/use-is-live';
import { useNow } from '@/app/_live/use-now';
import type { CaseState } from '@/lib/case/case-state';
import type { CaseLine, SessionReply } from '@/lib/contracts/http/replies';
import type { TodayContext } from '@/lib/text/today-context';
import { todayLine, type TodayLine } from '@/lib/text/today-line';
import { todayOrder } from '@/lib/text/today-order';
import { unseenLine } from '@/lib/text/unseen-line';

/** One case of the page: as the list of cases has it, as its feed has it, and in words. */
export interface TodayCase {
  readonly listed: CaseLine;
  readonly feed: CaseFeed | undefined;
  /** Committed state of a case that was seen live; null before. */
  readonly state: CaseState | null;
  readonly nowMs: number;
  readonly line: TodayLine;
  /** What stands under the layer while the case is not live: the same moment in the past tense. */
  readonly past: TodayLine;
}

/** The live cases in the order of need. A case that closed since the list was read is over and not shown. */
export function useTodayCases(cases: readonly CaseLine[], person: SessionReply): readonly TodayCase[] {
  const feeds = useLiveStore((store) => store.feeds);
  const browserNowMs = useNow(500);
  return cases
    .map((listed) => todayCase(listed, feeds[listed.caseId], person, browserNowMs))
    .filter(({ state }) => state?.status !== 'closed')
    .sort((first, second) => todayOrder(first.line, second.line));
}

function todayCase(listed: CaseLine, feed: CaseFeed | undefined, person: SessionReply, browserNowMs: number): TodayCase {
  const { caseId, theatre, timeZone } = listed;
  if (feed?.state == null || feed.checkedAt === null) {
    const unseen = unseenLine(caseId, theatre);
    return { listed, feed, state: null, nowMs: 0, line: unseen, past: unseen };
  }
  const isLive = isLiveAt(checkThatCounts(feed), browserNowMs);
  const checkedAtMs = Date.parse(feed.checkedAt);
  const nowMs = isLive ? browserNowMs : checkedAtMs;
  const { deskConnected, deskSince, peopleConnected, state } = feed;
  const viewer = { personId: person.personId, role: roleIn(state, person) };
  const context: TodayContext = { nowMs, timeZone, isLive, deskConnected, deskSince, peopleConnected, viewer };
  const past = todayLine(state, { ...context, nowMs: checkedAtMs, isLive: false });
  return { listed, feed, state, nowMs, line: isLive ? todayLine(state, context) : past, past };
}

/** As what this person takes part: as the case's team has them, else as they work in the hospital. */
function roleIn(state: CaseState, { personId, memberships }: SessionReply): string {
  const inTeam = state.team.find((member) => member.personId === personId)?.role;
  const roles = memberships.map(({ role }) => role);
  return inTeam ?? (roles.includes('physician') ? 'physician' : (roles[0] ?? ''));
}
