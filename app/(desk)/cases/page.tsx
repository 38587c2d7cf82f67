import type { Metadata } from 'next';

import { requirePerson } from '@/app/(desk)/require-person';
import { deskLinks } from '@/app/(desk)/desk-links';
import { CaseList } from '@/app/_features/cases/case-list';
import { AccountAside } from '@/app/_features/sign-in/account-aside';
import { QueryProvider } from '@/app/_ui/query-provider';
import { Shell } from '@/app/_ui/shell';

export const metadata: Metadata = { title: 'Cases' };

/** The cases a person may see. */
export default async function CasesPage() {
  await requirePerson();
  return (
    <QueryProvider>
      <Shell links={deskLinks} aside={<AccountAside />}>
        <CaseList />
      </Shell>
    </QueryProvider>
  );
}
