'use client';

import { useCallback, useMemo, useState } from 'react';

import { ConsoleBody } from '@/app/_features/log/console-body';
import { ConsoleNotices } from '@/app/_features/log/console-notices';
import { LogContext, type LogCase } from '@/app/_features/log/log-context';
import type { LogDialog } from '@/app/_features/log/log-dialog';
import { LogDialogs } from '@/app/_features/log/log-dialogs';
import { LogHeaderAside, LogHeaderTitle } from '@/app/_features/log/log-header';
import { giveCommand } from '@/app/_live/give-command';
import { useCaseFeed } from '@/app/_live/use-case-feed';
import { useProvisionalCase } from '@/app/_live/use-provisional-case';
import { Shell } from '@/app/_ui/shell';
import { Skeleton } from '@/app/_ui/skeleton';
import type { PersonCommand } from '@/lib/contracts/http/commands';
import type { CaseHeadReply } from '@/lib/contracts/http/replies';

interface LogConsoleProps {
  readonly caseId: string;
  readonly head: CaseHeadReply;
  readonly isSignedOut: boolean;
}

/** One page for the whole operation: next run, nerve, what is due, the log. Works on without a link. */
export function LogConsole({ caseId, head, isSignedOut }: LogConsoleProps) {
  const feed = useCaseFeed(caseId, head.mayWrite ? 'person' : 'follow');
  const held = useProvisionalCase(caseId, head.role);
  const [dialog, setDialog] = useState<LogDialog | null>(null);
  const give = useCallback((command: PersonCommand) => giveCommand(caseId, command), [caseId]);
  const logCase = useMemo<LogCase | null>(
    () =>
      held === null
        ? null
        : { caseId, head, timeZone: head.timeZone, state: held.state, entries: feed.entries, waitingEntries: held.entries, waiting: held.waiting, give, openDialog: setDialog },
    [held, caseId, head, feed.entries, give],
  );
  return (
    <LogContext.Provider value={logCase}>
      <Shell links={[]} isFilled title={<LogHeaderTitle />} aside={<LogHeaderAside caseId={caseId} />}>
        <ConsoleNotices caseId={caseId} feed={feed} refusals={held?.refusals ?? []} isSignedOut={isSignedOut} mayWrite={head.mayWrite} />
        {logCase === null ? <Skeleton label="Fetching the log" rows={9} className="p-8" /> : <ConsoleBody areKeysOn={dialog === null && head.mayWrite} />}
        {logCase === null || dialog === null ? null : <LogDialogs dialog={dialog} onClose={() => setDialog(null)} />}
      </Shell>
    </LogContext.Provider>
  );
}
