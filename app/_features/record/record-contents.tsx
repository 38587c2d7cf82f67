'use client';

import { useEffect, useState } from 'react';

import { Button } from '@/app/_ui/button';
import { joinClasses } from '@/app/_ui/join-classes';

/** A section of the record by its anchor. */
export interface ContentsLine {
  readonly id: string;
  readonly label: string;
}

/** The list of sections, always in sight on a wide window; the one that is being read is marked. */
export function RecordContents({ lines }: { readonly lines: readonly ContentsLine[] }) {
  const here = useSectionInSight(lines);
  return (
    <nav aria-label="Contents" className="record-contents max-h-dvh shrink-0 self-start overflow-y-auto py-4 lg:sticky lg:top-0 lg:w-56 lg:py-8">
      <ol className="flex flex-wrap gap-x-5 lg:flex-col">
        {lines.map(({ id, label }) => (
          <li key={id}>
            <a href={`#${id}`} aria-current={here === id ? 'true' : undefined} className={joinClasses('inline-flex min-h-9 items-center pointer-coarse:min-h-11', here === id ? 'font-bold text-ink' : 'text-second hover:text-ink')}>
              {label}
            </a>
          </li>
        ))}
      </ol>
      <Button className="mt-4" onClick={() => window.print()}>Print</Button>
    </nav>
  );
}

/** The last section whose head has passed the upper third of the window. */
function useSectionInSight(lines: readonly ContentsLine[]): string | null {
  const [here, setHere] = useState(lines[0]?.id ?? null);
  useEffect(() => {
    const look = () => {
      const passed = lines.filter(({ id }) => (document.getElementById(id)?.getBoundingClientRect().top ?? Infinity) < window.innerHeight / 3);
      setHere(passed.at(-1)?.id ?? lines[0]?.id ?? null);
    };
    window.addEventListener('scroll', look, { passive: true });
    return () => window.removeEventListener('scroll', look);
  }, [lines]);
  return here;
}
