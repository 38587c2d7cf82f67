import type { ReactNode } from 'react';

import { joinClasses } from '@/app/_ui/join-classes';

interface NoticeBarProps {
  /** `plain` is something to know, `strong` something that keeps work from being complete. */
  readonly tone: 'plain' | 'strong';
  readonly children: ReactNode;
  readonly action?: ReactNode;
}

/** A sentence about the program itself across the page. No priority colour: those are for the nerve. */
export function NoticeBar({ tone, children, action }: NoticeBarProps) {
  return (
    <div
      role="status"
      className={joinClasses(
        'flex min-h-11 flex-wrap items-center justify-between gap-x-6 gap-y-1 px-5 py-2',
        tone === 'strong' ? 'bg-ink text-ground font-semibold' : 'border-b border-rule bg-raised text-ink',
      )}
    >
      <p>{children}</p>
      {action}
    </div>
  );
}
