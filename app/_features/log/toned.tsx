import type { ReactNode } from 'react';

import type { RowTone } from '@/app/_features/log/log-row-model';

const tones: Readonly<Record<RowTone, string>> = {
  plain: '',
  low: 'text-low font-semibold',
  // On paper the medium colour is a ground under black figures, not a colour of figures.
  medium: 'bg-[var(--medium-back)] px-1 -mx-1 font-bold text-medium-text',
  high: 'font-bold text-high-text',
};

/** A number that passed a limit, in the colour and weight of its priority; words of the same line say it too. */
export function Toned({ tone, children }: { readonly tone: RowTone; readonly children: ReactNode }) {
  return tone === 'plain' ? children : <span className={tones[tone]}>{children}</span>;
}
