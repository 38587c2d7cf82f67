import { joinClasses } from '@/app/_ui/join-classes';
import { PriorityMark } from '@/app/_ui/priority-mark';

export type BadgePriority = 'high' | 'medium' | 'low' | 'none';

const badgeClasses: Record<BadgePriority, string> = {
  high: 'bg-high text-on-high font-bold',
  medium: 'bg-medium text-on-medium font-bold',
  low: 'border border-low text-low font-semibold',
  none: 'border border-edge text-ink',
};

/** A short label of a priority: filled with a shape for high and medium, outlined for low, plain without one. */
export function Badge({ priority, children }: { readonly priority: BadgePriority; readonly children: string }) {
  return (
    <span className={joinClasses('inline-flex min-h-6 items-center gap-1.5 rounded-sm px-2 text-sm leading-5 whitespace-nowrap', badgeClasses[priority])}>
      {priority === 'none' ? null : <PriorityMark kind={priority} className="size-3.5 shrink-0" />}
      {children}
    </span>
  );
}
