'use client';

import { useMemo, useState } from 'react';

import { EntriesTable } from '@/app/_features/record/entries-table';
import { EntryFilters, type Filters } from '@/app/_features/record/entry-filters';
import { PagedRows } from '@/app/_features/record/paged-rows';
import { recordRows } from '@/app/_features/record/record-rows';
import { RecordSection } from '@/app/_features/record/record-section';
import type { CasePlan } from '@/lib/case/plan';
import type { WireEntry } from '@/lib/contracts/http/replies';

interface EntriesSectionProps {
  readonly entries: readonly WireEntry[];
  readonly plan: CasePlan;
  readonly timeZone: string;
}

/** Every entry of the log as it was committed, with a filter by kind and by words. */
export function EntriesSection({ entries, plan, timeZone }: EntriesSectionProps) {
  const [filters, setFilters] = useState<Filters>({ group: 'all', words: '' });
  const rows = useMemo(() => recordRows(entries, plan, timeZone), [entries, plan, timeZone]);
  const wanted = filters.words.trim().toLowerCase();
  const shown = rows.filter((row) => (filters.group === 'all' || row.group === filters.group) && (wanted === '' || `${row.sentence} ${row.author}`.toLowerCase().includes(wanted)));
  return (
    <RecordSection id="entries" heading="Entries" aside={<div className="print:hidden"><EntryFilters filters={filters} onFilters={setFilters} /></div>}>
      <p role="status" className="mb-2 text-sm text-second">{shown.length === rows.length ? `All ${rows.length} entries` : `${shown.length} of ${rows.length} entries`}</p>
      <PagedRows rows={shown} noun="entries" filterKey={`${filters.group}-${wanted}`}>
        {(page) => <EntriesTable rows={page} timeZone={timeZone} />}
      </PagedRows>
    </RecordSection>
  );
}
