import type { ReactNode } from 'react';

/** One part of the right-hand column under its heading. */
export function Panel({ title, action, children }: { readonly title: string; readonly action?: ReactNode; readonly children: ReactNode }) {
  return (
    <section aria-label={title} className="border-b border-rule px-5 py-2">
      <div className="mb-1 flex min-h-6 items-center justify-between gap-3">
        <h2 className="font-bold">{title}</h2>
        {action}
      </div>
      {children}
    </section>
  );
}
