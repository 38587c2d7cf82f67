import type { Metadata } from 'next';

import { pageLinks } from '@/app/(desk)/page-links';
import { requireCase, requirePerson } from '@/app/(desk)/require-person';
import { FollowPage } from '@/app/_features/follow/follow-page';
import { AccountAside } from '@/app/_features/sign-in/account-aside';
import { QueryProvider } from '@/app/_ui/query-provider';
import { Shell } from '@/app/_ui/shell';

export const metadata: Metadata = { title: 'Follow' };

/** One case live and read-only, for the physician who answers for it. */
export default async function Follow({ params }: { readonly params: Promise<{ caseId: string }> }) {
  const { caseId } = await params;
  const person = await requirePerson();
  await requireCase(caseId);
  return (
    <QueryProvider>
      <Shell links={pageLinks(person)} aside={<AccountAside />}>
        <FollowPage caseId={caseId} />
      </Shell>
    </QueryProvider>
  );
}
