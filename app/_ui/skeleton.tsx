import { joinClasses } from '@/app/_ui/join-classes';

/** The shape of what is being fetched. `label` says so to those who do not see it. */
export function Skeleton({ rows = 3, label, className }: { readonly rows?: number; readonly label: string; readonly className?: string }) {
  return (
    <div role="status" className={joinClasses('flex flex-col gap-3', className)}>
      <span className="sr-only">{label}</span>
      {Array.from({ length: rows }, (_, row) => (
        <div key={row} className={joinClasses('h-5 bg-raised-more', row % 3 === 2 ? 'w-1/2' : row % 3 === 1 ? 'w-3/4' : 'w-full')} />
      ))}
    </div>
  );
}
