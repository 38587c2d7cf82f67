import type { Metadata } from 'next';

import { pageLinks } from '@/app/(desk)/page-links';
import { requirePerson } from '@/app/(desk)/require-person';
import { AccountAside } from '@/app/_features/sign-in/account-aside';
import { TodayPage } from '@/app/_features/today/today-page';
import { QueryProvider } from '@/app/_ui/query-provider';
import { Shell } from '@/app/_ui/shell';

export const metadata: Metadata = { title: 'Today' };

/** Several cases at once, for the physician who follows them and the neurophysiologist who changes between them. */
export default async function Today() {
  const person = await requirePerson();
  return (
    <QueryProvider>
      <Shell links={pageLinks(person)} aside={<AccountAside />}>
        <TodayPage />
      </Shell>
    </QueryProvider>
  );
}
