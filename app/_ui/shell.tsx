'use client';

import Link from 'next/link';
import { usePathname } from 'next/navigation';
import type { ReactNode } from 'react';

import { joinClasses } from '@/app/_ui/join-classes';
import { Mark } from '@/app/_ui/mark';

interface ShellProps {
  readonly links: readonly { readonly href: string; readonly label: string }[];
  /** Stands beside the name: what this page is about. */
  readonly title?: ReactNode;
  /** Stands at the right end: link state, clock, who is signed in. */
  readonly aside?: ReactNode;
  readonly children: ReactNode;
  /** One page that fills the window and never scrolls as a whole. */
  readonly isFilled?: boolean;
}

/** The head of every page with its landmarks, and the page below it. */
export function Shell({ links, title, aside, children, isFilled = false }: ShellProps) {
  const path = usePathname();
  return (
    <div className={joinClasses('flex flex-col', isFilled ? 'h-dvh' : 'min-h-dvh')}>
      <a href="#main" className="sr-only focus:not-sr-only focus:absolute focus:z-50 focus:bg-ground focus:p-3">
        Skip to the page
      </a>
      <header className="flex min-h-13 shrink-0 flex-wrap items-center gap-x-6 gap-y-1 border-b border-rule px-5 py-1.5">
        <Link href="/" className="flex min-h-9 items-center gap-2 text-lg font-bold">
          <Mark />
          Fascicle
        </Link>
        {title}
        {links.length > 0 ? (
          <nav aria-label="Pages" className="flex flex-wrap gap-x-5">
            {links.map((link) => {
              const isHere = path === link.href || path.startsWith(`${link.href}/`);
              return (
                <Link
                  key={link.href}
                  href={link.href}
                  aria-current={isHere ? 'page' : undefined}
                  className={joinClasses('flex min-h-9 items-center border-b-2', isHere ? 'border-stain font-bold' : 'border-transparent text-second hover:text-ink')}
                >
                  {link.label}
                </Link>
              );
            })}
          </nav>
        ) : null}
        {aside ? <div className="ml-auto flex flex-wrap items-center gap-x-5 gap-y-1">{aside}</div> : null}
      </header>
      <main id="main" tabIndex={-1} className={joinClasses('flex min-h-0 flex-1 flex-col outline-none', isFilled && 'overflow-hidden')}>
        {children}
      </main>
    </div>
  );
}
