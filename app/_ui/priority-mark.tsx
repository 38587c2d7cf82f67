/** What a screen can say about one thing, apart from its words. */
export type MarkKind = 'high' | 'medium' | 'low' | 'plain' | 'calm' | 'outline' | 'paused';

interface PriorityMarkProps {
  readonly kind: MarkKind;
  readonly className?: string;
}

/**
 * The shape of a state, for those who cannot tell colours apart: triangle high, square medium, ring low,
 * three joined stretches calm, a dotted stretch not tested. Words always stand beside it, so it is silent itself.
 */
export function PriorityMark({ kind, className }: PriorityMarkProps) {
  return (
    <svg viewBox="0 0 48 48" aria-hidden="true" className={className} fill="currentColor" stroke="none">
      {shapes[kind]}
    </svg>
  );
}

const shapes = {
  high: <path fillRule="evenodd" d="M24 4 47 44H1ZM21.5 17v14h5V17Zm0 17.5v4.8h5v-4.8Z" />,
  medium: <path fillRule="evenodd" d="M6 6h36v36H6ZM21.5 13v14h5V13Zm0 17.5v4.8h5v-4.8Z" />,
  low: <circle cx="24" cy="24" r="16" fill="none" stroke="currentColor" strokeWidth="4.5" />,
  plain: <path d="M4 21h40v6H4Z" />,
  calm: <path d="M1 17h14v14H1Zm16 0h14v14H17Zm16 0h14v14H33Z" />,
  outline: <rect x="2.5" y="16.5" width="43" height="15" fill="none" stroke="currentColor" strokeWidth="3" strokeDasharray="4.5 3.5" />,
  paused: <path d="M10 8h10v32H10Zm18 0h10v32H28Z" />,
} as const;
