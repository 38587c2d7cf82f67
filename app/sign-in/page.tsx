import type { Metadata } from 'next';
import { headers } from 'next/headers';

import { SignInPanel } from '@/app/_features/sign-in/sign-in-panel';
import { QueryProvider } from '@/app/_ui/query-provider';
import { sourceOf } from '@/server/http/answer-route';

export const metadata: Metadata = { title: 'Sign in' };

/** Sign-in with the caution that everybody reads before work. */
export default async function SignInPage() {
  const demo = await globalThis.fascicle.query('demo-people', {}, sourceOf(await headers()));
  return (
    <QueryProvider>
      <SignInPanel isDemo={demo.isOk} />
    </QueryProvider>
  );
}
