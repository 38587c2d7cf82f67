'use client';

import { usePathname } from 'next/navigation';

import { NoticeBar } from '@/app/_ui/notice-bar';

/** The session ended: what is logged waits in this browser until its person signs in again. */
export function SignedOutBar() {
  const path = usePathname();
  return (
    <NoticeBar
      tone="strong"
      action={<a href={`/sign-in?next=${encodeURIComponent(path)}`} className="inline-flex min-h-9 items-center font-bold underline underline-offset-4">Sign in again</a>}
    >
      Signed out: what is logged here waits in this browser for you
    </NoticeBar>
  );
}
