import { joinClasses } from '@/app/_ui/join-classes';
import { PriorityMark, type MarkKind } from '@/app/_ui/priority-mark';

interface StateLabelProps {
  readonly mark: MarkKind;
  readonly priority: 'high' | 'medium' | 'low' | null;
  readonly isFlashing?: boolean;
  readonly className?: string;
  readonly children: string;
}

const labelClasses = {
  high: 'bg-high text-on-high px-[0.45em]',
  medium: 'bg-medium text-on-medium px-[0.45em]',
  low: 'border border-low text-low px-[0.45em]',
  none: 'text-ink',
} as const;

/** The state of something in its words with its shape: filled for high and medium, outlined for low, plain otherwise. */
export function StateLabel({ mark, priority, isFlashing = false, className, children }: StateLabelProps) {
  return (
    <p className={joinClasses('flex w-fit max-w-full items-center gap-[0.45em] rounded-sm py-[0.15em] leading-[1.2] font-bold', labelClasses[priority ?? 'none'], className)}>
      <span className="relative shrink-0">
        <PriorityMark kind={mark} className="size-[1em]" />
        {isFlashing ? <span className="flashes absolute inset-0 bg-high" aria-hidden="true" /> : null}
      </span>
      <span className="min-w-0 text-balance wrap-anywhere">{children}</span>
    </p>
  );
}
