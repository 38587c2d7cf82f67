'use client';

import { useQuery } from '@tanstack/react-query';

import { LogConsole } from '@/app/_features/log/log-console';
import { SignedOutBar } from '@/app/_features/log/signed-out-bar';
import { loadCaseHead } from '@/app/_live/case-head';
import { KeepPage } from '@/app/_live/keep-page';
import { useDeskSession } from '@/app/_live/use-desk-session';
import { NoticeBar } from '@/app/_ui/notice-bar';
import { Shell } from '@/app/_ui/shell';
import { Skeleton } from '@/app/_ui/skeleton';

const links = [{ href: '/cases', label: 'Cases' }] as const;

/** The console of a case: its head first, from the server or as kept in this browser. */
export function LogPage({ caseId }: { readonly caseId: string }) {
  const session = useDeskSession();
  const head = useQuery({
    queryKey: ['case-head', caseId],
    queryFn: () => loadCaseHead(caseId),
    refetchInterval: (query) => (query.state.data === undefined ? 3000 : false),
    networkMode: 'always',
  });
  return (
    <>
      <KeepPage />
      {head.data === undefined ? (
        <Shell links={links} isFilled>
          {head.isError ? <NoticeBar tone="strong">{head.error.message}</NoticeBar> : null}
          {session.status === 'signed-out' ? <SignedOutBar /> : null}
          <Skeleton label="Fetching the case" rows={9} className="p-8" />
        </Shell>
      ) : (
        <LogConsole caseId={caseId} head={head.data} isSignedOut={session.status === 'signed-out'} />
      )}
    </>
  );
}
