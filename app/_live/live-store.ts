'use client';

import { create } from 'zustand';

import type { CaseState } from '@/lib/case/case-state';
import type { EndedMessage } from '@/lib/contracts/channel/messages';
import type { PersonCommand } from '@/lib/contracts/http/commands';
import type { WireEntry } from '@/lib/contracts/http/replies';
import type { ConnectedPerson } from '@/lib/text/today-context';

/** Why a case cannot be shown live, apart from a missing link. None of them passes by itself except `not-found`. */
export type FeedProblem = 'newer-version' | 'fork' | 'not-found' | 'unreadable';

/** What this tab holds of one case. */
export interface CaseFeed {
  /** Committed state; null before the first entry was received. */
  readonly state: CaseState | null;
  /** Committed entries, oldest first, the newest 5,000; empty on a wall. */
  readonly entries: readonly WireEntry[];
  /** Newest number the server told of; may be ahead of `state.seq`. */
  readonly headSeq: number;
  readonly problem: FeedProblem | null;
  readonly ended: EndedMessage['reason'] | null;
  /** Time of the newest database check whose head this feed held completely; null before the first. Stays as "last live" when a problem comes. */
  readonly checkedAt: string | null;
  readonly deskConnected: boolean;
  readonly deskSince: string | null;
  readonly wallsConnected: number;
  /** People who have the case open now; empty on a wall. True only while the case is live. */
  readonly peopleConnected: readonly ConnectedPerson[];
}

/** The one connection of this tab. */
export interface Link {
  readonly isConnected: boolean;
  /** Database time of the newest pulse that was not stale. */
  readonly lastCheckedAt: string | null;
  /** Server clock minus browser clock, ms. */
  readonly offsetMs: number;
  readonly isOffsetMeasured: boolean;
  /** Browser time of the newest pulse that was not stale. */
  readonly lastPulseAtMs: number | null;
}

/** A command that its author gave and that is not committed yet, or was refused and not dismissed. */
export interface WaitingCommand {
  readonly commandId: string;
  readonly personId: string;
  readonly caseId: string;
  /** Order of giving, over all tabs of this browser. */
  readonly order: number;
  readonly eventAt: string;
  /** Offset that `eventAt` contains. */
  readonly offsetMs: number;
  readonly isOffsetMeasured: boolean;
  readonly command: PersonCommand;
  readonly status: 'waiting' | 'refused';
  readonly refusal: { readonly code: string; readonly message: string; readonly field: string | null } | null;
}

/** Who works at this desk. `unconfirmed`: remembered from before, the server was not reached. */
export type DeskSession =
  | { readonly status: 'unknown' | 'signed-out' }
  | { readonly status: 'signed-in' | 'unconfirmed'; readonly personId: string; readonly displayName: string };

/** Everything live in this tab. */
export interface LiveStore {
  readonly feeds: Readonly<Record<string, CaseFeed>>;
  readonly link: Link;
  /** Waiting and refused commands of the signed-in person, in order. */
  readonly waiting: readonly WaitingCommand[];
  readonly session: DeskSession;
  /** False when this browser keeps nothing: entries that wait are lost on reload, and the desk must say so. */
  readonly isStorageDurable: boolean;
  /** Whether this page loads without a link; null before the service worker answered. */
  readonly isPageKept: boolean | null;
}

/** The check that this feed may call itself live by, as it ages; null when nothing, a problem or the server's end forbids it. */
export function checkThatCounts(feed: CaseFeed | undefined): string | null {
  return feed === undefined || feed.problem !== null || feed.ended !== null ? null : feed.checkedAt;
}

/** A feed before anything came. */
export const emptyFeed: CaseFeed = {
  state: null,
  entries: [],
  headSeq: 0,
  problem: null,
  ended: null,
  checkedAt: null,
  deskConnected: false,
  deskSince: null,
  wallsConnected: 0,
  peopleConnected: [],
};

/** Contents before the first connection: nothing known, nothing calm. */
export const emptyLiveStore: LiveStore = {
  feeds: {},
  link: { isConnected: false, lastCheckedAt: null, offsetMs: 0, isOffsetMeasured: false, lastPulseAtMs: null },
  waiting: [],
  session: { status: 'unknown' },
  isStorageDurable: true,
  isPageKept: null,
};

/** The one store of live state. Written only inside `app/_live`. */
export const useLiveStore = create<LiveStore>()(() => emptyLiveStore);
