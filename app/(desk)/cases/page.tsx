import type { Metadata } from 'next';

import { pageLinks } from '@/app/(desk)/page-links';
import { requirePerson } from '@/app/(desk)/require-person';
import { CaseList } from '@/app/_features/cases/case-list';
import { AccountAside } from '@/app/_features/sign-in/account-aside';
import { QueryProvider } from '@/app/_ui/query-provider';
import { Shell } from '@/app/_ui/shell';

export const metadata: Metadata = { title: 'Cases' };

/** The cases a person may see. */
export default async function CasesPage() {
  const person = await requirePerson();
  return (
    <QueryProvider>
      <Shell links={pageLinks(person)} aside={<AccountAside />}>
        <CaseList />
      </Shell>
    </QueryProvider>
  );
}
