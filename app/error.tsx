'use client';

import { Button } from '@/app/_ui/button';
import { Mark } from '@/app/_ui/mark';

/** A page that broke says so and offers the only useful step. What was committed is in the log. */
export default function PageError({ reset }: { readonly error: Error; readonly reset: () => void }) {
  return (
    <main className="mx-auto flex min-h-dvh max-w-xl flex-col justify-center gap-4 px-6">
      <Mark sizePx={36} />
      <h1 className="text-2xl font-bold">This page stopped</h1>
      <p className="text-lg text-second" role="alert">
        The page met an error and shows nothing rather than something wrong. Entries already saved are in the log; entries
        that were waiting are kept in this browser.
      </p>
      <p>
        <Button variant="primary" onClick={reset}>
          Load again
        </Button>
      </p>
    </main>
  );
}
