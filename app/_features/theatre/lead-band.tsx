import { joinClasses } from '@/app/_ui/join-classes';
import { PriorityMark } from '@/app/_ui/priority-mark';
import { stateMark } from '@/lib/text/state-mark';
import type { TheatreLine } from '@/lib/text/theatre-line';
import { theatreWrap } from '@/lib/text/theatre-wrap';

/**
 * The one statement that matters. High fills the whole band, medium its headline, low is outlined, calm rests on a
 * raised ground, and everything else stands on the bare ground between two rules.
 */
export function LeadBand({ line }: { readonly line: TheatreLine }) {
  switch (line.priority) {
    case 'high':
      return <HighBand line={line} />;
    case 'medium':
      return <MediumBand line={line} />;
    case 'low':
      return (
        <section className="border-y border-rule px-(--edge-room) py-[0.55em] text-(length:--needed)">
          <div className="flex w-fit max-w-full items-center gap-[0.35em] border-[0.06em] border-low px-[0.35em] py-[0.12em] text-[max(var(--state),calc(var(--headline)*0.85))] text-low">
            <PriorityMark kind={stateMark(line)} className="size-[0.8em] shrink-0" />
            <Headline text={line.headline} />
          </div>
          <Detail text={line.detail} className="mt-[0.4em] text-ink" />
        </section>
      );
    case null:
      return (
        <section className={joinClasses('flex items-center border-y border-rule text-(length:--needed)', line.isCalm && 'bg-raised')}>
          <div className="flex w-full items-center gap-(--edge-room) px-(--edge-room) py-[0.8em]">
            <PriorityMark kind={stateMark(line)} className="w-[calc(var(--headline)*1.15)] shrink-0" />
            <Words line={line} detailClassName="text-second" />
          </div>
        </section>
      );
  }
}

function HighBand({ line }: { readonly line: TheatreLine }) {
  return (
    <section data-band="high" className="flex items-stretch text-(length:--needed)">
      <div className="relative flex shrink-0 items-center px-(--edge-room)">
        <PriorityMark kind="high" className="size-[calc(var(--headline)*1.2)]" />
        {line.isFlashing ? (
          <div className="flashes absolute inset-0 flex items-center justify-center bg-ink text-ground">
            <PriorityMark kind="high" className="size-[calc(var(--headline)*1.2)]" />
          </div>
        ) : null}
      </div>
      <div className="min-w-0 flex-1 py-[0.8em] pr-(--edge-room)">
        <Words line={line} detailClassName="font-medium" />
      </div>
    </section>
  );
}

function MediumBand({ line }: { readonly line: TheatreLine }) {
  return (
    <section className="border-b border-rule text-(length:--needed)">
      <div data-band="medium" className="flex items-center gap-[0.35em] px-(--edge-room) py-[0.18em] text-(length:--headline)">
        <PriorityMark kind="medium" className="size-[0.85em] shrink-0" />
        <Headline text={line.headline} />
      </div>
      <Detail text={line.detail} className="px-(--edge-room) py-[0.5em] text-ink" />
    </section>
  );
}

function Words({ line, detailClassName }: { readonly line: TheatreLine; readonly detailClassName: string }) {
  return (
    <div className="min-w-0 flex-1">
      <div className="text-(length:--headline)">
        <Headline text={line.headline} />
      </div>
      <Detail text={line.detail} className={joinClasses('mt-[0.35em]', detailClassName)} />
    </div>
  );
}

function Headline({ text }: { readonly text: string }) {
  return <h1 className="min-w-0 leading-[1.06] font-bold text-balance wrap-anywhere">{theatreWrap(text)}</h1>;
}

function Detail({ text, className }: { readonly text: string; readonly className: string }) {
  return text === '' ? null : <p className={joinClasses('leading-[1.25] text-balance wrap-anywhere', className)}>{theatreWrap(text)}</p>;
}
