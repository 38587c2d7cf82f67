'use client';

import { useQuery } from '@tanstack/react-query';
import Link from 'next/link';

import { CaseRow } from '@/app/_features/cases/case-row';
import { readCases } from '@/app/_live/api';
import { useNow } from '@/app/_live/use-now';
import { EmptyState } from '@/app/_ui/empty-state';
import { NoticeBar } from '@/app/_ui/notice-bar';
import { Skeleton } from '@/app/_ui/skeleton';
import { HeadCell, Table } from '@/app/_ui/table';

const planLink = (
  <Link href="/plan" className="inline-flex min-h-9 items-center rounded border border-stain bg-stain px-3.5 font-bold text-on-stain hover:brightness-110">
    Plan a case
  </Link>
);

/** Every case this person may see, open ones first, newest first. */
export function CaseList() {
  const cases = useQuery({ queryKey: ['cases'], queryFn: readCases, refetchInterval: 10_000 });
  const nowMs = useNow(10_000);
  const order = { open: 0, planned: 1, closed: 2 } as const;
  const rows = [...(cases.data?.cases ?? [])].sort(
    (first, second) => order[first.status] - order[second.status] || second.lastEntryAt.localeCompare(first.lastEntryAt),
  );
  const total = cases.data?.total ?? 0;
  const hospitals = new Set(rows.map((row) => row.hospitalName));
  return (
    <>
      {cases.isError ? <NoticeBar tone="strong">{`${cases.error.message} What stands below may be old.`}</NoticeBar> : null}
      <div className="mx-auto w-full max-w-7xl px-6 py-8">
        <div className="mb-5 flex flex-wrap items-center justify-between gap-4">
          <h1 className="text-2xl font-bold">Cases</h1>
          {rows.length > 0 ? planLink : null}
        </div>
        {cases.isPending ? <Skeleton label="Fetching the cases" rows={6} /> : null}
        {cases.isSuccess && rows.length === 0 ? (
          <EmptyState title="No case yet" text="A case starts with its plan: nerve, sites, channels. It stands here from then on, with its log and its record." action={planLink} />
        ) : null}
        {rows.length > 0 ? (
          <Table caption="Cases">
            <thead>
              <tr>
                <HeadCell>Case</HeadCell>
                <HeadCell>Side</HeadCell>
                <HeadCell>Theatre</HeadCell>
                {hospitals.size > 1 ? <HeadCell>Hospital</HeadCell> : null}
                <HeadCell>State</HeadCell>
                <HeadCell isNumeric>Last entry</HeadCell>
                <HeadCell isNumeric>Age</HeadCell>
                <HeadCell>Reference</HeadCell>
                <HeadCell><span className="sr-only">Pages</span></HeadCell>
              </tr>
            </thead>
            <tbody>
              {rows.map((row) => (
                <CaseRow key={row.caseId} row={row} nowMs={nowMs} isHospitalShown={hospitals.size > 1} />
              ))}
            </tbody>
          </Table>
        ) : null}
        {rows.length < total ? <p className="mt-4 text-second">{`Cut: ${rows.length} of ${total} cases stand here, the open ones and those with the newest entries.`}</p> : null}
      </div>
    </>
  );
}
