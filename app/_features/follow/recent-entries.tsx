'use client';

import { useFollowCase } from '@/app/_features/follow/follow-context';
import { clockTime } from '@/lib/text/format';
import { entrySentence } from '@/lib/text/entry-sentence';

const mostShown = 40;

/** The newest entries in sentences, newest first; all of them stand in the record. */
export function RecentEntries() {
  const { caseId, entries, state, timeZone, isLive, feed } = useFollowCase();
  const shown = entries.slice(-mostShown).reverse();
  return (
    <section aria-labelledby="entries" className="min-w-0 px-4 py-3 sm:px-6">
      <h2 id="entries" className="mb-1 font-bold">{isLive ? 'Entries' : `Entries known at ${clockTime(feed.checkedAt ?? state.phaseAt, timeZone, { seconds: true })}`}</h2>
      <ol reversed start={shown[0]?.seq ?? 1}>
        {shown.map((entry) => (
          <li key={entry.seq} className="slides-in flex gap-3 border-b border-rule py-1">
            <span className="shrink-0 font-mono text-second">{clockTime(entry.eventAt, timeZone, { seconds: true })}</span>
            <span className="min-w-0">{entrySentence(entry, state.plan, timeZone)}</span>
          </li>
        ))}
      </ol>
      {entries.length > mostShown ? <a href={`/cases/${caseId}/record`} className="mt-2 inline-flex min-h-9 items-center font-semibold text-stain underline underline-offset-4">{`All ${entries.length} entries, in the record`}</a> : null}
    </section>
  );
}
