'use client';

import { createContext, useContext } from 'react';

import type { SendOutcome } from '@/app/_live/live-client';
import type { WaitingCommand } from '@/app/_live/live-store';
import type { LogDialog } from '@/app/_features/log/log-dialog';
import type { CaseState } from '@/lib/case/case-state';
import type { CaseEntry } from '@/lib/case/entry-bodies';
import type { PersonCommand } from '@/lib/contracts/http/commands';
import type { CaseHeadReply, WireEntry } from '@/lib/contracts/http/replies';

/** What every part of the console knows of its case, and how it gives a command. */
export interface LogCase {
  readonly caseId: string;
  readonly head: CaseHeadReply;
  readonly timeZone: string;
  /** Committed entries and the author's waiting commands on top. */
  readonly state: CaseState;
  readonly entries: readonly WireEntry[];
  readonly waitingEntries: readonly CaseEntry[];
  readonly waiting: readonly WaitingCommand[];
  readonly give: (command: PersonCommand) => Promise<SendOutcome>;
  readonly openDialog: (dialog: LogDialog | null) => void;
}

export const LogContext = createContext<LogCase | null>(null);

/** The case of the console this component stands in. */
export function useLogCase(): LogCase {
  const held = useContext(LogContext);
  if (held === null) throw new Error('This part of the console stands outside a case');
  return held;
}
