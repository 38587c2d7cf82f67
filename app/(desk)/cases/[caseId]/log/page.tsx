import type { Metadata } from 'next';

import { requireCase } from '@/app/(desk)/require-person';
import { LogPage } from '@/app/_features/log/log-page';
import { QueryProvider } from '@/app/_ui/query-provider';

export const metadata: Metadata = { title: 'Log' };

/** The console of one case. Nothing of the case stands in the page itself, so that it can be kept for work without a link. */
export default async function Log({ params }: { readonly params: Promise<{ caseId: string }> }) {
  const { caseId } = await params;
  await requireCase(caseId);
  return (
    <QueryProvider>
      <LogPage caseId={caseId} />
    </QueryProvider>
  );
}
