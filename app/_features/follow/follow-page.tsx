'use client';

import { useQuery } from '@tanstack/react-query';

import { FollowedCasePage } from '@/app/_features/follow/followed-case-page';
import { loadCaseHead } from '@/app/_live/case-head';
import { NoticeBar } from '@/app/_ui/notice-bar';
import { Skeleton } from '@/app/_ui/skeleton';

/** One case, live: its head first, from the server or as kept in this browser. */
export function FollowPage({ caseId }: { readonly caseId: string }) {
  const head = useQuery({
    queryKey: ['case-head', caseId],
    queryFn: () => loadCaseHead(caseId),
    refetchInterval: (query) => (query.state.data === undefined ? 3000 : false),
    networkMode: 'always',
  });
  if (head.data !== undefined) return <FollowedCasePage caseId={caseId} head={head.data} />;
  return (
    <>
      {head.isError ? <NoticeBar tone="strong">{head.error.message}</NoticeBar> : null}
      <h1 className="sr-only">Follow</h1>
      <Skeleton label="Fetching the case" rows={9} className="p-6" />
    </>
  );
}
