'use client';

import { useQuery } from '@tanstack/react-query';

import { PlannedCases } from '@/app/_features/today/planned-cases';
import { TodayList } from '@/app/_features/today/today-list';
import { readCases, readSession } from '@/app/_live/api';
import { EmptyState } from '@/app/_ui/empty-state';
import { NoticeBar } from '@/app/_ui/notice-bar';
import { Skeleton } from '@/app/_ui/skeleton';

/** Every live case of this person at once, the most needed first; what is planned below. */
export function TodayPage() {
  const session = useQuery({ queryKey: ['session'], queryFn: () => readSession() });
  const cases = useQuery({ queryKey: ['cases'], queryFn: readCases, refetchInterval: 10_000 });
  const live = cases.data?.cases.filter((line) => line.status === 'open') ?? [];
  const planned = cases.data?.cases.filter((line) => line.status === 'planned') ?? [];
  const problem = cases.error ?? session.error;
  const isLoading = cases.data === undefined || session.data === undefined;
  return (
    <>
      {problem === null ? null : <NoticeBar tone="strong">{`${problem.message} A case that was opened since may be missing here.`}</NoticeBar>}
      <div className="mx-auto w-full max-w-[112rem] px-4 py-5 sm:px-6">
        {isLoading ? (
          <>
            <h1 className="mb-5 text-[1.7em] leading-tight font-bold">Today</h1>
            <Skeleton label="Fetching your cases" rows={9} />
          </>
        ) : (
          <>
            <TodayList cases={live} person={session.data} />
            {live.length === 0 ? (
              <EmptyState title="Nothing to follow now" text="A case stands here from its opening to its close, with its nerve, its state and what waits. You see the cases whose team you are in." />
            ) : null}
            <PlannedCases cases={planned} />
          </>
        )}
      </div>
    </>
  );
}
