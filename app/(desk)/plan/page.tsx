import type { Metadata } from 'next';

import { requirePerson } from '@/app/(desk)/require-person';
import { deskLinks } from '@/app/(desk)/desk-links';
import { PlanPage } from '@/app/_features/plan/plan-page';
import { AccountAside } from '@/app/_features/sign-in/account-aside';
import { QueryProvider } from '@/app/_ui/query-provider';
import { Shell } from '@/app/_ui/shell';

export const metadata: Metadata = { title: 'Plan a case' };

/** Planning: what will be stimulated, where it is recorded, what counts as a change. */
export default async function Plan() {
  await requirePerson();
  return (
    <QueryProvider>
      <Shell links={deskLinks} aside={<AccountAside />}>
        <PlanPage />
      </Shell>
    </QueryProvider>
  );
}
