import Link from 'next/link';

import type { CaseLine } from '@/lib/contracts/http/replies';
import { clockTime } from '@/lib/text/format';

/** Cases that are planned and not opened yet, the oldest first. Nothing of them is monitored. */
export function PlannedCases({ cases }: { readonly cases: readonly CaseLine[] }) {
  if (cases.length === 0) return null;
  const inOrder = [...cases].sort((first, second) => (first.plannedAt < second.plannedAt ? -1 : 1));
  return (
    <section aria-labelledby="planned" className="mt-8">
      <h2 id="planned" className="mb-1 text-[1.2em] font-bold">Planned, not opened</h2>
      <ul>
        {inOrder.map((line) => (
          <li key={line.caseId} className="flex flex-wrap items-baseline gap-x-6 border-b border-rule py-2">
            <Link href={`/cases/${line.caseId}/follow`} prefetch={false} className="inline-flex min-h-9 items-center font-semibold underline-offset-4 hover:underline">{line.title}</Link>
            <span className="text-second">{`${line.theatre}, planned ${clockTime(line.plannedAt, line.timeZone)}`}</span>
          </li>
        ))}
      </ul>
    </section>
  );
}
