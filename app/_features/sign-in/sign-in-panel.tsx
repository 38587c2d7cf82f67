'use client';

import { useQuery } from '@tanstack/react-query';
import { useEffect, useRef, useState } from 'react';

import { DemoPeople } from '@/app/_features/sign-in/demo-people';
import { readDemoPeople } from '@/app/_features/sign-in/read-demo-people';
import type { DemoPerson } from '@/lib/contracts/http/account';
import { SignInForm, type Credentials } from '@/app/_features/sign-in/sign-in-form';
import { Mark } from '@/app/_ui/mark';
import { ThemeToggle } from '@/app/_ui/theme-toggle';

const empty: Credentials = { email: '', password: '', code: '' };

/** The way in: the form, the caution, and in a demo the people who can be tried. */
export function SignInPanel({ isDemo }: { readonly isDemo: boolean }) {
  const [typed, setTyped] = useState(empty);
  const offered = useRef<DemoPerson | null>(null);
  const submit = useRef<HTMLButtonElement>(null);
  const demo = useQuery({ queryKey: ['demo-people'], queryFn: readDemoPeople, refetchInterval: 3000, enabled: isDemo });
  const people = demo.data ?? [];

  // A code lives half a minute: while the offered one stands untouched in the form, it is kept fresh.
  useEffect(() => {
    const old = offered.current;
    const fresh = demo.data?.find((person) => person.email === old?.email);
    if (old === null || fresh === undefined || fresh.code === old.code) return;
    offered.current = fresh;
    setTyped((now) => (now.email === old.email && now.code === old.code ? { ...now, code: fresh.code } : now));
  }, [demo.data]);

  const handleChoose = (person: DemoPerson) => {
    offered.current = person;
    setTyped({ email: person.email, password: person.password, code: person.code });
    submit.current?.focus();
  };
  return (
    <div className="flex min-h-dvh flex-col">
      <header className="flex min-h-13 items-center justify-between border-b border-rule px-5">
        <span className="flex items-center gap-2 text-lg font-bold"><Mark />Fascicle</span>
        <ThemeToggle />
      </header>
      <main className="mx-auto grid w-full max-w-4xl flex-1 content-center items-start gap-x-20 gap-y-10 px-6 py-10 md:grid-cols-2">
        <div className="flex flex-col gap-6">
          <div>
            <h1 className="text-2xl font-bold">Sign in</h1>
            <p className="mt-1 text-second">The live log of peripheral nerve monitoring, from the desk to the surgeon’s wall.</p>
          </div>
          <SignInForm typed={typed} onType={setTyped} submitRef={submit} />
          <Caution />
        </div>
        {people.length > 0 ? <DemoPeople people={people} onChoose={handleChoose} /> : null}
      </main>
    </div>
  );
}

function Caution() {
  return (
    <aside aria-label="Caution" className="border-t border-rule pt-4 text-sm text-second">
      <p>
        An aid for qualified staff, not a certified medical device. It states what was measured and how it changed; what
        follows from that is decided by people. Local protocols and licensed judgement come first.
      </p>
    </aside>
  );
}
