'use client';

import { createContext, useContext } from 'react';

import type { SendOutcome } from '@/app/_live/live-client';
import type { WaitingCommand } from '@/app/_live/live-store';
import type { FollowedCase } from '@/app/_live/use-case-feed';
import type { CaseState } from '@/lib/case/case-state';
import type { CaseEntry } from '@/lib/case/entry-bodies';
import type { PersonCommand } from '@/lib/contracts/http/commands';
import type { CaseHeadReply } from '@/lib/contracts/http/replies';

/** What every part of the page knows of the case it follows, and how it gives a command. */
export interface FollowCase {
  readonly caseId: string;
  readonly head: CaseHeadReply;
  readonly timeZone: string;
  readonly feed: FollowedCase;
  /** Committed entries alone: what is said of the nerve is never ahead of the log. */
  readonly state: CaseState;
  /** Committed entries whose body this viewer may read, oldest first. */
  readonly entries: readonly CaseEntry[];
  /** The viewer's own entries that wait: shown to nobody else. */
  readonly waitingEntries: readonly CaseEntry[];
  readonly waiting: readonly WaitingCommand[];
  readonly isLive: boolean;
  /** The server's clock while live, else the time of the last check. */
  readonly nowMs: number;
  readonly give: (command: PersonCommand) => Promise<SendOutcome>;
}

export const FollowContext = createContext<FollowCase | null>(null);

/** The case this part of the page stands in. */
export function useFollowCase(): FollowCase {
  const held = useContext(FollowContext);
  if (held === null) throw new Error('This part of the page stands outside a followed case');
  return held;
}
