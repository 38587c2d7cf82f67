import type { Metadata } from 'next';

import { pageLinks } from '@/app/(desk)/page-links';
import { requireCase, requirePerson } from '@/app/(desk)/require-person';
import { RecordPage } from '@/app/_features/record/record-page';
import { AccountAside } from '@/app/_features/sign-in/account-aside';
import { QueryProvider } from '@/app/_ui/query-provider';
import { Shell } from '@/app/_ui/shell';

export const metadata: Metadata = { title: 'Record' };

/** The record of one case, on paper's colours whatever the viewer's theme. */
export default async function CaseRecord({ params }: { readonly params: Promise<{ caseId: string }> }) {
  const { caseId } = await params;
  const person = await requirePerson();
  await requireCase(caseId);
  return (
    <QueryProvider>
      <div data-theme="paper">
        <Shell links={pageLinks(person)} aside={<AccountAside hasTheme={false} />}>
          <RecordPage caseId={caseId} />
        </Shell>
      </div>
    </QueryProvider>
  );
}
