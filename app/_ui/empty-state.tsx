import type { ReactNode } from 'react';

interface EmptyStateProps {
  /** What will be here. */
  readonly title: string;
  /** How it starts. */
  readonly text: string;
  readonly action?: ReactNode;
}

/** Says what will stand here and how it starts. */
export function EmptyState({ title, text, action }: EmptyStateProps) {
  return (
    <div className="flex max-w-prose flex-col items-start gap-2 py-8">
      <h2 className="text-lg font-bold">{title}</h2>
      <p className="text-second">{text}</p>
      {action ? <div className="mt-2">{action}</div> : null}
    </div>
  );
}
