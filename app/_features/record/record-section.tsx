import type { ReactNode } from 'react';

interface RecordSectionProps {
  readonly id: string;
  readonly heading: string;
  readonly children: ReactNode;
  /** Says that everything in it follows from the entries and from nothing else. */
  readonly isComputed?: boolean;
  readonly aside?: ReactNode;
}

/** One section of the record with its heading; the contents list leads here. */
export function RecordSection({ id, heading, children, isComputed = false, aside }: RecordSectionProps) {
  return (
    <section id={id} aria-labelledby={`${id}-heading`} tabIndex={-1} className="record-section mt-10 scroll-mt-4 outline-none">
      <div className="mb-3 flex flex-wrap items-end justify-between gap-x-6 gap-y-2 border-t border-ink pt-3">
        <div className="flex flex-wrap items-baseline gap-x-3">
          <h2 id={`${id}-heading`} className="text-xl font-bold">{heading}</h2>
          {isComputed ? <p className="text-sm text-second">Computed from the entries</p> : null}
        </div>
        {aside}
      </div>
      {children}
    </section>
  );
}
