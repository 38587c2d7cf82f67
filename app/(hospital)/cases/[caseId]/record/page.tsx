import type { Metadata } from 'next';

import { requireCase } from '@/app/(desk)/require-person';
import { deskLinks } from '@/app/(desk)/desk-links';
import { RecordPage } from '@/app/_features/record/record-page';
import { AccountAside } from '@/app/_features/sign-in/account-aside';
import { QueryProvider } from '@/app/_ui/query-provider';
import { Shell } from '@/app/_ui/shell';

export const metadata: Metadata = { title: 'Record' };

/** The record of one case, on paper's colours whatever the viewer's theme. */
export default async function CaseRecord({ params }: { readonly params: Promise<{ caseId: string }> }) {
  const { caseId } = await params;
  await requireCase(caseId);
  return (
    <QueryProvider>
      <div data-theme="paper">
        <Shell links={deskLinks} aside={<AccountAside hasTheme={false} />}>
          <RecordPage caseId={caseId} />
        </Shell>
      </div>
    </QueryProvider>
  );
}
