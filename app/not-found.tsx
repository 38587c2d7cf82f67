import Link from 'next/link';

import { Mark } from '@/app/_ui/mark';

/** The answer for every address that is not there, or not for this person: the two are never told apart. */
export default function NotFound() {
  return (
    <main className="mx-auto flex min-h-dvh max-w-xl flex-col justify-center gap-4 px-6">
      <Mark sizePx={36} />
      <h1 className="text-2xl font-bold">Not found</h1>
      <p className="text-lg text-second">
        Nothing stands at this address, or it is not open to the person who is signed in. Check the address, or ask the
        neurophysiologist of the case.
      </p>
      <p>
        <Link href="/" className="inline-flex min-h-9 items-center font-semibold text-stain underline underline-offset-4">
          Back to the cases
        </Link>
      </p>
    </main>
  );
}
