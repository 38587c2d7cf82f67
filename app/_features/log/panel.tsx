import type { ReactNode } from 'react';

/** One part of the right-hand column under its heading; a pinned one holds controls and never scrolls away. */
export function Panel({ title, action, isPinned = false, children }: { readonly title: string; readonly action?: ReactNode; readonly isPinned?: boolean; readonly children: ReactNode }) {
  return (
    <section aria-label={title} className={isPinned ? 'shrink-0 border-t border-rule px-5 py-2 lg:max-h-2/5 lg:overflow-y-auto' : 'border-b border-rule px-5 py-2'}>
      <div className="mb-1 flex min-h-6 items-center justify-between gap-3">
        <h2 className="font-bold">{title}</h2>
        {action}
      </div>
      {children}
    </section>
  );
}
