import { joinClasses } from '@/app/_ui/join-classes';
import { PriorityMark } from '@/app/_ui/priority-mark';
import { stateMark } from '@/lib/text/state-mark';
import type { TheatreLine } from '@/lib/text/theatre-line';
import { theatreWrap } from '@/lib/text/theatre-wrap';

const labelClasses = {
  high: 'bg-high text-on-high px-[0.4em]',
  medium: 'bg-medium text-on-medium px-[0.4em]',
  low: 'border-[0.08em] border-low text-low px-[0.4em]',
  none: 'text-ink',
} as const;

/** What else stands beside the lead, one line each, worst first. */
export function OtherLines({ lines }: { readonly lines: readonly TheatreLine[] }) {
  if (lines.length === 0) return null;
  return (
    <ul className="border-b border-rule px-(--edge-room) py-[0.45em] text-(length:--needed) leading-[1.25]">
      {lines.map((line) => (
        <li key={`${line.kind}-${line.nerveId ?? ''}-${line.headline}`} className="flex flex-wrap items-baseline gap-x-[0.8em] py-[0.2em]">
          <strong className={joinClasses('inline-flex items-baseline gap-[0.4em] font-bold', labelClasses[line.priority ?? 'none'])}>
            <PriorityMark kind={stateMark(line)} className="size-[0.8em] shrink-0 self-center" />
            {theatreWrap(line.headline)}
          </strong>
          {line.detail === '' ? null : <span className="min-w-0 flex-1 basis-[12em] text-second text-pretty">{theatreWrap(line.detail)}</span>}
        </li>
      ))}
    </ul>
  );
}
