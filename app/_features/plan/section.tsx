import type { ReactNode } from 'react';

interface SectionProps {
  readonly title: string;
  readonly text?: string;
  readonly action?: ReactNode;
  readonly children: ReactNode;
}

/** One part of the plan under its heading. */
export function Section({ title, text, action, children }: SectionProps) {
  return (
    <section aria-label={title} className="border-t border-rule py-6 first-of-type:border-t-0">
      <div className="mb-4 flex flex-wrap items-end justify-between gap-x-8 gap-y-2">
        <div>
          <h2 className="text-lg font-bold">{title}</h2>
          {text === undefined ? null : <p className="max-w-prose text-second">{text}</p>}
        </div>
        {action}
      </div>
      {children}
    </section>
  );
}
