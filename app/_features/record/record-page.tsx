'use client';

import { useQuery } from '@tanstack/react-query';
import { useMemo, useState } from 'react';

import { EntriesTable } from '@/app/_features/record/entries-table';
import { EntryFilters, type Filters } from '@/app/_features/record/entry-filters';
import { readWholeLog } from '@/app/_features/record/read-whole-log';
import { recordRows } from '@/app/_features/record/record-rows';
import { TrendSection } from '@/app/_features/record/trend-section';
import { readCaseHead } from '@/app/_live/api';
import { NoticeBar } from '@/app/_ui/notice-bar';
import { Skeleton } from '@/app/_ui/skeleton';
import { applyEntry } from '@/lib/case/apply-entry';
import { initialState } from '@/lib/case/initial-state';
import type { CaseHeadReply, WireEntry } from '@/lib/contracts/http/replies';

/** Every entry of a case as it was committed, with the trend that follows from it. */
export function RecordPage({ caseId }: { readonly caseId: string }) {
  const head = useQuery({ queryKey: ['case-head', caseId], queryFn: () => readCaseHead(caseId) });
  const log = useQuery({ queryKey: ['whole-log', caseId], queryFn: () => readWholeLog(caseId), staleTime: 30_000 });
  const failure = head.error ?? log.error;
  if (failure !== null) return <NoticeBar tone="strong">{failure.message}</NoticeBar>;
  if (head.data === undefined || log.data === undefined) return <Skeleton label="Fetching the record" rows={9} className="mx-auto w-full max-w-7xl px-6 py-8" />;
  return <CaseRecord head={head.data} entries={log.data} />;
}

function CaseRecord({ head, entries }: { readonly head: CaseHeadReply; readonly entries: readonly WireEntry[] }) {
  const [filters, setFilters] = useState<Filters>({ group: 'all', words: '' });
  const state = useMemo(() => entries.reduce(applyEntry, initialState(head.caseId)), [entries, head.caseId]);
  const rows = useMemo(() => recordRows(entries, state.plan, head.timeZone), [entries, state.plan, head.timeZone]);
  const wanted = filters.words.trim().toLowerCase();
  const shown = rows.filter((row) => (filters.group === 'all' || row.group === filters.group) && (wanted === '' || `${row.sentence} ${row.author}`.toLowerCase().includes(wanted)));
  const patient = [head.patientLabel, head.recordNumber].filter((text) => text !== null).join(', ');
  return (
    <div className="mx-auto w-full max-w-7xl px-6 py-8">
      <h1 className="text-3xl font-bold">{state.plan.title}</h1>
      <p className="mt-1 text-second">{`${head.hospitalName}, ${state.plan.theatre}, ${dayOf(entries[0]?.eventAt, head.timeZone)}. ${stateWords(state.status)}. Reference ${head.reference}.${patient === '' ? '' : ` ${patient}.`}`}</p>
      <p className="mt-1 text-second">{`${entries.length} entries, ${state.runCount} runs. Times of ${head.timeZone}.`}</p>
      <TrendSection entries={entries} plan={state.plan} timeZone={head.timeZone} />
      <section aria-label="Entries" className="mt-8">
        <div className="mb-3 flex flex-wrap items-end justify-between gap-4">
          <h2 className="text-xl font-bold">Entries</h2>
          <EntryFilters filters={filters} onFilters={setFilters} />
        </div>
        <p role="status" className="mb-2 text-sm text-second">{shown.length === rows.length ? `All ${rows.length} entries` : `${shown.length} of ${rows.length} entries`}</p>
        <EntriesTable rows={shown} timeZone={head.timeZone} />
      </section>
    </div>
  );
}

function stateWords(status: 'planned' | 'open' | 'closed'): string {
  return { planned: 'Planned, not opened', open: 'Open: the record is still being written', closed: 'Closed' }[status];
}

function dayOf(moment: string | undefined, timeZone: string): string {
  if (moment === undefined) return '';
  return new Intl.DateTimeFormat('en-GB', { timeZone, day: 'numeric', month: 'long', year: 'numeric' }).format(new Date(moment));
}
