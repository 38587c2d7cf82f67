import type { Metadata } from 'next';

import { pageLinks } from '@/app/(desk)/page-links';
import { requirePerson } from '@/app/(desk)/require-person';
import { PlanPage } from '@/app/_features/plan/plan-page';
import { AccountAside } from '@/app/_features/sign-in/account-aside';
import { QueryProvider } from '@/app/_ui/query-provider';
import { Shell } from '@/app/_ui/shell';

export const metadata: Metadata = { title: 'Plan a case' };

/** Planning: what will be stimulated, where it is recorded, what counts as a change. */
export default async function Plan() {
  const person = await requirePerson();
  return (
    <QueryProvider>
      <Shell links={pageLinks(person)} aside={<AccountAside />}>
        <PlanPage />
      </Shell>
    </QueryProvider>
  );
}
