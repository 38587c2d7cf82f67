'use client';

import './globals.css';

import { Button } from '@/app/_ui/button';

/** Stands in when even the frame of the page broke. Plain on purpose: it must not need anything that can fail. */
export default function GlobalError({ reset }: { readonly error: Error; readonly reset: () => void }) {
  return (
    <html lang="en-GB" data-theme="theatre">
      <body className="min-h-dvh font-sans text-base">
        <main className="mx-auto flex min-h-dvh max-w-xl flex-col justify-center gap-4 px-6">
          <title>Stopped · Fascicle</title>
          <h1 className="text-2xl font-bold">Fascicle stopped on this screen</h1>
          <p className="text-lg text-second" role="alert">
            Nothing is shown because nothing can be shown correctly. Entries already saved are in the log.
          </p>
          <p>
            <Button variant="primary" onClick={reset}>
              Load again
            </Button>
          </p>
        </main>
      </body>
    </html>
  );
}
