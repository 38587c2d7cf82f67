'use client';

import { useQuery } from '@tanstack/react-query';
import { signOut } from 'next-auth/react';
import { useRouter } from 'next/navigation';
import { useState } from 'react';

import { readSession } from '@/app/_live/api';
import { forgetDesk, signOutWarning } from '@/app/_live/sign-out';
import { useDeskSession } from '@/app/_live/use-desk-session';
import { Button } from '@/app/_ui/button';
import { Dialog } from '@/app/_ui/dialog';
import { ThemeToggle } from '@/app/_ui/theme-toggle';

/** Who is signed in, the theme, and the way out. Waiting entries are named before a person leaves them behind. */
export function AccountAside({ hasTheme = true }: { readonly hasTheme?: boolean }) {
  const session = useQuery({ queryKey: ['session'], queryFn: () => readSession() });
  // What waits goes up from every page, and is known before a person leaves.
  useDeskSession();
  const router = useRouter();
  const [warning, setWarning] = useState<string | null>(null);
  const leave = async () => {
    await forgetDesk();
    await signOut({ redirect: false });
    router.replace('/sign-in');
  };
  const handleSignOut = () => {
    const waiting = signOutWarning();
    if (waiting === null) void leave();
    else setWarning(waiting);
  };
  return (
    <>
      <span className="text-second max-sm:sr-only">{session.data?.displayName ?? ''}</span>
      {hasTheme ? <ThemeToggle /> : null}
      <Button onClick={handleSignOut}>Sign out</Button>
      <Dialog isOpen={warning !== null} onOpenChange={(isOpen) => (isOpen ? undefined : setWarning(null))} title="Entries are waiting" description={warning ?? ''}>
        <div className="flex flex-wrap gap-3">
          <Button variant="primary" onClick={() => setWarning(null)}>Stay signed in</Button>
          <Button onClick={() => void leave()}>Sign out all the same</Button>
        </div>
      </Dialog>
    </>
  );
}
