'use client';

import { Band } from '@/app/_ui/band';
import { joinClasses } from '@/app/_ui/join-classes';
import { PriorityMark } from '@/app/_ui/priority-mark';
import { StateLabel } from '@/app/_ui/state-label';
import { stateMark } from '@/lib/text/state-mark';
import type { TheatreLine, TheatreView } from '@/lib/text/theatre-line';

/** The state as the wall shows it: the worst first, then what else is not calm, then short facts. */
export function LeadState({ view }: { readonly view: TheatreView }) {
  const { lead, others, footer } = view;
  return (
    <section aria-label="State">
      <div aria-live="assertive">
        <Lead line={lead} />
      </div>
      {others.length + footer.length === 0 ? null : (
        <div className="border-b border-rule px-4 py-2 sm:px-6">
          {others.map((line) => (
            <div key={`${line.kind} ${line.nerveId ?? ''} ${line.headline}`} className="flex flex-wrap items-baseline gap-x-3 py-0.5">
              <StateLabel mark={stateMark(line)} priority={line.priority}>{line.headline}</StateLabel>
              <span className="text-second">{line.detail}</span>
            </div>
          ))}
          <ul className="flex flex-wrap gap-x-5 text-second">{footer.map((fact) => <li key={fact}>{fact}</li>)}</ul>
        </div>
      )}
    </section>
  );
}

function Lead({ line }: { readonly line: TheatreLine }) {
  return (
    <Band priority={line.priority ?? 'none'} className={joinClasses('flex items-center gap-4 border-b border-rule px-4 py-4 sm:px-6', line.isCalm && 'bg-raised')}>
      <span className="relative shrink-0">
        <PriorityMark kind={stateMark(line)} className="size-[2.4em]" />
        {line.isFlashing ? <span className="flashes absolute inset-0 bg-high" aria-hidden="true" /> : null}
      </span>
      <div className="min-w-0">
        <h2 className="text-[1.7em] leading-[1.12] font-bold text-balance wrap-anywhere">{line.headline}</h2>
        {line.detail === '' ? null : <p className="mt-1 leading-snug text-pretty">{line.detail}</p>}
      </div>
    </Band>
  );
}
